import type * as z from 'zod';
import type { StoreHours } from '@shared/fleet/store-hours';
import { notFound } from '@shared/problem';
import type { route, visit } from '@shared/visits/route-parts';
import { routeState } from '@shared/visits/route-state';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';
import { type Position, distanceMetres } from '../fleet/locate-store';
import { asPlannedTask, type PlannedTaskRow, plannedTaskRows, sumMinutes } from './planned-tasks';
import { hoursOn, type Stop, stopColumn } from './stop-columns';
import { techniciansFor } from './technicians';

export type Route = z.output<typeof route>;
export type Visit = z.output<typeof visit>;

interface RouteRow {
  id: string;
  technicianId: string;
  technicianName: string;
  homeLatitude: number | null;
  homeLongitude: number | null;
  onDate: string;
  version: number;
  publishedVersion: number | null;
  publishedAt: Date | null;
}

interface VisitRow {
  id: string;
  routeId: string;
  version: number;
  position: number;
  note: string;
  store: Stop;
  hours: Partial<StoreHours>;
  seen: boolean;
}

/**
 * Routes that fit a condition on `routes ro`, by technician and day, each with its visits in order.
 * Three statements, however many routes there are.
 *
 * @param seen SQL true for the rows of `stores s` that the reader sees; the rest is only counted
 */
export async function routesWhere(
  tenant: Tenant,
  where: (binds: Binds) => string,
  seen: (binds: Binds) => string,
  now: Date,
): Promise<Route[]> {
  const binds = new Binds();
  const routes = await tenant.rows<RouteRow>(
    `SELECT ro.id, p.id AS "technicianId", p.name AS "technicianName",
       p.home_latitude AS "homeLatitude", p.home_longitude AS "homeLongitude",
       ro.on_date AS "onDate", ro.version, ro.published_version AS "publishedVersion",
       ro.published_at AS "publishedAt"
     FROM routes ro JOIN people p ON p.id = ro.technician_id
     WHERE ${where(binds)} ORDER BY lower(p.name), p.id, ro.on_date`,
    binds.values,
  );
  if (routes.length === 0) return [];
  const visits = await visitRows(tenant, routes, seen);
  const tasks = await tasksOf(tenant, visits, now);
  return routes.map((row) =>
    present(
      row,
      visits.filter(({ routeId }) => routeId === row.id),
      tasks,
    ),
  );
}

/** One route as the actor sees it, after a change that they were allowed. */
export async function plannedRoute(
  tenant: Tenant,
  actor: Actor,
  id: string,
  now: Date,
): Promise<Route> {
  const [found] = await routesWhere(
    tenant,
    (binds) => `ro.id = ${binds.add(id)}::uuid`,
    (binds) => visibleStores(actor, 'visits.plan', binds),
    now,
  );
  if (!found) throw notFound('route');
  return found;
}

/**
 * One route of somebody whom the actor may send, or with something on it that the actor plans.
 * @throws Problem 404
 */
export async function routeById(
  tenant: Tenant,
  actor: Actor,
  id: string,
  now: Date,
): Promise<Route> {
  const found = await plannedRoute(tenant, actor, id, now);
  if (found.visits.length > 0) return found;
  const theirs = await techniciansFor(tenant, actor, { technician: found.technician.id });
  if (theirs.length === 0) throw notFound('route');
  return found;
}

function visitRows(
  tenant: Tenant,
  routes: readonly RouteRow[],
  seen: (binds: Binds) => string,
): Promise<VisitRow[]> {
  const binds = new Binds();
  const ids = binds.add(routes.map(({ id }) => id));
  return tenant.rows<VisitRow>(
    `SELECT v.id, v.route_id AS "routeId", v.version, v.position, v.note, s.hours, ${stopColumn},
       (${seen(binds)}) AS seen
     FROM visits v JOIN stores s ON s.id = v.store_id
     WHERE v.route_id = ANY(${ids}::uuid[]) ORDER BY v.position, v.id`,
    binds.values,
  );
}

async function tasksOf(
  tenant: Tenant,
  visits: readonly VisitRow[],
  now: Date,
): Promise<Map<string, PlannedTaskRow[]>> {
  const ids = visits.filter(({ seen }) => seen).map(({ id }) => id);
  const byVisit = new Map<string, PlannedTaskRow[]>(ids.map((id) => [id, []]));
  if (ids.length === 0) return byVisit;
  const binds = new Binds();
  const where = `t.visit_id = ANY(${binds.add(ids)}::uuid[])`;
  for (const task of await plannedTaskRows(tenant, binds, where, now)) {
    byVisit.get(task.visitId ?? '')?.push(task);
  }
  return byVisit;
}

function present(
  row: RouteRow,
  rows: readonly VisitRow[],
  tasks: ReadonlyMap<string, PlannedTaskRow[]>,
): Route {
  const home = homeOf(row);
  const visits: Visit[] = [];
  let before: Position | null = home;
  for (const { id, version, position, note, store, hours, seen } of rows) {
    // From a stop that the reader does not see no leg can be told without telling where it is.
    const from = before;
    before = seen ? store : null;
    if (!seen) continue;
    const its = (tasks.get(id) ?? []).map(asPlannedTask);
    visits.push({
      id,
      version,
      position,
      note,
      store,
      hours: hoursOn(hours, row.onDate),
      legMetres: from && distanceMetres(from, store),
      minutes: sumMinutes(its),
      tasks: its,
    });
  }
  return {
    id: row.id,
    technician: { id: row.technicianId, name: row.technicianName, homeKnown: home !== null },
    onDate: row.onDate,
    state: routeState(row.version, row.publishedVersion),
    publishedAt: row.publishedAt?.toISOString() ?? null,
    version: row.version,
    visits,
    elsewhere: rows.length - visits.length,
    metres: visits.reduce((sum, { legMetres }) => sum + (legMetres ?? 0), 0),
    minutes: visits.reduce((sum, { minutes }) => sum + minutes, 0),
  };
}

function homeOf({ homeLatitude, homeLongitude }: RouteRow): Position | null {
  if (homeLatitude === null || homeLongitude === null) return null;
  return { latitude: homeLatitude, longitude: homeLongitude };
}
