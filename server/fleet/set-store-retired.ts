import { Problem, conflict } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { syncSchedules } from '../programmes/sync-schedules';
import { editableStore } from './fleet-policy';

/**
 * Takes a store out of use, or back into it. Its units stay as they are; all schedules at it end or
 * come back.
 * @throws Problem 404; 403; 409 `changed-meanwhile`, or `group-retired`.
 */
export async function setStoreRetired(
  tenant: Tenant,
  actor: Actor,
  given: { id: string; version: number; retired: boolean; now: Date },
): Promise<void> {
  await editableStore(tenant, actor, given.id);
  const before = await tenant.row<{ version: number; retired: boolean; homeless: boolean }>(
    `SELECT s.version, s.retired_at IS NOT NULL AS retired,
       c.retired_at IS NOT NULL OR r.retired_at IS NOT NULL AS homeless
     FROM stores s JOIN chains c ON c.id = s.chain_id JOIN regions r ON r.id = s.region_id
     WHERE s.id = $1 FOR UPDATE OF s`,
    [given.id],
  );
  if (before?.version !== given.version) throw conflict();
  if (before.retired === given.retired) return;
  if (!given.retired && before.homeless) {
    throw new Problem(409, 'group-retired', 'Its chain or region is retired.', {
      detail: 'Its chain or region is retired. Restore that first.',
    });
  }
  await tenant.rows('UPDATE stores SET retired_at = $2, version = version + 1 WHERE id = $1', [
    given.id,
    given.retired ? given.now : null,
  ]);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'store',
    subjectId: given.id,
    action: given.retired ? 'store-retired' : 'store-restored',
  });
  await syncSchedules(tenant, given.now, { storeIds: [given.id] });
}
