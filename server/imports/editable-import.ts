import { mayEverywhere } from '@shared/access/ability';
import { Problem, conflict, notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { type ImportRecord, recordColumns } from './import-record';

/**
 * SQL true for the imports (`i`) that a person may see: who may import for the whole organisation sees
 * all, others their own, as rows and problems tell of stores.
 */
export const visibleImports = (actor: Actor, binds: Binds) =>
  mayEverywhere('fleet.import', actor.grants)
    ? 'true'
    : `i.created_by = ${binds.add(actor.personId)}`;

/**
 * An import that something is to be done with, locked.
 * @throws Problem 404 out of sight, 409 when it runs, is done already, or was changed meanwhile
 */
export async function editableImport(
  tenant: Tenant,
  actor: Actor,
  { id, version }: { readonly id: string; readonly version: number },
): Promise<ImportRecord> {
  const binds = new Binds();
  const record = await tenant.row<ImportRecord>(
    `SELECT ${recordColumns} FROM imports i LEFT JOIN long_jobs j ON j.id = i.job_id
     WHERE i.id = ${binds.add(id)} AND ${visibleImports(actor, binds)} FOR UPDATE OF i`,
    binds.values,
  );
  if (!record) throw notFound('import');
  if (record.jobState === 'waiting' || record.jobState === 'running') {
    throw new Problem(409, 'import-running', 'This import is being worked on. Wait, or stop it.');
  }
  if (record.jobKind === 'import-rows' && record.jobState === 'finished') {
    throw new Problem(
      409,
      'import-done',
      'This file is imported already. Send it anew to repeat it.',
    );
  }
  if (record.version !== version) throw conflict();
  return record;
}
