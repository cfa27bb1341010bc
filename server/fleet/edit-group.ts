import { conflict, forbidden, notFound } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { changesOf } from '../audit/changes-of';
import { recordEvent } from '../audit/record-event';
import { groupNameTaken } from './create-group';
import { mayEditGroups } from './fleet-policy';
import { type GroupKind, tableOf } from './group-queries';

/**
 * Renames a chain or a region.
 * @throws Problem 403; 404; 409 when somebody changed it meanwhile; 422 when the name is taken.
 */
export async function editGroup(
  tenant: Tenant,
  actor: Actor,
  kind: GroupKind,
  { id, name, version }: { id: string; name: string; version: number },
): Promise<void> {
  if (!mayEditGroups(actor)) throw forbidden();
  const table = tableOf[kind];
  const before = await tenant.row<{ name: string; version: number }>(
    `SELECT name, version FROM ${table} WHERE id = $1 FOR UPDATE`,
    [id],
  );
  if (!before) throw notFound(kind);
  if (before.version !== version) throw conflict();
  const taken = await tenant.row(`SELECT id FROM ${table} WHERE name = $1 AND id <> $2`, [
    name,
    id,
  ]);
  if (taken) throw groupNameTaken();
  await tenant.rows(`UPDATE ${table} SET name = $2, version = version + 1 WHERE id = $1`, [
    id,
    name,
  ]);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: kind,
    subjectId: id,
    action: `${kind}-edited`,
    detail: { changes: changesOf({ name: before.name }, { name }) },
  });
}
