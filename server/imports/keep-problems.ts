import { importLimits } from '@shared/imports/import-limits';
import type { Tenant } from '@db/tenant-transaction';
import type { ImportPass, NumberedProblem } from './import-pass';

/** Forgets what an earlier pass found. */
export async function forgetProblems(tenant: Tenant, importId: string): Promise<void> {
  await tenant.rows('DELETE FROM import_problems WHERE import_id = $1', [importId]);
}

/** Writes down what was found, up to the limit; the pass says when some were left out. */
export async function keepProblems(
  tenant: Tenant,
  importId: string,
  { outcome }: ImportPass,
  problems: readonly NumberedProblem[],
): Promise<void> {
  const before = outcome.problems - problems.length;
  const kept = problems.slice(0, Math.max(0, importLimits.problems - before));
  if (kept.length < problems.length) outcome.problemsCut = true;
  if (kept.length === 0) return;
  await tenant.rows(
    `INSERT INTO import_problems (organisation_id, import_id, row_number, field, reason, value, params)
     SELECT $2, $3, "row", field, reason, value, coalesce(params, '{}')
     FROM jsonb_to_recordset($1::jsonb)
       AS r ("row" integer, field text, reason text, value text, params jsonb)`,
    [JSON.stringify(kept), tenant.organisationId, importId],
  );
}
