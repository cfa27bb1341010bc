import type { BodyOf } from '@shared/contract/endpoint';
import type { editComponent as contract } from '@shared/fleet/components-contract';
import { type FieldError, conflict, invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { changesOf } from '../audit/changes-of';
import { recordEvent } from '../audit/record-event';
import { syncSchedules } from '../programmes/sync-schedules';
import { componentFaults } from './check-component';
import { editableComponent } from './component-queries';
import { localDay } from './fleet-policy';

/**
 * Corrects what is written down of a part: serial number, nameplate, face, day of fitting.
 * @throws Problem 404; 403; 409 when somebody changed it meanwhile; 422 naming the fields at fault.
 */
export async function editComponent(
  tenant: Tenant,
  actor: Actor,
  { id, version, now, ...input }: BodyOf<typeof contract> & { id: string; now: Date },
): Promise<void> {
  const before = await editableComponent(tenant, actor, id);
  if (before.version !== version) throw conflict();
  const today = localDay(now, before.place.timeZone);
  const faults: FieldError[] = componentFaults({ ...input, kind: before.kind }, today);
  if (before.removedOn !== null && input.installedOn > before.removedOn) {
    faults.push({
      field: 'installedOn',
      reason: 'after-removal',
      message: 'It came off before this day.',
    });
  }
  if (faults.length > 0) throw invalid(faults);
  await tenant.rows(
    `UPDATE components SET serial_number = $2, model = $3, nameplate = $4, pump_face = $5,
       installed_on = $6, version = version + 1
     WHERE id = $1`,
    [
      id,
      input.serialNumber,
      input.model,
      JSON.stringify(input.nameplate),
      input.pumpFace,
      input.installedOn,
    ],
  );
  const { serialNumber, model, nameplate, pumpFace, installedOn } = before;
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'component',
    subjectId: id,
    action: 'component-edited',
    detail: {
      unitId: before.unitId,
      changes: changesOf({ serialNumber, model, nameplate, pumpFace, installedOn }, input),
    },
  });
  if (pumpFace !== input.pumpFace) {
    await syncSchedules(tenant, now, { storeIds: [before.place.storeId] });
  }
}
