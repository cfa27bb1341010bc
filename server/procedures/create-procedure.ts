import type { BodyOf } from '@shared/contract/endpoint';
import type { createProcedure as contract } from '@shared/procedures/procedures-contract';
import { conflict, invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { authoriseEverywhere } from '../access/authorise';
import { recordEvent } from '../audit/record-event';

/**
 * Begins a procedure with its first draft.
 * @throws Problem 422 when the code is taken, 409 when the id is.
 */
export async function createProcedure(
  tenant: Tenant,
  actor: Actor,
  { id, versionId, code, content }: BodyOf<typeof contract>,
): Promise<void> {
  authoriseEverywhere(actor, 'procedures.edit');
  const made = await tenant.row<{ id: string }>(
    `INSERT INTO procedures (id, organisation_id, code) VALUES ($1, $2, $3)
     ON CONFLICT DO NOTHING RETURNING id`,
    [id, tenant.organisationId, code],
  );
  if (!made) {
    const taken = await tenant.row('SELECT id FROM procedures WHERE code = $1', [code]);
    if (!taken) throw conflict();
    throw invalid([{ field: 'code', reason: 'taken', message: 'This code is taken.' }]);
  }
  await tenant.rows(
    `INSERT INTO procedure_versions (id, organisation_id, procedure_id, number, content)
     VALUES ($1, $2, $3, 1, $4)`,
    [versionId, tenant.organisationId, id, JSON.stringify(content)],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'procedure',
    subjectId: id,
    action: 'procedure-created',
    detail: { code },
  });
}
