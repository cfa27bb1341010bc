import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { lockVisit, touchRoute } from './route-rows';
import { plannableStore } from './visit-policy';
import { releaseTasks, takeTasks } from './visit-tasks';

/**
 * Changes a visit's note or which open tasks it holds; tasks that were done on it stay.
 * @returns the route's id
 * @throws Problem 403, 404, 409; 422 for tasks that cannot come
 */
export async function editVisit(
  tenant: Tenant,
  actor: Actor,
  id: string,
  change: {
    readonly version: number;
    readonly note?: string | undefined;
    readonly taskIds?: readonly string[] | undefined;
  },
  now: Date,
): Promise<string> {
  const visit = await lockVisit(tenant, id, change.version);
  await plannableStore(tenant, actor, visit.storeId);
  const { storeId, route } = visit;
  if (change.taskIds) {
    await releaseTasks(tenant, id, change.taskIds);
    await takeTasks(tenant, { id, storeId, technicianId: route.technicianId }, change.taskIds, now);
  }
  await tenant.rows('UPDATE visits SET note = $2, version = version + 1 WHERE id = $1', [
    id,
    change.note ?? visit.note,
  ]);
  await touchRoute(tenant, route.id);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'visit',
    subjectId: id,
    action: 'changed',
    detail: { note: change.note, taskIds: change.taskIds },
  });
  return route.id;
}
