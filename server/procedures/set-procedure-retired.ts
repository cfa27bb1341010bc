import { Problem, conflict } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { authoriseEverywhere } from '../access/authorise';
import { recordEvent } from '../audit/record-event';
import { findProcedure, rulesUsing } from './procedure-queries';

/**
 * Retires a procedure (`at` an instant) or takes it back into use (`at` null).
 * @throws Problem 404; 409 `in-use` while rules in force use it, or when somebody changed it.
 */
export async function setProcedureRetired(
  tenant: Tenant,
  actor: Actor,
  { id, version, at }: { id: string; version: number; at: Date | null },
): Promise<void> {
  authoriseEverywhere(actor, 'procedures.edit');
  const found = await findProcedure(tenant, id, { lock: true });
  if (found.version !== version) throw conflict();
  const users = at ? await rulesUsing(tenant, id) : [];
  if (users.length > 0) {
    throw new Problem(409, 'in-use', 'Rules still use this procedure.', {
      detail: `Retire them first: ${users.map(({ name }) => name).join(', ')}.`,
    });
  }
  await tenant.rows('UPDATE procedures SET retired_at = $2, version = version + 1 WHERE id = $1', [
    id,
    at,
  ]);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'procedure',
    subjectId: id,
    action: at ? 'procedure-retired' : 'procedure-restored',
  });
}
