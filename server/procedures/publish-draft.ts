import { publishFaults } from '@shared/procedures/publish-faults';
import { invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { authoriseEverywhere } from '../access/authorise';
import { recordEvent } from '../audit/record-event';
import { lockDraft } from './draft-queries';

/**
 * Publishes a draft at the instant given. Inspections begun from then on follow it.
 * @throws Problem 404; 422 with everything that is missing; 409 when somebody saved it meanwhile.
 */
export async function publishDraft(
  tenant: Tenant,
  actor: Actor,
  { id, version, at }: { id: string; version: number; at: Date },
): Promise<void> {
  authoriseEverywhere(actor, 'procedures.edit');
  const draft = await lockDraft(tenant, id, version);
  const faults = publishFaults(draft.content);
  if (faults.length > 0) {
    throw invalid(faults.map((fault) => ({ ...fault, field: `content.${fault.field}` })));
  }
  await tenant.rows(
    `UPDATE procedure_versions SET published_at = $2, published_by = $3, version = version + 1
     WHERE id = $1`,
    [draft.id, at, actor.personId],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'procedure',
    subjectId: id,
    action: 'procedure-published',
    detail: { number: draft.number },
  });
}
