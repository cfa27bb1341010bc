import { randomUUID } from 'node:crypto';
import { Problem, conflict, notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';

/** A route held against other changes until the transaction ends. */
export interface LockedRoute {
  readonly id: string;
  readonly technicianId: string;
  readonly onDate: string;
  readonly version: number;
  readonly publishedVersion: number | null;
}

export interface LockedVisit {
  readonly id: string;
  readonly routeId: string;
  readonly storeId: string;
  readonly position: number;
  readonly note: string;
  readonly version: number;
}

const columns = `id, technician_id AS "technicianId", on_date AS "onDate", version,
  published_version AS "publishedVersion"`;

/** The id of a technician's day, which is made when there is none yet. */
export async function ensureRoute(
  tenant: Tenant,
  technicianId: string,
  onDate: string,
): Promise<string> {
  await tenant.rows(
    `INSERT INTO routes (id, organisation_id, technician_id, on_date) VALUES ($1, $2, $3, $4)
     ON CONFLICT (technician_id, on_date) DO NOTHING`,
    [randomUUID(), tenant.organisationId, technicianId, onDate],
  );
  const route = await tenant.row<{ id: string }>(
    'SELECT id FROM routes WHERE technician_id = $1 AND on_date = $2',
    [technicianId, onDate],
  );
  return (route as { id: string }).id;
}

/**
 * Routes held until the transaction ends, always in the same order, so that two planners who move
 * visits between the same days wait for each other instead of standing in each other's way.
 * @throws Problem 404 when one is gone
 */
export async function lockRoutes(tenant: Tenant, ids: readonly string[]): Promise<LockedRoute[]> {
  const wanted = [...new Set(ids)];
  const rows = await tenant.rows<LockedRoute>(
    `SELECT ${columns} FROM routes WHERE id = ANY($1::uuid[]) ORDER BY id FOR UPDATE`,
    [wanted],
  );
  if (rows.length < wanted.length) throw notFound('route');
  return rows;
}

/** One route in the version that the actor knows. @throws Problem 404, 409 */
export async function lockRoute(tenant: Tenant, id: string, version: number): Promise<LockedRoute> {
  const [route] = await lockRoutes(tenant, [id]);
  if (route?.version !== version) throw conflict();
  return route;
}

/**
 * A visit with its route held, in the version that the actor knows, with no work done on it yet.
 * @throws Problem 404, 409
 */
export async function lockVisit(
  tenant: Tenant,
  id: string,
  version: number,
  also: readonly string[] = [],
): Promise<LockedVisit & { readonly route: LockedRoute }> {
  const before = await tenant.row<{ routeId: string }>(
    'SELECT route_id AS "routeId" FROM visits WHERE id = $1',
    [id],
  );
  if (!before) throw notFound('visit');
  const routes = await lockRoutes(tenant, [before.routeId, ...also]);
  const visit = await tenant.row<LockedVisit>(
    `SELECT id, route_id AS "routeId", store_id AS "storeId", position, note, version
     FROM visits WHERE id = $1 AND route_id = $2 FOR UPDATE`,
    [id, before.routeId],
  );
  const route = routes.find((it) => it.id === before.routeId);
  if (!visit || !route || visit.version !== version) throw conflict();
  return { ...visit, route };
}

/** @throws Problem 409 when a task of the visit was done: what happened is not planned away */
export async function refuseBegun(tenant: Tenant, visitId: string): Promise<void> {
  const done = await tenant.row(
    `SELECT id FROM tasks WHERE visit_id = $1 AND outcome = 'done' LIMIT 1`,
    [visitId],
  );
  if (!done) return;
  throw new Problem(409, 'visit-begun', 'Work was done on this visit already.', {
    detail: 'Move the tasks that are left to another day one by one.',
  });
}

/** Marks a route as other than it was told. */
export async function touchRoute(tenant: Tenant, routeId: string): Promise<void> {
  await tenant.rows('UPDATE routes SET version = version + 1 WHERE id = $1', [routeId]);
}

/** Ids of a route's visits in order, with whether the actor plans there. */
export function visitSlots(
  tenant: Tenant,
  actor: Actor,
  routeId: string,
): Promise<{ id: string; latitude: number; longitude: number; seen: boolean }[]> {
  const binds = new Binds();
  return tenant.rows(
    `SELECT v.id, s.latitude, s.longitude, (${visibleStores(actor, 'visits.plan', binds)}) AS seen
     FROM visits v JOIN stores s ON s.id = v.store_id
     WHERE v.route_id = ${binds.add(routeId)}::uuid ORDER BY v.position`,
    binds.values,
  );
}

/** Numbers a route's visits in the order given, from 0. */
export async function renumber(
  tenant: Tenant,
  routeId: string,
  visitIds: readonly string[],
): Promise<void> {
  await tenant.rows(
    `UPDATE visits v SET position = o.nth - 1
     FROM unnest($2::uuid[]) WITH ORDINALITY AS o (id, nth)
     WHERE v.id = o.id AND v.route_id = $1`,
    [routeId, visitIds],
  );
}

/** Puts one visit at a place of its route's order and closes every gap. */
export async function place(
  tenant: Tenant,
  routeId: string,
  visitId: string | null,
  position?: number,
): Promise<void> {
  const rows = await tenant.rows<{ id: string }>(
    'SELECT id FROM visits WHERE route_id = $1 ORDER BY position',
    [routeId],
  );
  const ids = rows.map(({ id }) => id);
  if (visitId !== null && position !== undefined) {
    ids.splice(ids.indexOf(visitId), 1);
    ids.splice(position, 0, visitId);
  }
  await renumber(tenant, routeId, ids);
}
