import { Problem } from '@shared/problem';
import type { RoleGrant } from '@shared/access/role';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from './actor';

interface Row extends Omit<Actor, 'grants'> {
  grants: RoleGrant[];
}

/**
 * The person with the roles held now, so that a change of role counts from the next request.
 * @throws Problem 401 when the person is gone or disabled.
 */
export async function loadActor(tenant: Tenant, personId: string): Promise<Actor> {
  const actor = await tenant.row<Row>(
    `SELECT p.id AS "personId", p.organisation_id AS "organisationId", p.name, p.email, p.locale,
       p.time_zone AS "timeZone",
       coalesce((SELECT jsonb_agg(jsonb_build_object('role', g.role, 'scopeKind', g.scope_kind,
         'scopeId', g.scope_id)) FROM role_grants g WHERE g.person_id = p.id), '[]') AS grants
     FROM people p WHERE p.id = $1 AND p.disabled_at IS NULL`,
    [personId],
  );
  if (!actor) throw new Problem(401, 'signed-out', 'Please sign in.');
  return actor;
}
