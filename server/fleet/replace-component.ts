import type { BodyOf } from '@shared/contract/endpoint';
import type { replaceComponent as contract } from '@shared/fleet/components-contract';
import { invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { syncSchedules } from '../programmes/sync-schedules';
import { componentFaults } from './check-component';
import { insertComponent } from './insert-component';
import { takeOff } from './remove-component';

/**
 * Takes a part off for a cause and fits a new one of its kind on the same day.
 * @throws Problem 404; 403; 409 when it came off already or was changed meanwhile; 422.
 */
export async function replaceComponent(
  tenant: Tenant,
  actor: Actor,
  { id, now, fitted, ...removal }: BodyOf<typeof contract> & { id: string; now: Date },
): Promise<void> {
  const old = await takeOff(tenant, actor, { id, now, ...removal });
  const part = { ...fitted, kind: old.kind, installedOn: removal.removedOn };
  // The day itself was looked at as the day of removal.
  const faults = componentFaults(part, removal.removedOn, 'fitted.');
  if (faults.length > 0) throw invalid(faults);
  await insertComponent(tenant, old.unitId, part);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'component',
    subjectId: id,
    action: 'component-replaced',
    detail: {
      unitId: old.unitId,
      kind: old.kind,
      cause: removal.cause,
      on: removal.removedOn,
      by: part.id,
    },
  });
  if (old.kind === 'pump') await syncSchedules(tenant, now, { storeIds: [old.place.storeId] });
}
