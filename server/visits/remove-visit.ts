import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { lockVisit, place, refuseBegun, touchRoute } from './route-rows';
import { plannableStore } from './visit-policy';
import { releaseTasks } from './visit-tasks';

/**
 * Takes a visit off its day; its tasks are unplanned again.
 * @returns the route's id
 * @throws Problem 403, 404, 409 also when work was done on it
 */
export async function removeVisit(
  tenant: Tenant,
  actor: Actor,
  id: string,
  version: number,
): Promise<string> {
  const { storeId, route } = await lockVisit(tenant, id, version);
  await plannableStore(tenant, actor, storeId);
  await refuseBegun(tenant, id);
  await releaseTasks(tenant, id);
  await tenant.rows('DELETE FROM visits WHERE id = $1', [id]);
  await place(tenant, route.id, null);
  await touchRoute(tenant, route.id);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'visit',
    subjectId: id,
    action: 'removed',
    detail: { storeId, technicianId: route.technicianId, onDate: route.onDate },
  });
  return route.id;
}
