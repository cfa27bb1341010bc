import type { RoleGrant } from '@shared/access/role';
import { conflict, forbidden, notFound } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { mayEditPerson, scopesOf } from './people-policy';

/** A person to be changed, held until the transaction ends. */
export interface EditablePerson {
  readonly id: string;
  readonly name: string;
  readonly email: string | null;
  readonly locale: 'en' | 'es';
  readonly timeZone: string;
  readonly homePostalCode: string | null;
  readonly version: number;
  readonly disabledAt: Date | null;
  /** Whether they have chosen a password. */
  readonly joined: boolean;
  readonly grants: readonly RoleGrant[];
}

/**
 * A person with the roles they hold, locked.
 * @param version what the actor saw; left out where it does not matter
 * @throws Problem 404, 403 when they hold something that the actor does not look after, 409
 */
export async function editablePerson(
  tenant: Tenant,
  actor: Actor,
  id: string,
  version?: number,
): Promise<EditablePerson> {
  const row = await tenant.row<Omit<EditablePerson, 'grants'>>(
    `SELECT id, name, email, locale, time_zone AS "timeZone", home_postal_code AS "homePostalCode",
       version, disabled_at AS "disabledAt", password_hash IS NOT NULL AS joined
     FROM people WHERE id = $1 FOR UPDATE`,
    [id],
  );
  if (!row) throw notFound('person');
  const grants = await tenant.rows<RoleGrant>(
    `SELECT role, scope_kind AS "scopeKind", scope_id AS "scopeId" FROM role_grants
     WHERE person_id = $1`,
    [id],
  );
  if (!mayEditPerson(actor, grants, await scopesOf(tenant, grants))) throw forbidden();
  if (version !== undefined && version !== row.version) throw conflict();
  return { ...row, grants };
}
