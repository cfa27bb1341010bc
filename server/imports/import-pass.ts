import type { ImportKind } from '@shared/imports/import-fields';
import type { ImportOutcome } from '@shared/imports/imports-contract';
import type { RowProblem } from '@shared/imports/problem-words';
import type { ReadRow } from '@shared/imports/read-row';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { FleetMemory } from './fleet-memory';
import { type Change, type FleetChanges, noChanges } from './fleet-records';
import { RowJudge } from './judge-rows';

/** A problem with the number of its row. */
export type NumberedProblem = RowProblem & { readonly row: number };

/** What a stretch of rows would do, and what is wrong with it. */
export interface Stretch {
  readonly changes: FleetChanges;
  readonly problems: readonly NumberedProblem[];
}

const NAMES = 100;
const tally = () => ({ made: 0, changed: 0, same: 0 });

const nothingYet = (): ImportOutcome => ({
  rows: 0,
  goodRows: 0,
  badRows: 0,
  problems: 0,
  problemsCut: false,
  chains: tally(),
  regions: tally(),
  stores: tally(),
  units: tally(),
  components: tally(),
  newChains: [],
  newRegions: [],
});

/** One way through a file from its first row to its last, adding up what it finds. */
export class ImportPass {
  outcome = nothingYet();

  private constructor(
    private readonly memory: FleetMemory,
    private readonly judge: RowJudge,
  ) {}

  static async begin(
    tenant: Tenant,
    kind: ImportKind,
    actor: Actor,
    now: Date,
  ): Promise<ImportPass> {
    const memory = await FleetMemory.begin(tenant, kind);
    return new ImportPass(memory, new RowJudge(kind, actor, now, memory));
  }

  /**
   * Judges the next rows.
   * @param lock keeps what they speak of as it is until the transaction ends, for writing
   */
  async take(tenant: Tenant, rows: readonly ReadRow[], lock: boolean): Promise<Stretch> {
    await this.memory.lookUp(tenant, rows, lock);
    const changes = noChanges();
    const problems: NumberedProblem[] = [];
    const { outcome } = this;
    for (const row of rows) {
      const draft = this.judge.judge(row);
      outcome.rows += 1;
      if (draft.isBad) {
        outcome.badRows += 1;
        problems.push(...draft.problems.map((it) => ({ ...it, row: row.number })));
        continue;
      }
      outcome.goodRows += 1;
      for (const table of tables) this.count(table, draft.changes[table], changes[table]);
    }
    outcome.problems += problems.length;
    return { changes, problems };
  }

  /** Counts changes, and passes on those that change anything. */
  private count(
    table: keyof FleetChanges,
    found: readonly Change<object>[],
    kept: Change<object>[],
  ): void {
    for (const change of found) {
      const what =
        change.before === null ? 'made' : change.before === change.after ? 'same' : 'changed';
      this.outcome[table][what] += 1;
      if (what !== 'same') kept.push(change);
      if (what === 'made' && table === 'chains') addName(this.outcome.newChains, change);
      if (what === 'made' && table === 'regions') addName(this.outcome.newRegions, change);
    }
  }
}

const tables = ['chains', 'regions', 'stores', 'units', 'components'] as const;

function addName(names: string[], { after }: Change<object>): void {
  if (names.length < NAMES && 'name' in after) names.push(String(after.name));
}
