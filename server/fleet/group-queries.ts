import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { listChains } from '@shared/fleet/fleet-contract';
import { grantsWith, mayEverywhere } from '@shared/access/ability';
import { notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';
import { mayEditGroups } from './fleet-policy';
import { bothWays, searchText } from './search-text';

/** A chain or a region; the two differ in nothing but their table. */
export type GroupKind = 'chain' | 'region';
export type Group = ReplyOf<typeof listChains>['rows'][number];

export const tableOf = { chain: 'chains', region: 'regions' } as const;
export const columnOf = { chain: 'chain_id', region: 'region_id' } as const;

interface Row extends Omit<Group, 'retiredAt' | 'mayEdit'> {
  retiredAt: Date | null;
}

const storesOf = (kind: GroupKind) =>
  `(SELECT count(*)::int FROM stores s WHERE s.${columnOf[kind]} = g.id AND s.retired_at IS NULL)`;
const unitsOf = (kind: GroupKind) =>
  `(SELECT count(*)::int FROM stores s JOIN units u ON u.store_id = s.id
    WHERE s.${columnOf[kind]} = g.id AND s.retired_at IS NULL AND u.retired_at IS NULL)`;

const columns = (kind: GroupKind) => `
  g.id, g.name, g.retired_at AS "retiredAt", g.version, ${storesOf(kind)} AS stores,
  ${unitsOf(kind)} AS units`;

const sorts = (kind: GroupKind): Readonly<Record<string, string>> =>
  Object.fromEntries([
    ...bothWays('name', (direction) => `lower(g.name) ${direction}`, 'g.id'),
    ...bothWays('stores', (direction) => `${storesOf(kind)} ${direction}`, 'g.name'),
    ...bothWays('units', (direction) => `${unitsOf(kind)} ${direction}`, 'g.name'),
  ]);

/**
 * Whoever sees a store sees its chain and region. Who may add stores anywhere sees all of them, to
 * choose from.
 */
function visibleGroups(kind: GroupKind, actor: Actor, binds: Binds): string {
  if (mayEverywhere('fleet.read', actor.grants)) return 'true';
  if (grantsWith('fleet.edit', actor.grants).length > 0) return 'true';
  const own = grantsWith('fleet.read', actor.grants)
    .filter(({ scopeKind }) => scopeKind === kind)
    .map(({ scopeId }) => scopeId);
  return `(g.id = ANY(${binds.add(own)}::uuid[]) OR EXISTS (SELECT FROM stores s
    WHERE s.${columnOf[kind]} = g.id AND ${visibleStores(actor, 'fleet.read', binds)}))`;
}

/** Chains or regions in the actor's sight, a page of them. */
export async function pageOfGroups(
  tenant: Tenant,
  actor: Actor,
  kind: GroupKind,
  query: QueryOf<typeof listChains>,
): Promise<ReplyOf<typeof listChains>> {
  const { q, state, sort, page, pageSize } = query;
  const binds = new Binds();
  const where = [
    visibleGroups(kind, actor, binds),
    searchText(q, ['g.name'], binds),
    ...(state === 'all' ? [] : [`g.retired_at IS ${state === 'live' ? '' : 'NOT'} NULL`]),
  ].join(' AND ');
  const from = `FROM ${tableOf[kind]} g WHERE ${where}`;
  const count = await tenant.row<{ total: number }>(
    `SELECT count(*)::int AS total ${from}`,
    binds.values,
  );
  const rows = await tenant.rows<Row>(
    `SELECT ${columns(kind)} ${from} ORDER BY ${sorts(kind)[sort]}
     LIMIT ${binds.add(pageSize)} OFFSET ${binds.add((page - 1) * pageSize)}`,
    binds.values,
  );
  return { rows: rows.map((row) => present(actor, row)), total: count?.total ?? 0, page, pageSize };
}

/** One chain or region. @throws Problem 404 */
export async function groupById(
  tenant: Tenant,
  actor: Actor,
  kind: GroupKind,
  id: string,
): Promise<Group> {
  const row = await tenant.row<Row>(
    `SELECT ${columns(kind)} FROM ${tableOf[kind]} g WHERE g.id = $1`,
    [id],
  );
  if (!row) throw notFound(kind);
  return present(actor, row);
}

function present(actor: Actor, row: Row): Group {
  return {
    ...row,
    retiredAt: row.retiredAt?.toISOString() ?? null,
    mayEdit: mayEditGroups(actor),
  };
}
