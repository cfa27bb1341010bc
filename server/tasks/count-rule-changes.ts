import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import { untouched } from './bring-tasks-in-line';
import { dueSchedulesOf } from './due-schedules';
import { TaskTimetable } from './task-timetable';
import { wantedTables } from './wanted-tables-sql';

/** What becomes of a rule's tasks when they are next brought in line with it. */
export interface RuleChangeCount {
  /** Written anew. */
  readonly added: number;
  /** Due at the same time, with another window, place, procedure or pair of hands. */
  readonly moved: number;
  /** Taken back. */
  readonly withdrawn: number;
  /** To come, and the same as before but for the revision. */
  readonly unchanged: number;
  /** Open, deferred or on a published route: they stay as they are. */
  readonly leftAlone: number;
}

const none: RuleChangeCount = { added: 0, moved: 0, withdrawn: 0, unchanged: 0, leftAlone: 0 };

/** What a task takes from its rule beside its revision. */
const taken = [
  ['procedure_id', 'b.procedure_id'],
  ['audience', 'b.audience'],
  ['store_id', 'b.store_id'],
  ['unit_id', 'b.unit_id'],
  ['due_on', 'o.due_on'],
  ['opens_at', 'o.opens_at'],
  ['due_soon_at', 'o.due_soon_at'],
  ['due_at', 'o.due_at'],
  ['closes_at', 'o.closes_at'],
  ['lapses_at', 'o.lapses_at'],
] as const;

/**
 * Counts what `generateTasks` will do to the tasks of a rule as the rule and its schedules stand in
 * this transaction. Writes nothing and waits for nobody.
 *
 * @param now the instant that decides what has opened and, in each store's zone, how far to write
 */
export async function countRuleChanges(
  tenant: Tenant,
  ruleId: string,
  now: Date,
): Promise<RuleChangeCount> {
  const batch = await dueSchedulesOf(tenant, ruleId, now);
  if (batch.length === 0) return none;
  const binds = new Binds();
  const tables = wantedTables(binds, batch, new TaskTimetable().occurrencesFor(batch));
  const at = `${binds.add(now)}::timestamptz`;
  const counted = await tenant.row<RuleChangeCount>(
    `WITH ${tables},
     wanted AS MATERIALIZED (
       SELECT b.id AS schedule_id, o.local, ${taken.map(([name, value]) => `${value} AS ${name}`).join(', ')}
       FROM batch b JOIN occurrences o
         ON o.key = b.key AND o.local >= b.from_local AND o.local < b.to_local
     ),
     standing AS MATERIALIZED (
       SELECT t.*, ${untouched(at)} AS free
       FROM batch b JOIN tasks t ON t.schedule_id = b.id
       WHERE t.outcome = 'none' AND t.lapses_at > ${at}
     ),
     compared AS (
       SELECT s.free, w.local IS NOT NULL AS stays,
         (${taken.map(([name]) => `s.${name}`).join(', ')})
           IS DISTINCT FROM (${taken.map(([name]) => `w.${name}`).join(', ')}) AS differs
       FROM standing s
       LEFT JOIN wanted w ON w.schedule_id = s.schedule_id AND w.local = s.occurs_local
     )
     SELECT
       (SELECT count(*)::int FROM wanted w WHERE NOT EXISTS (SELECT FROM tasks t
         WHERE t.schedule_id = w.schedule_id AND t.occurs_local = w.local)) AS added,
       count(*) FILTER (WHERE free AND stays AND differs)::int AS moved,
       count(*) FILTER (WHERE free AND NOT stays)::int AS withdrawn,
       count(*) FILTER (WHERE free AND stays AND NOT differs)::int AS unchanged,
       count(*) FILTER (WHERE NOT free)::int AS "leftAlone"
     FROM compared`,
    binds.values,
  );
  return counted ?? none;
}
