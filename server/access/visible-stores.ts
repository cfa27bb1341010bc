import { type Ability, grantsWith } from '@shared/access/ability';
import type { ScopeKind } from '@shared/access/role';
import type { Actor } from './actor';
import type { Binds } from '@db/binds';

/**
 * SQL that is true for the rows of `stores` (under the given alias) in which the actor has the
 * ability. Values go through binds, never into the text.
 */
export function visibleStores(actor: Actor, ability: Ability, binds: Binds, alias = 's'): string {
  const grants = grantsWith(ability, actor.grants);
  if (grants.some(({ scopeKind }) => scopeKind === 'organisation')) return 'true';
  const ids = (kind: ScopeKind) =>
    grants.filter(({ scopeKind }) => scopeKind === kind).map(({ scopeId }) => scopeId);
  const columns = { chain: 'chain_id', region: 'region_id', store: 'id' } as const;
  const parts = (['chain', 'region', 'store'] as const)
    .filter((kind) => ids(kind).length > 0)
    .map((kind) => `${alias}.${columns[kind]} = ANY(${binds.add(ids(kind))}::uuid[])`);
  return parts.length === 0 ? 'false' : `(${parts.join(' OR ')})`;
}
