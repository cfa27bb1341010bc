import type { ProcedureContent } from '@shared/procedures/procedure-content';
import { Problem, conflict } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import { findProcedure } from './procedure-queries';

export interface DraftRecord {
  readonly id: string;
  readonly number: number;
  readonly content: ProcedureContent;
  readonly version: number;
}

/**
 * The draft of a procedure, locked for what is to be done with it.
 * @throws Problem 404; 409 `no-draft`, or `changed-meanwhile` when the version is not the expected.
 */
export async function lockDraft(
  tenant: Tenant,
  procedureId: string,
  expected: number,
): Promise<DraftRecord> {
  await findProcedure(tenant, procedureId, { lock: true });
  const draft = await tenant.row<DraftRecord>(
    `SELECT id, number, content, version FROM procedure_versions
     WHERE procedure_id = $1 AND published_at IS NULL FOR UPDATE`,
    [procedureId],
  );
  if (!draft) throw new Problem(409, 'no-draft', 'This procedure has no draft.');
  if (draft.version !== expected) throw conflict();
  return draft;
}
