import { type CalendarDate, addDays } from '@shared/calendar/calendar-date';
import { dateAt } from '@shared/calendar/instant-of';
import type { ReplyOf } from '@shared/contract/endpoint';
import type { TaskState } from '@shared/tasks/task-state';
import { BOARD_WEEKS, STRIP_WEEKS, type readTaskBoard } from '@shared/tasks/tasks-contract';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { type BoardDays, type BoardQuery, mondayOf } from './board-query';
import { boardFigures } from './board-figures';
import { pageOfBoardStores } from './board-stores';
import { stripsOf } from './board-strips';
import { openSpan } from './open-span';
import { taskConditions } from './task-conditions';
import { stateAt } from './task-state-sql';

type Board = ReplyOf<typeof readTaskBoard>;
type Cell = Board['rows'][number]['cells'][number];

/** Stores by days over five weeks, with what stands behind each store and over all of them. */
export async function taskBoard(
  tenant: Tenant,
  actor: Actor,
  query: BoardQuery,
  now: Date,
): Promise<Board> {
  const today = dateAt(now.getTime(), actor.timeZone);
  const from = mondayOf((query.from as CalendarDate | undefined) ?? addDays(today, -14));
  const to = addDays(from, BOARD_WEEKS * 7 - 1);
  const strip = addDays(mondayOf(today), -(STRIP_WEEKS - 1) * 7);
  const { earliest } = await openSpan(tenant, now);
  const days: BoardDays = { from, to, today, strip, earliest };
  const { rows, total } = await pageOfBoardStores(tenant, actor, query, days, now);
  const ids = rows.map(({ storeId }) => storeId);
  const cells = await cellsOf(tenant, actor, query, ids, { from, to }, now);
  const strips = await stripsOf(tenant, query, ids, strip);
  return {
    from,
    to,
    today,
    rows: rows.map(({ timeZone, ...row }) => ({
      ...row,
      ...(strips.get(row.storeId) ?? { rate: null, weeks: Array(STRIP_WEEKS).fill(null) }),
      today: dateAt(now.getTime(), timeZone),
      cells: cells.get(row.storeId) ?? [],
    })),
    total,
    page: query.page,
    pageSize: query.pageSize,
    figures: await boardFigures(tenant, actor, query, days, now),
  };
}

/** For each store its days with tasks, in order. */
async function cellsOf(
  tenant: Tenant,
  actor: Actor,
  { rule, technician, audience }: BoardQuery,
  ids: readonly string[],
  days: { from: string; to: string },
  now: Date,
): Promise<Map<string, Cell[]>> {
  if (ids.length === 0) return new Map();
  const binds = new Binds();
  const filters = { rule, technician, audience, ...days };
  const rows = await tenant.rows<{
    storeId: string;
    date: string;
    state: TaskState;
    count: number;
  }>(
    `SELECT t.store_id AS "storeId", t.due_on AS date, ${stateAt(now, binds)} AS state,
       count(*)::int AS count
     FROM tasks t WHERE t.store_id = ANY(${binds.add(ids)}::uuid[])
       AND ${taskConditions(actor, 'board.read', filters, now, binds)}
     GROUP BY 1, 2, 3 ORDER BY 1, 2`,
    binds.values,
  );
  const cells = new Map<string, Cell[]>();
  for (const { storeId, date, state, count } of rows) {
    const of = cells.get(storeId) ?? [];
    cells.set(storeId, of);
    const last = of.at(-1);
    if (last?.date === date) last.counts[state] = count;
    else of.push({ date, counts: { [state]: count } });
  }
  return cells;
}
