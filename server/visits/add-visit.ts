import type { BodyOf } from '@shared/contract/endpoint';
import { conflict } from '@shared/problem';
import type { addVisit as contract } from '@shared/visits/visits-contract';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { ensureRoute, lockRoutes, place, touchRoute } from './route-rows';
import { checkDay, checkTechnician, plannableStore } from './visit-policy';
import { takeTasks } from './visit-tasks';

/**
 * Bundles open tasks of a store into a visit on a technician's day. When the day has a visit there
 * already, that one takes the tasks on. Sent again it changes nothing.
 *
 * @returns the route's id
 * @throws Problem 403, 404; 422 under `technicianId`, `onDate` or each task's place
 */
export async function addVisit(
  tenant: Tenant,
  actor: Actor,
  wanted: BodyOf<typeof contract>,
  now: Date,
): Promise<string> {
  const { storeId, technicianId, onDate, note } = wanted;
  const store = await plannableStore(tenant, actor, storeId);
  checkDay(onDate, store, now);
  await checkTechnician(tenant, technicianId, store);
  const routeId = await ensureRoute(tenant, technicianId, onDate);
  await lockRoutes(tenant, [routeId]);
  const there = await tenant.row<{ id: string }>(
    'SELECT id FROM visits WHERE route_id = $1 AND store_id = $2',
    [routeId, storeId],
  );
  const id = there?.id ?? wanted.id;
  if (!there) {
    const made = await tenant.row(
      `INSERT INTO visits (id, organisation_id, route_id, store_id, position, note)
       SELECT $1, $2, $3, $4, count(*), $5 FROM visits WHERE route_id = $3
       ON CONFLICT (id) DO NOTHING RETURNING id`,
      [id, tenant.organisationId, routeId, storeId, note],
    );
    if (!made) throw conflict('This visit stands on another day.');
    await place(tenant, routeId, id, wanted.position);
  }
  const came = await takeTasks(tenant, { id, storeId, technicianId }, wanted.taskIds, now);
  if (there && came === 0) return routeId;
  await touchRoute(tenant, routeId);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'visit',
    subjectId: id,
    action: there ? 'tasks-added' : 'added',
    detail: { storeId, technicianId, onDate, taskIds: wanted.taskIds },
  });
  return routeId;
}
