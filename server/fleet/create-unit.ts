import { singleComponents } from '@shared/fleet/fleet-words';
import { Problem, type FieldError, conflict } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { syncSchedules } from '../programmes/sync-schedules';
import { componentFaults } from './check-component';
import { editableStore, localDay } from './fleet-policy';
import { type NewComponent, insertComponent } from './insert-component';
import { type UnitInput, settleUnit } from './settle-unit';

/** Units stand in stores in use only. */
export const storeRetired = () =>
  new Problem(409, 'store-retired', 'The store is retired.', {
    detail: 'The store is retired. Restore it first.',
  });

/**
 * Adds a unit to a store, with what is known of its parts.
 * @throws Problem 404; 403; 409 when the store is retired or an id is taken; 422.
 */
export async function createUnit(
  tenant: Tenant,
  actor: Actor,
  {
    id,
    components,
    now,
    ...input
  }: UnitInput & { id: string; components: readonly NewComponent[]; now: Date },
): Promise<void> {
  const place = await editableStore(tenant, actor, input.storeId);
  if (place.retiredAt) throw storeRetired();
  const today = localDay(now, place.timeZone);
  const unit = await settleUnit(tenant, id, input, today, faultsOf(components, today));
  const columns = Object.keys(unit);
  const made = await tenant.row(
    `INSERT INTO units (id, organisation_id, ${columns.join(', ')})
     VALUES ($1, $2, ${columns.map((_, index) => `$${index + 3}`).join(', ')})
     ON CONFLICT DO NOTHING RETURNING id`,
    [id, tenant.organisationId, ...Object.values(unit)],
  );
  if (!made) throw conflict();
  for (const part of components) await insertComponent(tenant, id, part);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'unit',
    subjectId: id,
    action: 'unit-created',
    detail: { tag: unit.tag, storeId: unit.store_id, components: components.length },
  });
  await syncSchedules(tenant, now, { storeIds: [unit.store_id] });
}

function faultsOf(components: readonly NewComponent[], today: string): FieldError[] {
  return components.flatMap((part, index) => {
    const at = `components.${index}.`;
    const faults = componentFaults(part, today, at);
    const doubled =
      singleComponents.includes(part.kind) &&
      components.findIndex(({ kind }) => kind === part.kind) < index;
    if (doubled) {
      faults.push({
        field: `${at}kind`,
        reason: 'part-fitted',
        message: 'A unit has one of these at a time.',
      });
    }
    return faults;
  });
}
