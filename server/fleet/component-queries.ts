import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type {
  editComponent,
  exportComponents,
  listComponents,
} from '@shared/fleet/components-contract';
import { forbidden, notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';
import { cursorBatches } from '../exports/read-batches';
import { type StorePlace, mayEditAt } from './fleet-policy';
import { bothWays, naturalOrder, searchText } from './search-text';

export type Component = ReplyOf<typeof editComponent>;
export type ComponentRow = ReplyOf<typeof listComponents>['rows'][number];
type Filters = Omit<QueryOf<typeof exportComponents>, 'format'>;

const columns = `
  p.id, p.unit_id AS "unitId", p.kind, p.serial_number AS "serialNumber", p.model, p.nameplate,
  p.pump_face AS "pumpFace", p.installed_on AS "installedOn", p.removed_on AS "removedOn",
  p.removal_cause AS "removalCause", p.version`;

const listColumns = `${columns}, u.tag AS "unitTag", s.id AS "storeId", s.number AS "storeNumber",
  s.name AS "storeName"`;

const from = `
  FROM components p JOIN units u ON u.id = p.unit_id JOIN stores s ON s.id = u.store_id`;

const byUnit = `${naturalOrder('s.number')}, ${naturalOrder('u.tag')}, p.kind, p.installed_on, p.id`;
const sorts: Readonly<Record<string, string>> = Object.fromEntries([
  ...bothWays('store', (to) => naturalOrder('s.number', to), byUnit),
  ...bothWays('kind', (to) => `p.kind ${to}`, byUnit),
  ...bothWays('serial', (to) => `p.serial_number ${to}`, byUnit),
  ...bothWays('model', (to) => `lower(p.model) ${to}`, byUnit),
  ...bothWays('installed', (to) => `p.installed_on ${to}`, byUnit),
  ...bothWays('removed', (to) => `p.removed_on ${to}`, byUnit),
]);

const live = 'p.removed_on IS NULL AND u.retired_at IS NULL AND s.retired_at IS NULL';

function conditions(actor: Actor, filters: Filters, binds: Binds): string {
  const all = [
    visibleStores(actor, 'fleet.read', binds),
    searchText(filters.q, ['p.serial_number', 'p.model', 'u.tag', 's.number', 's.name'], binds),
  ];
  if (filters.state === 'live') all.push(live);
  if (filters.state === 'retired') all.push(`NOT (${live})`);
  if (filters.chain) all.push(`s.chain_id = ${binds.add(filters.chain)}`);
  if (filters.region) all.push(`s.region_id = ${binds.add(filters.region)}`);
  if (filters.store) all.push(`s.id = ${binds.add(filters.store)}`);
  if (filters.unit) all.push(`p.unit_id = ${binds.add(filters.unit)}`);
  if (filters.kind) all.push(`p.kind = ${binds.add(filters.kind)}`);
  if (filters.face) all.push(`p.pump_face = ${binds.add(filters.face)}`);
  return all.join(' AND ');
}

/** Parts in the actor's sight; the page asked for, and how many there are in all. */
export async function pageOfComponents(
  tenant: Tenant,
  actor: Actor,
  query: QueryOf<typeof listComponents>,
): Promise<ReplyOf<typeof listComponents>> {
  const { page, pageSize } = query;
  const binds = new Binds();
  const where = conditions(actor, query, binds);
  const count = await tenant.row<{ total: number }>(
    `SELECT count(*)::int AS total ${from} WHERE ${where}`,
    binds.values,
  );
  const rows = await tenant.rows<ComponentRow>(
    `SELECT ${listColumns} ${from} WHERE ${where} ORDER BY ${sorts[query.sort]}
     LIMIT ${binds.add(pageSize)} OFFSET ${binds.add((page - 1) * pageSize)}`,
    binds.values,
  );
  return { rows, total: count?.total ?? 0, page, pageSize };
}

export type ComponentFileRow = ComponentRow & { readonly chainName: string };

/** All parts of a list, for a file. */
export function componentsForFile(
  tenant: Tenant,
  actor: Actor,
  filters: Filters,
): AsyncIterable<ComponentFileRow[]> {
  const binds = new Binds();
  const where = conditions(actor, filters, binds);
  return cursorBatches(
    tenant,
    `SELECT ${listColumns}, c.name AS "chainName" ${from} JOIN chains c ON c.id = s.chain_id
     WHERE ${where} ORDER BY ${sorts[filters.sort]}`,
    binds.values,
    (row: ComponentFileRow) => row,
  );
}

/** The parts of a unit: fitted ones first, then newest first. */
export function componentsOf(tenant: Tenant, unitId: string): Promise<Component[]> {
  return tenant.rows<Component>(
    `SELECT ${columns} FROM components p WHERE p.unit_id = $1
     ORDER BY p.removed_on IS NOT NULL, array_position(ARRAY['pump', 'motor', 'pan', 'hose'], p.kind),
       p.installed_on DESC, p.id`,
    [unitId],
  );
}

/** One part. @throws Problem 404 */
export async function componentById(tenant: Tenant, id: string): Promise<Component> {
  const row = await tenant.row<Component>(`SELECT ${columns} FROM components p WHERE p.id = $1`, [
    id,
  ]);
  if (!row) throw notFound('component');
  return row;
}

/** A part locked for a change, with where it stands. */
export interface EditableComponent extends Component {
  readonly place: StorePlace;
}

/**
 * A part that is to be changed.
 * @throws Problem 404 where the actor may not see it, 403 where they may see and not change it.
 */
export async function editableComponent(
  tenant: Tenant,
  actor: Actor,
  id: string,
): Promise<EditableComponent> {
  const binds = new Binds();
  const row = await tenant.row<Component & Omit<StorePlace, 'storeId'> & { storeId: string }>(
    `SELECT ${columns}, s.id AS "storeId", s.chain_id AS "chainId", s.region_id AS "regionId",
       s.time_zone AS "timeZone", s.retired_at AS "retiredAt"
     ${from} WHERE p.id = ${binds.add(id)} AND ${visibleStores(actor, 'fleet.read', binds)}
     FOR UPDATE OF p`,
    binds.values,
  );
  if (!row) throw notFound('component');
  const { storeId, chainId, regionId, timeZone, retiredAt, ...component } = row;
  const place = { storeId, chainId, regionId, timeZone, retiredAt };
  if (!mayEditAt(actor, place)) throw forbidden();
  return { ...component, place };
}
