import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { exportStores, listStores, readStore } from '@shared/fleet/stores-contract';
import { type StoreHours, unknownHours } from '@shared/fleet/store-hours';
import { notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';
import { cursorBatches } from '../exports/read-batches';
import { mayEditAt } from './fleet-policy';
import { timeZoneAt } from './locate-store';
import { bothWays, naturalOrder, searchText } from './search-text';

export type Store = ReplyOf<typeof readStore>;
export type StoreRow = ReplyOf<typeof listStores>['rows'][number];
type Filters = Omit<QueryOf<typeof exportStores>, 'format'>;

interface ListRow extends Omit<StoreRow, 'retiredAt'> {
  retiredAt: Date | null;
}

interface FullRow extends Omit<Store, 'retiredAt' | 'mayEdit' | 'timeZoneOfPosition' | 'hours'> {
  retiredAt: Date | null;
  hours: Partial<StoreHours>;
}

const units = `(SELECT count(*)::int FROM units u WHERE u.store_id = s.id AND u.retired_at IS NULL)`;
const openFindings = `(SELECT count(*)::int FROM findings f
  WHERE f.store_id = s.id AND f.settled_at IS NULL)`;

const columns = `
  s.id, s.number, s.name, s.chain_id AS "chainId", c.name AS "chainName",
  s.region_id AS "regionId", r.name AS "regionName", s.city, s.state AS "usState",
  s.postal_code AS "postalCode", s.time_zone AS "timeZone", ${units} AS units,
  ${openFindings} AS "openFindings", s.retired_at AS "retiredAt"`;

const more = `
  s.version, s.address_line AS "addressLine", s.latitude, s.longitude,
  s.position_from AS "positionFrom", s.phone, s.access_note AS "accessNote", s.hours`;

const from = `
  FROM stores s JOIN chains c ON c.id = s.chain_id JOIN regions r ON r.id = s.region_id`;

const byNumber = `${naturalOrder('s.number')}, s.id`;
const sorts: Readonly<Record<string, string>> = Object.fromEntries([
  ...bothWays('number', (direction) => naturalOrder('s.number', direction), 's.id'),
  ...bothWays('name', (direction) => `lower(s.name) ${direction}`, byNumber),
  ...bothWays('chain', (direction) => `lower(c.name) ${direction}`, byNumber),
  ...bothWays('region', (direction) => `lower(r.name) ${direction}`, byNumber),
  ...bothWays('city', (direction) => `s.state ${direction}, lower(s.city) ${direction}`, byNumber),
  ...bothWays('units', (direction) => `${units} ${direction}`, byNumber),
  ...bothWays('openFindings', (direction) => `${openFindings} ${direction}`, byNumber),
]);

function conditions(actor: Actor, filters: Filters, binds: Binds): string {
  const all = [
    visibleStores(actor, 'fleet.read', binds),
    searchText(
      filters.q,
      ['s.number', 's.name', 's.address_line', 's.city', 's.state', 's.postal_code', 'c.name'],
      binds,
    ),
  ];
  if (filters.state !== 'all') {
    all.push(`s.retired_at IS ${filters.state === 'live' ? '' : 'NOT'} NULL`);
  }
  if (filters.chain) all.push(`s.chain_id = ${binds.add(filters.chain)}`);
  if (filters.region) all.push(`s.region_id = ${binds.add(filters.region)}`);
  if (filters.usState) all.push(`upper(s.state) = upper(${binds.add(filters.usState)})`);
  return all.join(' AND ');
}

/** Stores in the actor's sight; the page asked for, and how many there are in all. */
export async function pageOfStores(
  tenant: Tenant,
  actor: Actor,
  query: QueryOf<typeof listStores>,
): Promise<ReplyOf<typeof listStores>> {
  const { page, pageSize } = query;
  const binds = new Binds();
  const where = conditions(actor, query, binds);
  const count = await tenant.row<{ total: number }>(
    `SELECT count(*)::int AS total ${from} WHERE ${where}`,
    binds.values,
  );
  const rows = await tenant.rows<ListRow>(
    `SELECT ${columns} ${from} WHERE ${where} ORDER BY ${sorts[query.sort]}
     LIMIT ${binds.add(pageSize)} OFFSET ${binds.add((page - 1) * pageSize)}`,
    binds.values,
  );
  return { rows: rows.map(presentRow), total: count?.total ?? 0, page, pageSize };
}

export type StoreFileRow = Omit<FullRow, 'hours'> & { readonly hours: StoreHours };

/** All stores of a list with all that is known of them, for a file. */
export function storesForFile(
  tenant: Tenant,
  actor: Actor,
  filters: Filters,
): AsyncIterable<StoreFileRow[]> {
  const binds = new Binds();
  const where = conditions(actor, filters, binds);
  return cursorBatches(
    tenant,
    `SELECT ${columns}, ${more} ${from} WHERE ${where} ORDER BY ${sorts[filters.sort]}`,
    binds.values,
    (row: FullRow) => ({ ...row, hours: { ...unknownHours, ...row.hours } }),
  );
}

/** One store. @throws Problem 404 when it does not exist or lies out of the actor's sight. */
export async function storeById(tenant: Tenant, actor: Actor, id: string): Promise<Store> {
  const binds = new Binds();
  const row = await tenant.row<FullRow>(
    `SELECT ${columns}, ${more} ${from}
     WHERE ${visibleStores(actor, 'fleet.read', binds)} AND s.id = ${binds.add(id)}`,
    binds.values,
  );
  if (!row) throw notFound('store');
  return {
    ...row,
    retiredAt: row.retiredAt?.toISOString() ?? null,
    hours: { ...unknownHours, ...row.hours },
    timeZoneOfPosition: timeZoneAt(row),
    mayEdit: mayEditAt(actor, { ...row, storeId: row.id }),
  };
}

function presentRow(row: ListRow): StoreRow {
  return { ...row, retiredAt: row.retiredAt?.toISOString() ?? null };
}
