import { conflict } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { syncSchedules } from '../programmes/sync-schedules';
import { requireFree } from './check-component';
import { editableComponent } from './component-queries';

/**
 * Says that a part never came off.
 * @throws Problem 404; 403; 409 when it was changed meanwhile; 422 when another is fitted in its place.
 */
export async function undoRemoval(
  tenant: Tenant,
  actor: Actor,
  given: { id: string; version: number; now: Date },
): Promise<void> {
  const before = await editableComponent(tenant, actor, given.id);
  if (before.version !== given.version) throw conflict();
  if (before.removedOn === null) return;
  await requireFree(tenant, before.unitId, before.kind);
  await tenant.rows(
    `UPDATE components SET removed_on = NULL, removal_cause = NULL, version = version + 1
     WHERE id = $1`,
    [given.id],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'component',
    subjectId: given.id,
    action: 'component-removal-undone',
    detail: { unitId: before.unitId, kind: before.kind },
  });
  if (before.kind === 'pump') {
    await syncSchedules(tenant, given.now, { storeIds: [before.place.storeId] });
  }
}
