import { addDays } from '@shared/calendar/calendar-date';
import type { ReplyOf } from '@shared/contract/endpoint';
import type { readTaskBoard } from '@shared/tasks/tasks-contract';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { boardStores, occursBetween, taskFilter } from './board-stores';
import { closedWindows, share } from './board-strips';
import { type BoardDays, type BoardQuery, mondayOf } from './board-query';

type Figures = ReplyOf<typeof readTaskBoard>['figures'];

/** What stands at the head of the board: over all its stores, from its first day to today. */
export async function boardFigures(
  tenant: Tenant,
  actor: Actor,
  query: BoardQuery,
  days: BoardDays,
  now: Date,
): Promise<Figures> {
  const closed = await closedSince(tenant, actor, query, days);
  const binds = new Binds();
  const at = `${binds.add(now)}::timestamptz`;
  const sunday = addDays(mondayOf(days.today), 6);
  const ahead = await tenant.row<Omit<Figures, 'rate' | 'onTime' | 'counted'>>(
    `SELECT count(*) FILTER (WHERE t.closes_at <= ${at})::int AS overdue,
       min(t.closes_on) FILTER (WHERE t.closes_at <= ${at}) AS "oldestOverdueOn",
       count(*) FILTER (WHERE t.due_on BETWEEN ${binds.add(days.today)}::date AND
         ${binds.add(sunday)}::date)::int AS "dueThisWeek"
     FROM tasks t
     WHERE t.store_id = ANY(ARRAY(SELECT s.id FROM stores s WHERE ${boardStores(actor, query, days, binds)}))
       AND ${taskFilter(query, binds)} AND t.outcome = 'none' AND t.lapses_at > ${at}
       AND ${occursBetween(days.earliest, addDays(sunday, 2), binds)}
       AND (t.closes_at <= ${at} OR t.due_on BETWEEN ${binds.add(days.today)}::date AND
         ${binds.add(sunday)}::date)`,
    binds.values,
  );
  return {
    rate: share(closed.onTime, closed.counted),
    ...closed,
    overdue: ahead?.overdue ?? 0,
    oldestOverdueOn: ahead?.oldestOverdueOn ?? null,
    dueThisWeek: ahead?.dueThisWeek ?? 0,
  };
}

async function closedSince(
  tenant: Tenant,
  actor: Actor,
  query: BoardQuery,
  days: BoardDays,
): Promise<{ onTime: number; counted: number }> {
  const binds = new Binds();
  const row = await tenant.row<{ onTime: number; counted: number }>(
    `SELECT coalesce(sum(c.on_time), 0)::int AS "onTime",
       coalesce(sum(c.on_time + c.late + c.not_done), 0)::int AS counted
     FROM compliance_weeks c
     WHERE c.store_id = ANY(ARRAY(SELECT s.id FROM stores s WHERE ${boardStores(actor, query, days, binds)}))
       AND c.week >= ${binds.add(days.from)}::date AND ${closedWindows(query, binds)}`,
    binds.values,
  );
  return row ?? { onTime: 0, counted: 0 };
}
