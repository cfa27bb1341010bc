import { conflict } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { syncSchedules } from '../programmes/sync-schedules';
import { editableUnit } from './editable-unit';

/**
 * Takes a unit out of use for good, or back into it; its schedules end or come back.
 * @throws Problem 404; 403; 409 when somebody changed it meanwhile.
 */
export async function setUnitRetired(
  tenant: Tenant,
  actor: Actor,
  given: { id: string; version: number; retired: boolean; now: Date },
): Promise<void> {
  const before = await editableUnit(tenant, actor, given.id);
  if (before.version !== given.version) throw conflict();
  if (before.retired === given.retired) return;
  await tenant.rows('UPDATE units SET retired_at = $2, version = version + 1 WHERE id = $1', [
    given.id,
    given.retired ? given.now : null,
  ]);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'unit',
    subjectId: given.id,
    action: given.retired ? 'unit-retired' : 'unit-restored',
  });
  await syncSchedules(tenant, given.now, { storeIds: [before.store_id] });
}
