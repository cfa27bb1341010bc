import { conflict, forbidden, invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { mayEditGroups } from './fleet-policy';
import { type GroupKind, tableOf } from './group-queries';

/** Another one carries this name already. */
export const groupNameTaken = () =>
  invalid([{ field: 'name', reason: 'taken', message: 'This name is taken.' }]);

/**
 * Adds a chain or a region.
 * @throws Problem 403; 422 when its name is taken, 409 when its id is.
 */
export async function createGroup(
  tenant: Tenant,
  actor: Actor,
  kind: GroupKind,
  { id, name }: { id: string; name: string },
): Promise<void> {
  if (!mayEditGroups(actor)) throw forbidden();
  const made = await tenant.row(
    `INSERT INTO ${tableOf[kind]} (id, organisation_id, name) VALUES ($1, $2, $3)
     ON CONFLICT DO NOTHING RETURNING id`,
    [id, tenant.organisationId, name],
  );
  if (!made) {
    const taken = await tenant.row(`SELECT id FROM ${tableOf[kind]} WHERE name = $1`, [name]);
    throw taken ? groupNameTaken() : conflict();
  }
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: kind,
    subjectId: id,
    action: `${kind}-created`,
    detail: { name },
  });
}
