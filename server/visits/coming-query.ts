import { addDays, parseCalendarDate } from '@shared/calendar/calendar-date';
import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import { routeState } from '@shared/visits/route-state';
import type { listComing } from '@shared/visits/visits-contract';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';
import { asPlannedTask, plannedTaskRows, sumMinutes } from './planned-tasks';
import { type Stop, stopColumn } from './stop-columns';

interface Row {
  id: string;
  onDate: string;
  store: Stop;
  technicianName: string;
  place: number;
  stops: number;
  version: number;
  publishedVersion: number;
}

/** Who comes to the stores in sight, and when, as far as it was told; by day, then store. */
export async function comingVisits(
  tenant: Tenant,
  actor: Actor,
  query: QueryOf<typeof listComing>,
  now: Date,
): Promise<ReplyOf<typeof listComing>> {
  const binds = new Binds();
  const to = addDays(parseCalendarDate(query.from), query.days - 1);
  const where = [
    visibleStores(actor, 'visits.read', binds),
    `ro.on_date BETWEEN ${binds.add(query.from)} AND ${binds.add(to)}`,
    'ro.published_version IS NOT NULL',
  ];
  if (query.store) where.push(`s.id = ${binds.add(query.store)}`);
  const rows = await tenant.rows<Row>(
    `SELECT v.id, ro.on_date AS "onDate", ${stopColumn}, p.name AS "technicianName",
       (SELECT count(*)::int FROM visits b WHERE b.route_id = ro.id AND b.position <= v.position)
         AS place,
       (SELECT count(*)::int FROM visits b WHERE b.route_id = ro.id) AS stops,
       ro.version, ro.published_version AS "publishedVersion"
     FROM visits v JOIN routes ro ON ro.id = v.route_id JOIN stores s ON s.id = v.store_id
     JOIN people p ON p.id = ro.technician_id
     WHERE ${where.join(' AND ')} ORDER BY ro.on_date, s.number, v.id LIMIT 1000`,
    binds.values,
  );
  const tasks = await tasksOf(tenant, rows, now);
  return {
    visits: rows.map(({ version, publishedVersion, ...row }) => {
      const its = tasks.filter(({ visitId }) => visitId === row.id).map(asPlannedTask);
      return {
        ...row,
        changed: routeState(version, publishedVersion) === 'changed',
        minutes: sumMinutes(its),
        done: its.filter(({ state }) => state === 'done' || state === 'done-late').length,
        tasks: its,
      };
    }),
  };
}

function tasksOf(tenant: Tenant, rows: readonly Row[], now: Date) {
  if (rows.length === 0) return [];
  const binds = new Binds();
  const where = `t.visit_id = ANY(${binds.add(rows.map(({ id }) => id))}::uuid[])`;
  return plannedTaskRows(tenant, binds, where, now);
}
