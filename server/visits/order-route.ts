import { invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import type { Position } from '../fleet/locate-store';
import { nearestNext } from './nearest-next';
import { lockRoute, renumber, touchRoute, visitSlots } from './route-rows';

/**
 * Puts a day's visits in order. Visits in stores where the actor plans nothing keep their places.
 * @throws Problem 404, 409; 422 when the ids are not exactly those of the visits in sight
 */
export async function orderRoute(
  tenant: Tenant,
  actor: Actor,
  id: string,
  wanted: { readonly version: number; readonly visitIds: readonly string[] },
): Promise<void> {
  await lockRoute(tenant, id, wanted.version);
  const slots = await visitSlots(tenant, actor, id);
  const seen = new Set(slots.filter((slot) => slot.seen).map((slot) => slot.id));
  const given = new Set(wanted.visitIds);
  const same = given.size === wanted.visitIds.length && given.size === seen.size;
  if (!same || wanted.visitIds.some((visitId) => !seen.has(visitId))) {
    throw invalid([
      {
        field: 'visitIds',
        reason: 'other-visits',
        message: 'These are not the visits of the day.',
      },
    ]);
  }
  await putInOrder(tenant, actor, id, slots, wanted.visitIds, 'ordered');
}

/**
 * Orders a day from the technician's home to the nearest stop, and from each to the nearest left;
 * without a known home the first stop stays first.
 * @throws Problem 404, 409
 */
export async function orderNearestNext(
  tenant: Tenant,
  actor: Actor,
  id: string,
  version: number,
): Promise<void> {
  const route = await lockRoute(tenant, id, version);
  const slots = await visitSlots(tenant, actor, id);
  const home = await tenant.row<{ latitude: number | null; longitude: number | null }>(
    'SELECT home_latitude AS latitude, home_longitude AS longitude FROM people WHERE id = $1',
    [route.technicianId],
  );
  const start = home?.latitude == null || home.longitude === null ? null : (home as Position);
  const ordered = nearestNext(
    start,
    slots.filter(({ seen }) => seen),
  );
  await putInOrder(
    tenant,
    actor,
    id,
    slots,
    ordered.map((stop) => stop.id),
    'ordered-nearest-next',
  );
}

async function putInOrder(
  tenant: Tenant,
  actor: Actor,
  routeId: string,
  slots: readonly { readonly id: string; readonly seen: boolean }[],
  order: readonly string[],
  action: string,
): Promise<void> {
  const next = order[Symbol.iterator]();
  const all = slots.map((slot) => (slot.seen ? (next.next().value as string) : slot.id));
  if (all.every((id, index) => id === slots[index]?.id)) return;
  await renumber(tenant, routeId, all);
  await touchRoute(tenant, routeId);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'route',
    subjectId: routeId,
    action,
    detail: { visitIds: all },
  });
}
