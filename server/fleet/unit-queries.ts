import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { exportUnits, listUnits, readUnit } from '@shared/fleet/units-contract';
import { notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';
import { componentsOf } from './component-queries';
import { mayEditAt } from './fleet-policy';
import { bothWays, naturalOrder, searchText } from './search-text';

export type Unit = ReplyOf<typeof readUnit>;
export type UnitRow = ReplyOf<typeof listUnits>['rows'][number];
export type UnitFilters = Omit<QueryOf<typeof exportUnits>, 'format'>;

interface ListRow extends Omit<UnitRow, 'retiredAt' | 'lastInspectedAt'> {
  retiredAt: Date | null;
  lastInspectedAt: Date | null;
}

type FullRow = ListRow &
  Pick<Unit, 'chainId' | 'regionId' | 'version'> & { storeRetiredAt: Date | null };

const lastInspectedAt = `(SELECT max(i.finished_at) FROM inspections i
  WHERE i.unit_id = u.id AND i.undone_at IS NULL)`;
const openFindings = `(SELECT count(*)::int FROM findings f
  WHERE f.unit_id = u.id AND f.settled_at IS NULL)`;

export const unitColumns = `
  u.id, u.tag, u.kind, u.vats, u.oil_pounds::float8 AS "oilPounds", u.model,
  u.installed_on AS "installedOn", u.out_of_service_since AS "outOfServiceSince",
  u.retired_at AS "retiredAt", u.store_id AS "storeId", s.number AS "storeNumber",
  s.name AS "storeName", c.name AS "chainName", r.name AS "regionName", s.time_zone AS "timeZone",
  pump.pump_face AS "pumpFace", pump.installed_on AS "pumpInstalledOn",
  motor.installed_on AS "motorInstalledOn", ${lastInspectedAt} AS "lastInspectedAt",
  ${openFindings} AS "openFindings"`;

const fittedParts = `
  LEFT JOIN components pump
    ON pump.unit_id = u.id AND pump.kind = 'pump' AND pump.removed_on IS NULL
  LEFT JOIN components motor
    ON motor.unit_id = u.id AND motor.kind = 'motor' AND motor.removed_on IS NULL`;
const unitJoins = `
  JOIN stores s ON s.id = u.store_id
  JOIN chains c ON c.id = s.chain_id
  JOIN regions r ON r.id = s.region_id ${fittedParts}`;
/** Tables that a condition on units may name; one pump and one motor at most are fitted. */
export const unitsFrom = `FROM units u ${unitJoins}`;

const byStore = `${naturalOrder('s.number')}, ${naturalOrder('u.tag')}, u.id`;
export const unitSorts: Readonly<Record<string, string>> = Object.fromEntries([
  ...bothWays('store', (to) => naturalOrder('s.number', to), `${naturalOrder('u.tag')}, u.id`),
  ...bothWays('tag', (to) => naturalOrder('u.tag', to), byStore),
  ...bothWays('kind', (to) => `u.kind ${to}`, byStore),
  ...bothWays('model', (to) => `lower(u.model) ${to}`, byStore),
  ...bothWays('vats', (to) => `u.vats ${to}`, byStore),
  ...bothWays('installed', (to) => `u.installed_on ${to}`, byStore),
  ...bothWays('inspected', (to) => `${lastInspectedAt} ${to}`, byStore),
  ...bothWays('openFindings', (to) => `${openFindings} ${to}`, byStore),
]);

/** SQL true for the units of a list; to be used with {@link unitsFrom}. */
export function unitConditions(actor: Actor, filters: UnitFilters, binds: Binds): string {
  const all = [
    visibleStores(actor, 'fleet.read', binds),
    searchText(
      filters.q,
      [
        'u.tag',
        'u.model',
        's.number',
        's.name',
        's.city',
        'pump.serial_number',
        'motor.serial_number',
      ],
      binds,
    ),
  ];
  if (filters.state === 'live') all.push('u.retired_at IS NULL AND s.retired_at IS NULL');
  if (filters.state === 'retired')
    all.push('(u.retired_at IS NOT NULL OR s.retired_at IS NOT NULL)');
  if (filters.chain) all.push(`s.chain_id = ${binds.add(filters.chain)}`);
  if (filters.region) all.push(`s.region_id = ${binds.add(filters.region)}`);
  if (filters.store) all.push(`u.store_id = ${binds.add(filters.store)}`);
  if (filters.kind) all.push(`u.kind = ${binds.add(filters.kind)}`);
  if (filters.face) all.push(`pump.pump_face = ${binds.add(filters.face)}`);
  if (filters.service) {
    all.push(`u.out_of_service_since IS ${filters.service === 'in' ? '' : 'NOT'} NULL`);
  }
  return all.join(' AND ');
}

/** Units in the actor's sight; the page asked for, and how many there are in all. */
export async function pageOfUnits(
  tenant: Tenant,
  actor: Actor,
  query: QueryOf<typeof listUnits>,
): Promise<ReplyOf<typeof listUnits>> {
  const { page, pageSize } = query;
  const binds = new Binds();
  const where = unitConditions(actor, query, binds);
  // Parts are looked up for the page alone, unless the filters ask for them.
  const parts = query.q || query.face ? fittedParts : '';
  const found = `FROM units u JOIN stores s ON s.id = u.store_id ${parts} WHERE ${where}`;
  const count = await tenant.row<{ total: number }>(
    `SELECT count(*)::int AS total ${found}`,
    binds.values,
  );
  const order = unitSorts[query.sort];
  const rows = await tenant.rows<ListRow>(
    `WITH page AS MATERIALIZED (SELECT u.* ${found} ORDER BY ${order}
       LIMIT ${binds.add(pageSize)} OFFSET ${binds.add((page - 1) * pageSize)})
     SELECT ${unitColumns} FROM page u ${unitJoins} ORDER BY ${order}`,
    binds.values,
  );
  return { rows: rows.map(presentRow), total: count?.total ?? 0, page, pageSize };
}

/** One unit with its parts. @throws Problem 404 when it does not exist or lies out of sight. */
export async function unitById(tenant: Tenant, actor: Actor, id: string): Promise<Unit> {
  const binds = new Binds();
  const row = await tenant.row<FullRow>(
    `SELECT ${unitColumns}, s.chain_id AS "chainId", s.region_id AS "regionId", u.version,
       s.retired_at AS "storeRetiredAt"
     ${unitsFrom} WHERE ${visibleStores(actor, 'fleet.read', binds)} AND u.id = ${binds.add(id)}`,
    binds.values,
  );
  if (!row) throw notFound('unit');
  return {
    ...row,
    ...presentRow(row),
    storeRetiredAt: row.storeRetiredAt?.toISOString() ?? null,
    components: await componentsOf(tenant, id),
    mayEdit: mayEditAt(actor, row),
  };
}

function presentRow(row: ListRow): UnitRow {
  return {
    ...row,
    retiredAt: row.retiredAt?.toISOString() ?? null,
    lastInspectedAt: row.lastInspectedAt?.toISOString() ?? null,
  };
}
