import { conflict, forbidden } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { changesOf } from '../audit/changes-of';
import { recordEvent } from '../audit/record-event';
import { syncSchedules } from '../programmes/sync-schedules';
import { editableStore, mayEditAt } from './fleet-policy';
import { type SettledStore, type StoreInput, settleStore } from './settle-store';

/**
 * Changes a store, or moves it to another chain or region. Another time zone empties how far its
 * schedules were generated, so that tasks to come move to the new wall clock.
 * @throws Problem 404; 403, also for where it is to go; 409; 422 naming the fields at fault.
 */
export async function editStore(
  tenant: Tenant,
  actor: Actor,
  { id, version, now, ...input }: StoreInput & { id: string; version: number; now: Date },
): Promise<void> {
  await editableStore(tenant, actor, id);
  if (!mayEditAt(actor, { ...input, storeId: id })) throw forbidden();
  const before = (await tenant.row<SettledStore & { version: number }>(
    'SELECT * FROM stores WHERE id = $1 FOR UPDATE',
    [id],
  )) as SettledStore & { version: number };
  if (before.version !== version) throw conflict();
  const after = await settleStore(tenant, id, input);
  const columns = Object.keys(after);
  await tenant.rows(
    `UPDATE stores SET version = version + 1,
       ${columns.map((column, index) => `${column} = $${index + 2}`).join(', ')}
     WHERE id = $1`,
    [id, ...Object.values({ ...after, hours: JSON.stringify(after.hours) })],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'store',
    subjectId: id,
    action: 'store-edited',
    detail: { changes: changesOf<SettledStore>(before, after) },
  });
  if (before.time_zone !== after.time_zone) {
    await tenant.rows(
      `UPDATE schedules SET generated_to = NULL, generated_revision = NULL
       WHERE store_id = $1 AND ended_at IS NULL`,
      [id],
    );
  }
  await syncSchedules(tenant, now, { storeIds: [id] });
}
