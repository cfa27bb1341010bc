import { type CalendarDate, addDays } from '@shared/calendar/calendar-date';
import { dateAt } from '@shared/calendar/instant-of';
import { type Month, lastDayOf } from '@shared/compliance/month';
import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { TaskState } from '@shared/tasks/task-state';
import type { readTaskCalendar } from '@shared/tasks/tasks-contract';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { taskConditions } from './task-conditions';
import { sortedTasks } from './task-queries';
import { stateAt } from './task-state-sql';

const MOST_OF_A_DAY = 200;

/** A month of tasks by the day they are due, and on request the tasks of one day. */
export async function taskCalendar(
  tenant: Tenant,
  actor: Actor,
  { month, day, ...filters }: QueryOf<typeof readTaskCalendar>,
  now: Date,
): Promise<ReplyOf<typeof readTaskCalendar>> {
  const from = `${month}-01`;
  const to = lastDayOf(month as Month);
  const binds = new Binds();
  const where = taskConditions(actor, 'tasks.read', { ...filters, from, to }, now, binds);
  const counted = await tenant.rows<{ date: string; state: TaskState; count: number }>(
    `SELECT t.due_on AS date, ${stateAt(now, binds)} AS state, count(*)::int AS count
     FROM tasks t WHERE ${where} GROUP BY 1, 2`,
    binds.values,
  );
  const days = new Map<string, { total: number; counts: Partial<Record<TaskState, number>> }>();
  for (let date = from; date <= to; date = addDays(date as CalendarDate, 1)) {
    days.set(date, { total: 0, counts: {} });
  }
  for (const { date, state, count } of counted) {
    const of = days.get(date);
    if (!of) continue;
    of.total += count;
    of.counts[state] = count;
  }
  const ofDay = { ...filters, sort: 'due' as const };
  return {
    month,
    today: dateAt(now.getTime(), actor.timeZone),
    days: [...days].map(([date, of]) => ({ date, ...of })),
    tasks: day
      ? await sortedTasks(tenant, actor, { ...ofDay, from: day, to: day }, now, {
          limit: MOST_OF_A_DAY,
        })
      : [],
  };
}
