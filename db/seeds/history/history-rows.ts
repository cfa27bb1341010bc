import type { Tenant } from '@db/tenant-transaction';
import { insertRows } from '../insert-rows';
import type { FittedPart } from './history-world';

type Row = Record<string, unknown>;

/** What a task's row becomes. */
export interface TaskOutcomeRow {
  readonly id: string;
  readonly occursLocal: string;
  readonly outcome: 'none' | 'done' | 'excused';
  readonly at: Date | null;
  readonly by: string | null;
  readonly reason: string | null;
  readonly assignedTo: string | null;
}

/** Everything that eighteen months left behind, table by table. */
export class HistoryRows {
  readonly outcomes: TaskOutcomeRow[] = [];
  readonly inspections: Row[] = [];
  readonly readings: Row[] = [];
  readonly findings = new Map<string, Row>();
  readonly repairs: Row[] = [];
  readonly #components = new Map<string, Row>();
  readonly #removed: { id: string; on: string; cause: string }[] = [];
  readonly #events: { at: Date; row: Row }[] = [];

  event(at: Date, actorId: string, subject: string, action: string, detail: object): void {
    const subjectKind = this.findings.has(subject) ? 'finding' : 'task';
    this.#events.push({
      at,
      row: {
        at,
        actor_id: actorId,
        subject_kind: subjectKind,
        subject_id: subject,
        action,
        detail,
      },
    });
  }

  fitPart(part: FittedPart & { unitId: string; kind: string; on: string }): void {
    this.#components.set(part.id, {
      id: part.id,
      unit_id: part.unitId,
      kind: part.kind,
      model: part.model,
      nameplate: part.nameplate,
      pump_face: part.pumpFace,
      installed_on: part.on,
      removed_on: null,
      removal_cause: null,
    });
  }

  /** A part that came within the history carries its end with it; one from before is changed. */
  removePart(id: string, on: string, cause: string): void {
    const own = this.#components.get(id);
    if (own) Object.assign(own, { removed_on: on, removal_cause: cause });
    else this.#removed.push({ id, on, cause });
  }

  /** Writes all of it, parts before what refers to them, what happened in its order. */
  async write(tenant: Tenant): Promise<void> {
    await tenant.rows(
      `UPDATE components c SET removed_on = it.on, removal_cause = it.cause, version = c.version + 1
       FROM jsonb_to_recordset($1::jsonb) AS it (id uuid, "on" date, cause text)
       WHERE c.id = it.id`,
      [JSON.stringify(this.#removed)],
    );
    await insertRows(tenant, 'components', [...this.#components.values()]);
    await insertRows(tenant, 'inspections', this.inspections);
    await insertRows(tenant, 'readings', this.readings);
    await insertRows(tenant, 'findings', [...this.findings.values()]);
    await insertRows(tenant, 'repairs', this.repairs);
    await this.#writeOutcomes(tenant);
    const inOrder = this.#events.sort((a, b) => a.at.getTime() - b.at.getTime());
    await insertRows(
      tenant,
      'audit_events',
      inOrder.map(({ row }) => row),
    );
  }

  async #writeOutcomes(tenant: Tenant): Promise<void> {
    const batch = 10_000;
    for (let from = 0; from < this.outcomes.length; from += batch) {
      await tenant.rows(
        `UPDATE tasks t SET outcome = it.outcome, outcome_at = it.at, outcome_by = it.by,
           outcome_reason = it.reason, assigned_to = it."assignedTo", version = t.version + 1
         FROM jsonb_to_recordset($1::jsonb) AS it (id uuid, "occursLocal" timestamp, outcome text,
           at timestamptz, by uuid, reason text, "assignedTo" uuid)
         WHERE t.id = it.id AND t.occurs_local = it."occursLocal"`,
        [JSON.stringify(this.outcomes.slice(from, from + batch))],
      );
    }
  }
}
