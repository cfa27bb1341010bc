import type { BodyOf } from '@shared/contract/endpoint';
import type { moveVisit as contract } from '@shared/visits/visits-contract';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { ensureRoute, lockVisit, place, refuseBegun, touchRoute } from './route-rows';
import { checkDay, checkTechnician, plannableStore } from './visit-policy';

/**
 * Gives a visit with its tasks to another technician, another day, or another place in the order.
 * When that day has a visit at the store already, that one takes the tasks on.
 *
 * @returns the id of the route it is on now
 * @throws Problem 403, 404, 409 also when work was done on it; 422 under `technicianId` or `onDate`
 */
export async function moveVisit(
  tenant: Tenant,
  actor: Actor,
  id: string,
  to: BodyOf<typeof contract>,
  now: Date,
): Promise<string> {
  const targetId = await ensureRoute(tenant, to.technicianId, to.onDate);
  const visit = await lockVisit(tenant, id, to.version, [targetId]);
  const store = await plannableStore(tenant, actor, visit.storeId);
  checkDay(to.onDate, store, now);
  await checkTechnician(tenant, to.technicianId, store);
  await refuseBegun(tenant, id);
  if (targetId !== visit.routeId) {
    const there = await tenant.row<{ id: string }>(
      'SELECT id FROM visits WHERE route_id = $1 AND store_id = $2',
      [targetId, visit.storeId],
    );
    await tenant.rows(
      `UPDATE tasks SET visit_id = $2, assigned_to = $3, version = version + 1
       WHERE visit_id = $1 AND outcome = 'none'`,
      [id, there?.id ?? id, to.technicianId],
    );
    if (there) await tenant.rows('DELETE FROM visits WHERE id = $1', [id]);
    else await carryOver(tenant, id, targetId);
    await place(tenant, visit.routeId, null);
    await touchRoute(tenant, visit.routeId);
    await place(tenant, targetId, there?.id ?? id, to.position);
  } else {
    await place(tenant, targetId, id, to.position);
  }
  await touchRoute(tenant, targetId);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'visit',
    subjectId: id,
    action: 'moved',
    detail: {
      from: [visit.route.technicianId, visit.route.onDate],
      to: [to.technicianId, to.onDate],
    },
  });
  return targetId;
}

async function carryOver(tenant: Tenant, id: string, targetId: string): Promise<void> {
  await tenant.rows(
    `UPDATE visits SET route_id = $2, version = version + 1,
       position = (SELECT count(*) FROM visits WHERE route_id = $2)
     WHERE id = $1`,
    [id, targetId],
  );
}
