import { mayAt, mayEverywhere } from '@shared/access/ability';
import type { Place, RoleGrant } from '@shared/access/role';
import { type FieldError, Problem, forbidden, invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';

const nowhere = { chainId: '', regionId: '', storeId: '' };

/** Scopes by id with where they stand; stores carry their chain and region. */
export type Scopes = ReadonlyMap<string, { readonly kind: string; readonly place: Place }>;

/** Looks up scopes named in grants. Unknown ones, and those of other organisations, are not in it. */
export async function scopesOf(tenant: Tenant, grants: readonly RoleGrant[]): Promise<Scopes> {
  const rows = await tenant.rows<{ id: string; kind: string; place: Partial<Place> }>(
    `SELECT id, 'organisation' AS kind, '{}'::jsonb AS place FROM organisations
       WHERE id = ANY($1::uuid[])
     UNION ALL SELECT id, 'chain', jsonb_build_object('chainId', id) FROM chains
       WHERE id = ANY($1::uuid[])
     UNION ALL SELECT id, 'region', jsonb_build_object('regionId', id) FROM regions
       WHERE id = ANY($1::uuid[])
     UNION ALL SELECT id, 'store',
       jsonb_build_object('storeId', id, 'chainId', chain_id, 'regionId', region_id) FROM stores
       WHERE id = ANY($1::uuid[])`,
    [[...new Set(grants.map(({ scopeId }) => scopeId))]],
  );
  return new Map(
    rows.map(({ id, kind, place }) => [id, { kind, place: { ...nowhere, ...place } }]),
  );
}

/**
 * Whether the actor looks after the people of a scope: only what lies within a scope of their own.
 * A region is not within a chain, nor the other way round, as each holds stores that the other does
 * not.
 */
export function mayEditWithin(actor: Actor, grant: RoleGrant, scopes: Scopes): boolean {
  if (mayEverywhere('people.edit', actor.grants)) return true;
  const scope = scopes.get(grant.scopeId);
  return scope !== undefined && mayAt('people.edit', actor.grants, scope.place);
}

/** Whether the actor looks after a person: everything that the person holds lies in their hands. */
export function mayEditPerson(actor: Actor, held: readonly RoleGrant[], scopes: Scopes): boolean {
  if (mayEverywhere('people.edit', actor.grants)) return true;
  return held.length > 0 && held.every((grant) => mayEditWithin(actor, grant, scopes));
}

/**
 * Holds that the actor may give and take these roles: nobody hands on what reaches further than what
 * they look after themselves.
 * @throws Problem 422 under `roles.N` for scopes that do not exist, 403 for those out of reach
 */
export function checkGrants(actor: Actor, grants: readonly RoleGrant[], scopes: Scopes): void {
  const errors: FieldError[] = grants.flatMap((grant, index) =>
    scopes.get(grant.scopeId)?.kind === grant.scopeKind
      ? []
      : [{ field: `roles.${index}`, reason: 'unknown', message: 'This place does not exist.' }],
  );
  if (errors.length > 0) throw invalid(errors);
  if (!grants.every((grant) => mayEditWithin(actor, grant, scopes))) throw beyondReach();
}

const beyondReach = () =>
  new Problem(403, 'beyond-reach', forbidden().title, {
    detail: 'You can give and take roles only within the places that you administer yourself.',
  });

export const sameGrant = (a: RoleGrant, b: RoleGrant) =>
  a.role === b.role && a.scopeKind === b.scopeKind && a.scopeId === b.scopeId;
