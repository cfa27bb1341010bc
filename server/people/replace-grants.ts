import { randomUUID } from 'node:crypto';
import type { RoleGrant } from '@shared/access/role';
import type { Tenant } from '@db/tenant-transaction';

/** Takes some roles from a person and gives them others; what is held already stays one. */
export async function replaceGrants(
  tenant: Tenant,
  personId: string,
  taken: readonly RoleGrant[],
  given: readonly RoleGrant[],
): Promise<void> {
  if (taken.length > 0) {
    await tenant.rows(
      `DELETE FROM role_grants g USING jsonb_to_recordset($2::jsonb)
         AS it (role text, "scopeKind" text, "scopeId" uuid)
       WHERE g.person_id = $1 AND g.role = it.role AND g.scope_kind = it."scopeKind"
         AND g.scope_id = it."scopeId"`,
      [personId, JSON.stringify(taken)],
    );
  }
  if (given.length === 0) return;
  await tenant.rows(
    `INSERT INTO role_grants (id, organisation_id, person_id, role, scope_kind, scope_id)
     SELECT it.id, $1, $2, it.role, it."scopeKind", it."scopeId"
     FROM jsonb_to_recordset($3::jsonb)
       AS it (id uuid, role text, "scopeKind" text, "scopeId" uuid)
     ON CONFLICT (person_id, role, scope_kind, scope_id) DO NOTHING`,
    [
      tenant.organisationId,
      personId,
      JSON.stringify(given.map((grant) => ({ ...grant, id: randomUUID() }))),
    ],
  );
}
