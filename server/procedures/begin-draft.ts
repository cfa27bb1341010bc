import { Problem } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { authoriseEverywhere } from '../access/authorise';
import { recordEvent } from '../audit/record-event';
import { findProcedure } from './procedure-queries';

/**
 * Begins the next version with what the last one says.
 * @throws Problem 404; 409 `draft-exists` when somebody has begun one already.
 */
export async function beginDraft(
  tenant: Tenant,
  actor: Actor,
  { id, versionId }: { id: string; versionId: string },
): Promise<void> {
  authoriseEverywhere(actor, 'procedures.edit');
  await findProcedure(tenant, id, { lock: true });
  const draft = await tenant.row(
    'SELECT id FROM procedure_versions WHERE procedure_id = $1 AND published_at IS NULL',
    [id],
  );
  if (draft) throw new Problem(409, 'draft-exists', 'A draft of this procedure exists already.');
  await tenant.rows(
    `INSERT INTO procedure_versions (id, organisation_id, procedure_id, number, content)
     SELECT $1, organisation_id, procedure_id, number + 1, content FROM procedure_versions
     WHERE procedure_id = $2 ORDER BY number DESC LIMIT 1`,
    [versionId, id],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'procedure',
    subjectId: id,
    action: 'procedure-draft-begun',
  });
}
