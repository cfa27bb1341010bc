import type { ImportOutcome } from '@shared/imports/imports-contract';
import { Problem } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import { recordEvent } from '../audit/record-event';
import type { LongJobRun, LongJobServices } from '../long-jobs/long-job';
import { syncSchedules } from '../programmes/sync-schedules';
import { type ImportWork, beginWork } from './begin-work';
import type { FleetChanges } from './fleet-records';
import { ImportPass, type NumberedProblem, type Stretch } from './import-pass';
import { forgetProblems, keepProblems } from './keep-problems';
import { writeChanges } from './write-changes';

/** Takes a checked file in, in the way that was asked for. */
export async function runImport(services: LongJobServices, run: LongJobRun): Promise<void> {
  const work = await beginWork(services, run);
  const importing = new Importing(services, run, work);
  await (work.record.mode === 'all-or-nothing' ? importing.wholly() : importing.goodRows());
}

/** Above so many stores it is quicker to look at the schedules of all. */
const STORES_APART = 2_000;

class Importing {
  private readonly stores = new Set<string>();
  private readonly total: number | null;

  constructor(
    private readonly services: LongJobServices,
    private readonly run: LongJobRun,
    private readonly work: ImportWork,
  ) {
    this.total = work.record.checked?.rows ?? null;
  }

  /**
   * All rows in one transaction: a worker lost on the way leaves nothing, and the next begins anew.
   * Where the fleet changed since the check so that rows are at fault, nothing is taken in, and the
   * problems are shown.
   */
  async wholly(): Promise<void> {
    const problems: NumberedProblem[] = [];
    let pass: ImportPass | undefined;
    try {
      await this.run.inTenant(async (tenant) => {
        pass = await this.begin(tenant);
        let done = 0;
        for await (const rows of this.work.stretches()) {
          const stretch = await pass.take(tenant, rows, true);
          problems.push(...stretch.problems);
          if (problems.length === 0) await this.write(tenant, stretch);
          done += rows.length;
          await this.run.show({ done, total: this.total });
        }
        if (problems.length > 0) throw new RowsAtFault();
        await this.end(tenant, pass.outcome, done, true);
      });
    } catch (error) {
      if (!(error instanceof RowsAtFault) || !pass) throw error;
      await this.refuse(pass, problems);
    }
  }

  /**
   * A thousand rows to a transaction, which also writes down how far it came: the worker that takes
   * over goes on from there. It reads the rows before that once more, to know what they spoke of.
   */
  async goodRows(): Promise<void> {
    const { run, work } = this;
    const reached = run.reached.result === null ? 0 : run.reached.done;
    const pass = await run.inTenant((tenant) => this.begin(tenant));
    let done = 0;
    for await (const rows of work.stretches()) {
      done += rows.length;
      if (done <= reached) {
        await run.inTenant((tenant) => pass.take(tenant, rows, false));
        if (done === reached) pass.outcome = run.reached.result as ImportOutcome;
        continue;
      }
      await run.inTenant(async (tenant) => {
        if (done === rows.length) await forgetProblems(tenant, work.record.id);
        const stretch = await pass.take(tenant, rows, true);
        await this.write(tenant, stretch);
        await keepProblems(tenant, work.record.id, pass, stretch.problems);
        await run.keep(tenant, { done, total: this.total }, pass.outcome);
      });
    }
    await run.inTenant((tenant) => this.end(tenant, pass.outcome, done, reached === 0));
  }

  private begin(tenant: Tenant): Promise<ImportPass> {
    return ImportPass.begin(tenant, this.work.record.kind, this.work.actor, this.services.now());
  }

  private async write(tenant: Tenant, { changes }: Stretch): Promise<void> {
    const { record, actor } = this.work;
    await writeChanges(tenant, changes, { actorId: actor.personId, importId: record.id });
    await this.noteStores(tenant, changes);
  }

  private async noteStores(tenant: Tenant, changes: FleetChanges): Promise<void> {
    for (const { id } of changes.stores) this.stores.add(id);
    for (const { after } of changes.units) this.stores.add(after.store_id);
    const ids = [...new Set(changes.components.map(({ after }) => after.unit_id))];
    if (ids.length === 0) return;
    const found = await tenant.rows<{ id: string }>(
      'SELECT DISTINCT store_id AS id FROM units WHERE id = ANY($1::uuid[])',
      [ids],
    );
    for (const { id } of found) this.stores.add(id);
  }

  /** @param knowsAll false when an earlier try touched stores that this one does not know of */
  private async end(
    tenant: Tenant,
    outcome: ImportOutcome,
    done: number,
    knowsAll: boolean,
  ): Promise<void> {
    const { record, actor } = this.work;
    if (!knowsAll || this.stores.size > STORES_APART) {
      await syncSchedules(tenant, this.services.now());
    } else if (this.stores.size > 0) {
      await syncSchedules(tenant, this.services.now(), { storeIds: [...this.stores] });
    }
    await recordEvent(tenant, {
      actorId: actor.personId,
      subjectKind: 'import',
      subjectId: record.id,
      action: 'import-finished',
      detail: { kind: record.kind, mode: record.mode, outcome },
    });
    await tenant.rows('UPDATE imports SET version = version + 1 WHERE id = $1', [record.id]);
    await this.run.finish(tenant, { done, total: done }, outcome);
  }

  private async refuse(pass: ImportPass, problems: readonly NumberedProblem[]): Promise<never> {
    const { record, actor } = this.work;
    await this.run.inTenant(async (tenant) => {
      await forgetProblems(tenant, record.id);
      await keepProblems(tenant, record.id, pass, problems);
      await tenant.rows('UPDATE imports SET checked = $2, version = version + 1 WHERE id = $1', [
        record.id,
        JSON.stringify(pass.outcome),
      ]);
    });
    throw new Problem(
      409,
      'rows-at-fault',
      actor.locale === 'es'
        ? 'El parque cambió desde la revisión y algunas filas ya no encajan. No se importó nada.'
        : 'The fleet changed since the check, and some rows do not fit any more. Nothing was taken in.',
    );
  }
}

/** Rolls the transaction back. */
class RowsAtFault extends Error {}
