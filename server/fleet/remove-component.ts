import type { RemovalCause } from '@shared/fleet/components-contract';
import { Problem, conflict, invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { syncSchedules } from '../programmes/sync-schedules';
import { inFuture } from './check-component';
import { type EditableComponent, editableComponent } from './component-queries';
import { localDay } from './fleet-policy';

export interface Removal {
  readonly id: string;
  readonly version: number;
  readonly removedOn: string;
  readonly cause: RemovalCause;
  readonly now: Date;
}

/**
 * Takes a part off its unit, for a cause, without a new one.
 * @throws Problem 404; 403; 409 when it came off already or was changed meanwhile; 422 for the day.
 */
export async function removeComponent(
  tenant: Tenant,
  actor: Actor,
  removal: Removal,
): Promise<void> {
  const before = await takeOff(tenant, actor, removal);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'component',
    subjectId: removal.id,
    action: 'component-removed',
    detail: {
      unitId: before.unitId,
      kind: before.kind,
      cause: removal.cause,
      on: removal.removedOn,
    },
  });
  if (before.kind === 'pump') {
    await syncSchedules(tenant, removal.now, { storeIds: [before.place.storeId] });
  }
}

/** The removal itself, without a word to the audit; see {@link removeComponent}. */
export async function takeOff(
  tenant: Tenant,
  actor: Actor,
  { id, version, removedOn, cause, now }: Removal,
): Promise<EditableComponent> {
  const before = await editableComponent(tenant, actor, id);
  if (before.version !== version) throw conflict();
  if (before.removedOn !== null) {
    throw new Problem(409, 'came-off', 'This part came off already.', {
      detail: 'This part came off already.',
    });
  }
  if (removedOn > localDay(now, before.place.timeZone)) throw invalid([inFuture('removedOn')]);
  if (removedOn < before.installedOn) {
    const message = 'It was fitted after this day.';
    throw invalid([{ field: 'removedOn', reason: 'before-fitting', message }]);
  }
  await tenant.rows(
    `UPDATE components SET removed_on = $2, removal_cause = $3, version = version + 1 WHERE id = $1`,
    [id, removedOn, cause],
  );
  return before;
}
