import { Problem } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { authoriseEverywhere } from '../access/authorise';
import { recordEvent } from '../audit/record-event';
import { lockDraft } from './draft-queries';

/**
 * Throws a draft away. The first one stays: a procedure without any version would be empty.
 * @throws Problem 404; 409 `first-draft`, `no-draft`, or when somebody saved it meanwhile.
 */
export async function discardDraft(
  tenant: Tenant,
  actor: Actor,
  { id, version }: { id: string; version: number },
): Promise<void> {
  authoriseEverywhere(actor, 'procedures.edit');
  const draft = await lockDraft(tenant, id, version);
  if (draft.number === 1) {
    throw new Problem(409, 'first-draft', 'The first draft cannot be thrown away.', {
      detail: 'Retire the procedure instead.',
    });
  }
  await tenant.rows('DELETE FROM procedure_versions WHERE id = $1', [draft.id]);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'procedure',
    subjectId: id,
    action: 'procedure-draft-discarded',
    detail: { number: draft.number, content: draft.content },
  });
}
