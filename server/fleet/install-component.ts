import { invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { syncSchedules } from '../programmes/sync-schedules';
import { componentFaults, requireFree } from './check-component';
import { editableUnit } from './editable-unit';
import { localDay } from './fleet-policy';
import { type NewComponent, insertComponent } from './insert-component';

/**
 * Fits a part that the unit lacks. Rules can ask for a pump's face, so schedules are looked at again.
 * @throws Problem 404; 403; 409 when its id is taken; 422 when one is fitted already.
 */
export async function installComponent(
  tenant: Tenant,
  actor: Actor,
  { unitId, now, ...part }: NewComponent & { unitId: string; now: Date },
): Promise<void> {
  const { place } = await editableUnit(tenant, actor, unitId);
  const faults = componentFaults(part, localDay(now, place.timeZone));
  if (faults.length > 0) throw invalid(faults);
  await requireFree(tenant, unitId, part.kind);
  await insertComponent(tenant, unitId, part);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'component',
    subjectId: part.id,
    action: 'component-installed',
    detail: { unitId, kind: part.kind, serialNumber: part.serialNumber },
  });
  if (part.kind === 'pump') await syncSchedules(tenant, now, { storeIds: [place.storeId] });
}
