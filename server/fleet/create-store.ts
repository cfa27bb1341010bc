import { conflict, forbidden } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { syncSchedules } from '../programmes/sync-schedules';
import { mayEditAt } from './fleet-policy';
import { type StoreInput, settleStore } from './settle-store';

/**
 * Adds a store; what its chain and region are enrolled in begins to count for it.
 * @throws Problem 403; 422 naming the fields at fault; 409 when its id is taken.
 */
export async function createStore(
  tenant: Tenant,
  actor: Actor,
  { id, now, ...input }: StoreInput & { id: string; now: Date },
): Promise<void> {
  if (!mayEditAt(actor, { ...input, storeId: id })) throw forbidden();
  const store = await settleStore(tenant, id, input);
  const columns = Object.keys(store);
  const made = await tenant.row(
    `INSERT INTO stores (id, organisation_id, ${columns.join(', ')})
     VALUES ($1, $2, ${columns.map((_, index) => `$${index + 3}`).join(', ')})
     ON CONFLICT DO NOTHING RETURNING id`,
    [id, tenant.organisationId, ...Object.values({ ...store, hours: JSON.stringify(store.hours) })],
  );
  if (!made) throw conflict();
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'store',
    subjectId: id,
    action: 'store-created',
    detail: { number: store.number, name: store.name },
  });
  await syncSchedules(tenant, now, { storeIds: [id] });
}
