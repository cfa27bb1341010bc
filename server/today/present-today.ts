import type { ReplyOf } from '@shared/contract/endpoint';
import type { CalendarDate } from '@shared/calendar/calendar-date';
import { addDays } from '@shared/calendar/calendar-date';
import { dateAt, instantOf } from '@shared/calendar/instant-of';
import { atTime } from '@shared/calendar/local-date-time';
import type { readToday } from '@shared/today/today-contract';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';
import { presentStop } from './present-stop';
import { type TodayTaskRow, todayStores, todayTaskRows } from './today-tasks';

/** More tasks than anyone does in a day: the rest is counted, not listed. */
const MOST = 150;

interface VisitRow {
  id: string;
  storeId: string;
  note: string;
}

/**
 * The technician's day: the visits of the published route in order with all their tasks, then the
 * tasks due by the end of the day that stand on no visit from today on, by store, urgent first.
 * The day is that of the technician's own zone.
 */
export async function presentToday(
  tenant: Tenant,
  actor: Actor,
  now: Date,
): Promise<ReplyOf<typeof readToday>> {
  const date = dateAt(now.getTime(), actor.timeZone);
  const visits = await publishedVisits(tenant, actor, date);
  const planned = visits.length === 0 ? [] : await tasksOfVisits(tenant, now, visits);
  const { rows: loose, total } = await looseTasks(tenant, actor, now, date);
  const stores = await todayStores(tenant, [
    ...visits.map(({ storeId }) => storeId),
    ...loose.map(({ storeId }) => storeId),
  ]);
  return {
    date,
    timeZone: actor.timeZone,
    published: visits.length > 0,
    visits: visits.flatMap((visit) => {
      const store = stores.get(visit.storeId);
      const tasks = planned.filter(({ visitId }) => visitId === visit.id);
      return store ? [presentStop(store, visit, tasks, date)] : [];
    }),
    unplanned: [...new Set(loose.map(({ storeId }) => storeId))].flatMap((storeId) => {
      const store = stores.get(storeId);
      const tasks = loose.filter((task) => task.storeId === storeId);
      return store ? [presentStop(store, null, tasks, date)] : [];
    }),
    more: total - loose.length,
  };
}

function publishedVisits(tenant: Tenant, actor: Actor, date: string): Promise<VisitRow[]> {
  return tenant.rows<VisitRow>(
    `SELECT v.id, v.store_id AS "storeId", v.note
     FROM visits v JOIN routes r ON r.id = v.route_id
     WHERE r.technician_id = $1 AND r.on_date = $2 AND r.published_at IS NOT NULL
     ORDER BY v.position`,
    [actor.personId, date],
  );
}

function tasksOfVisits(
  tenant: Tenant,
  now: Date,
  visits: readonly VisitRow[],
): Promise<TodayTaskRow[]> {
  const binds = new Binds();
  const where = `t.visit_id = ANY(${binds.add(visits.map(({ id }) => id))}::uuid[])`;
  return todayTaskRows(tenant, now, 1000, binds, where);
}

/** Due tasks that no route of today or later takes up: those of the technician, and nobody's. */
async function looseTasks(
  tenant: Tenant,
  actor: Actor,
  now: Date,
  date: CalendarDate,
): Promise<{ rows: TodayTaskRow[]; total: number }> {
  const dayEnds = new Date(instantOf(atTime(addDays(date, 1), '00:00'), actor.timeZone));
  const condition = (binds: Binds) => `
    ${visibleStores(actor, 'tasks.do', binds)} AND s.retired_at IS NULL
    AND t.audience = 'technician' AND t.outcome = 'none'
    AND t.due_soon_at < ${binds.add(dayEnds)} AND t.opens_at <= ${binds.add(now)}
    AND t.lapses_at > ${binds.add(now)}
    AND (t.assigned_to IS NULL OR t.assigned_to = ${binds.add(actor.personId)})
    AND NOT EXISTS (
      SELECT FROM visits v JOIN routes r ON r.id = v.route_id
      WHERE v.id = t.visit_id AND r.on_date >= ${binds.add(date)})`;
  const listed = new Binds();
  const rows = await todayTaskRows(tenant, now, MOST, listed, condition(listed));
  if (rows.length < MOST) return { rows, total: rows.length };
  const counted = new Binds();
  const count = await tenant.row<{ total: number }>(
    `SELECT count(*)::int AS total FROM tasks t JOIN stores s ON s.id = t.store_id
     WHERE ${condition(counted)}`,
    counted.values,
  );
  return { rows, total: Math.max(count?.total ?? 0, rows.length) };
}
