import { addDays } from '@shared/calendar/calendar-date';
import { MOST_DAYS_DEFERRED } from '@shared/tasks/defer-task';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { naturalOrder, searchText } from '../fleet/search-text';
import { closedWindows } from './board-strips';
import type { BoardDays, BoardQuery } from './board-query';
import { storeConditions } from './task-conditions';

interface BoardStore {
  storeId: string;
  number: string;
  name: string;
  timeZone: string;
  overdue: number;
}

const byNumber = `${naturalOrder('s.number')}, s.id`;

/**
 * Live stores of the board's filters; the page asked for, and how many there are. Where a filter asks
 * for somebody's tasks or a rule's, only stores that have any in those weeks.
 */
export async function pageOfBoardStores(
  tenant: Tenant,
  actor: Actor,
  query: BoardQuery,
  days: BoardDays,
  now: Date,
): Promise<{ rows: BoardStore[]; total: number }> {
  const binds = new Binds();
  const where = boardStores(actor, query, days, binds);
  const count = await tenant.row<{ total: number }>(
    `SELECT count(*)::int AS total FROM stores s WHERE ${where}`,
    binds.values,
  );
  const tasks = taskFilter(query, binds);
  const at = `${binds.add(now)}::timestamptz`;
  const overdue = `(SELECT count(*)::int FROM tasks t WHERE t.store_id = s.id AND ${tasks}
    AND t.outcome = 'none' AND t.closes_at <= ${at} AND t.lapses_at > ${at}
    AND ${occursBetween(days.earliest, addDays(days.today, 2), binds)})`;
  const rate = () =>
    `(SELECT sum(c.on_time)::float8 / nullif(sum(c.on_time + c.late + c.not_done), 0)
      FROM compliance_weeks c WHERE c.store_id = s.id AND c.week >= ${binds.add(days.strip)}::date
        AND ${closedWindows(query, binds)})`;
  const sorts: Readonly<Record<BoardQuery['sort'], () => string>> = {
    number: () => byNumber,
    '-number': () => `${naturalOrder('s.number', 'DESC')}, s.id`,
    name: () => `lower(s.name), ${byNumber}`,
    '-name': () => `lower(s.name) DESC, ${byNumber}`,
    rate: () => `${rate()} NULLS LAST, ${byNumber}`,
    '-rate': () => `${rate()} DESC NULLS LAST, ${byNumber}`,
    overdue: () => `${overdue} DESC, ${byNumber}`,
  };
  const { page, pageSize } = query;
  const rows = await tenant.rows<BoardStore>(
    `WITH page AS MATERIALIZED (
       SELECT s.*, row_number() OVER (ORDER BY ${sorts[query.sort]()}) AS place
       FROM stores s WHERE ${where}
       ORDER BY place LIMIT ${binds.add(pageSize)} OFFSET ${binds.add((page - 1) * pageSize)})
     SELECT s.id AS "storeId", s.number, s.name, s.time_zone AS "timeZone", ${overdue} AS overdue
     FROM page s ORDER BY s.place`,
    binds.values,
  );
  return { rows, total: count?.total ?? 0 };
}

/** SQL true for the rows of `stores s` that stand on the board. */
export function boardStores(
  actor: Actor,
  query: BoardQuery,
  { from, to }: BoardDays,
  binds: Binds,
): string {
  const all = [
    's.retired_at IS NULL',
    storeConditions(actor, 'board.read', query, binds),
    searchText(query.q, ['s.number', 's.name'], binds),
  ];
  if (query.store) all.push(`s.id = ${binds.add(query.store)}`);
  if (query.rule || query.technician) {
    const first = `${binds.add(from)}::date`;
    all.push(`EXISTS (SELECT FROM tasks t WHERE t.store_id = s.id AND ${taskFilter(query, binds)}
      AND t.due_on BETWEEN ${first} AND ${binds.add(to)}::date
      AND t.occurs_local >= ${first} - ${MOST_DAYS_DEFERRED})`);
  }
  return all.join(' AND ');
}

/** SQL true for the tasks `t` that the filters leave on the board. */
export function taskFilter({ rule, technician, audience }: BoardQuery, binds: Binds): string {
  const all = ['true'];
  if (rule) all.push(`t.rule_id = ${binds.add(rule)}`);
  if (technician) all.push(`t.assigned_to = ${binds.add(technician)}`);
  if (audience) all.push(`t.audience = ${binds.add(audience)}`);
  return all.join(' AND ');
}

/** SQL true for the tasks `t` that occur on these days, both ends included. */
export function occursBetween(from: string | null, to: string, binds: Binds): string {
  const until = `t.occurs_local < ${binds.add(to)}::date + 1`;
  return from ? `t.occurs_local >= ${binds.add(from)}::date AND ${until}` : until;
}
