import type { ProcedureContent } from '@shared/procedures/procedure-content';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { authoriseEverywhere } from '../access/authorise';
import { recordEvent } from '../audit/record-event';
import { lockDraft } from './draft-queries';

/**
 * Saves a draft as it stands, finished or not.
 * @throws Problem 404; 409 when there is no draft, or somebody saved it meanwhile.
 */
export async function saveDraft(
  tenant: Tenant,
  actor: Actor,
  { id, version, content }: { id: string; version: number; content: ProcedureContent },
): Promise<void> {
  authoriseEverywhere(actor, 'procedures.edit');
  const draft = await lockDraft(tenant, id, version);
  await tenant.rows(
    'UPDATE procedure_versions SET content = $2, version = version + 1 WHERE id = $1',
    [draft.id, JSON.stringify(content)],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'procedure',
    subjectId: id,
    action: 'procedure-draft-saved',
    detail: { number: draft.number },
  });
}
