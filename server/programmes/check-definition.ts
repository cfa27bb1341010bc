import { ruleFaults } from '@shared/programmes/rule-faults';
import type { RuleDefinition } from '@shared/programmes/rule-definition';
import { type FieldError, invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';

/** @throws Problem 422 with everything that keeps a definition from being used, each at its field. */
export async function checkDefinition(tenant: Tenant, definition: RuleDefinition): Promise<void> {
  const errors: FieldError[] = ruleFaults(definition);
  const procedure = await tenant.row<{ retired: boolean; published: boolean }>(
    `SELECT p.retired_at IS NOT NULL AS retired, EXISTS (SELECT FROM procedure_versions v
       WHERE v.procedure_id = p.id AND v.published_at IS NOT NULL) AS published
     FROM procedures p WHERE p.id = $1`,
    [definition.procedureId],
  );
  const fail = (reason: string, message: string) =>
    errors.push({ field: 'procedureId', reason, message });
  if (!procedure) fail('unknown', 'There is no such procedure.');
  else if (procedure.retired) fail('retired', 'This procedure is retired.');
  else if (!procedure.published) fail('unpublished', 'This procedure is not published yet.');
  if (errors.length > 0) throw invalid(errors);
}
