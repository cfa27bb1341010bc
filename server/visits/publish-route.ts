import { Problem } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { lockRoute } from './route-rows';

/**
 * Shows a day to its technician and its stores. Published again without a change it stays as it is.
 * @throws Problem 404, 409 when it changed meanwhile, 422 when there was never anything on it
 */
export async function publishRoute(
  tenant: Tenant,
  actor: Actor,
  id: string,
  version: number,
  now: Date,
): Promise<void> {
  const route = await lockRoute(tenant, id, version);
  if (route.publishedVersion === route.version) return;
  const visits = await tenant.rows<{ id: string }>('SELECT id FROM visits WHERE route_id = $1', [
    id,
  ]);
  // A day that was told and then emptied is told as empty.
  if (visits.length === 0 && route.publishedVersion === null) {
    throw new Problem(422, 'empty-route', 'There is no visit on this day yet.');
  }
  await tenant.rows(
    `UPDATE routes SET published_at = $2, published_by = $3, published_version = version
     WHERE id = $1`,
    [id, now, actor.personId],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'route',
    subjectId: id,
    action: 'published',
    detail: { visits: visits.length, version: route.version },
  });
}
