import { conflict } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { changesOf } from '../audit/changes-of';
import { recordEvent } from '../audit/record-event';
import { syncSchedules } from '../programmes/sync-schedules';
import { storeRetired } from './create-unit';
import { type UnitColumns, editableUnit } from './editable-unit';
import { editableStore, localDay } from './fleet-policy';
import { type UnitInput, settleUnit } from './settle-unit';

/**
 * Changes a unit, or moves it to another store; its schedules follow.
 * @throws Problem 404; 403 at either store; 409; 422 naming the fields at fault.
 */
export async function editUnit(
  tenant: Tenant,
  actor: Actor,
  { id, version, now, ...input }: UnitInput & { id: string; version: number; now: Date },
): Promise<void> {
  const { place, ...before } = await editableUnit(tenant, actor, id);
  if (before.version !== version) throw conflict();
  const moved = input.storeId !== before.store_id;
  const to = moved ? await editableStore(tenant, actor, input.storeId) : place;
  if (moved && to.retiredAt) throw storeRetired();
  const after = await settleUnit(tenant, id, input, localDay(now, to.timeZone));
  const columns = Object.keys(after);
  await tenant.rows(
    `UPDATE units SET version = version + 1,
       ${columns.map((column, index) => `${column} = $${index + 2}`).join(', ')}
     WHERE id = $1`,
    [id, ...Object.values(after)],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'unit',
    subjectId: id,
    action: moved ? 'unit-moved' : 'unit-edited',
    detail: { changes: changesOf<UnitColumns>(before, after) },
  });
  await syncSchedules(tenant, now, { storeIds: [...new Set([before.store_id, after.store_id])] });
}
