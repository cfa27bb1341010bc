import { Problem, conflict, forbidden, notFound } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { mayEditGroups } from './fleet-policy';
import { type GroupKind, columnOf, tableOf } from './group-queries';

/**
 * Takes a chain or a region out of use, or back into it.
 * @throws Problem 403; 404; 409 `changed-meanwhile`, or `in-use` while it has live stores.
 */
export async function setGroupRetired(
  tenant: Tenant,
  actor: Actor,
  kind: GroupKind,
  given: { id: string; version: number; retired: boolean; now: Date },
): Promise<void> {
  if (!mayEditGroups(actor)) throw forbidden();
  const before = await tenant.row<{ version: number; retired: boolean; stores: number }>(
    `SELECT g.version, g.retired_at IS NOT NULL AS retired, (SELECT count(*)::int FROM stores s
       WHERE s.${columnOf[kind]} = g.id AND s.retired_at IS NULL) AS stores
     FROM ${tableOf[kind]} g WHERE g.id = $1 FOR UPDATE`,
    [given.id],
  );
  if (!before) throw notFound(kind);
  if (before.version !== given.version) throw conflict();
  if (before.retired === given.retired) return;
  if (given.retired && before.stores > 0) {
    throw new Problem(409, 'in-use', 'Stores in use belong to this.', {
      detail: `${before.stores} stores in use belong to this ${kind}. Move or retire them first.`,
    });
  }
  await tenant.rows(
    `UPDATE ${tableOf[kind]} SET retired_at = $2, version = version + 1 WHERE id = $1`,
    [given.id, given.retired ? given.now : null],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: kind,
    subjectId: given.id,
    action: `${kind}-${given.retired ? 'retired' : 'restored'}`,
  });
}
