import type { Tenant } from '@db/tenant-transaction';
import { changesOf } from '../audit/changes-of';
import type { Change, FleetChanges } from './fleet-records';

/** What each table's columns are, as the records of a JSON array are read. */
const shapes = {
  chains: 'name text',
  regions: 'name text',
  stores: `chain_id uuid, region_id uuid, number text, name text, address_line text, city text,
    state text, postal_code text, latitude float8, longitude float8, position_from text,
    time_zone text, phone text, access_note text, hours jsonb`,
  units: `store_id uuid, tag text, kind text, vats integer, oil_pounds numeric, model text,
    installed_on date, out_of_service_since date`,
  components: `unit_id uuid, kind text, serial_number text, model text, nameplate jsonb,
    pump_face text, installed_on date`,
} as const;

type Table = keyof typeof shapes;
const tables = Object.keys(shapes) as Table[];

const subjects: Readonly<Record<Table, { kind: string; made: string; changed: string }>> = {
  chains: { kind: 'chain', made: 'chain-created', changed: 'chain-edited' },
  regions: { kind: 'region', made: 'region-created', changed: 'region-edited' },
  stores: { kind: 'store', made: 'store-created', changed: 'store-edited' },
  units: { kind: 'unit', made: 'unit-created', changed: 'unit-edited' },
  components: { kind: 'component', made: 'component-installed', changed: 'component-edited' },
};

/**
 * Writes what a stretch of rows does: per table one statement for what is new and one for what
 * changes, and one for the audit of it all. Schedules are left to the end of the import.
 */
export async function writeChanges(
  tenant: Tenant,
  changes: FleetChanges,
  by: { readonly actorId: string; readonly importId: string },
): Promise<void> {
  for (const table of tables) {
    const all: readonly Change<object>[] = changes[table];
    await insertAll(
      tenant,
      table,
      all.filter(({ before }) => before === null),
    );
    await updateAll(
      tenant,
      table,
      all.filter(({ before }) => before !== null),
    );
  }
  await restartZones(tenant, changes);
  await recordAll(tenant, changes, by);
}

const columnsOf = (table: Table) => shapes[table].split(',').map((it) => it.trim().split(' ')[0]);

async function insertAll(tenant: Tenant, table: Table, made: readonly Change<object>[]) {
  if (made.length === 0) return;
  const columns = columnsOf(table).join(', ');
  await tenant.rows(
    `INSERT INTO ${table} (id, organisation_id, ${columns})
     SELECT id, $2, ${columns} FROM jsonb_to_recordset($1::jsonb) AS r (id uuid, ${shapes[table]})`,
    [JSON.stringify(made.map(({ id, after }) => ({ id, ...after }))), tenant.organisationId],
  );
}

async function updateAll(tenant: Tenant, table: Table, changed: readonly Change<object>[]) {
  if (changed.length === 0) return;
  const assignments = columnsOf(table).map((column) => `${column} = r.${column}`);
  await tenant.rows(
    `UPDATE ${table} t SET version = t.version + 1, ${assignments.join(', ')}
     FROM jsonb_to_recordset($1::jsonb) AS r (id uuid, ${shapes[table]}) WHERE t.id = r.id`,
    [JSON.stringify(changed.map(({ id, after }) => ({ id, ...after })))],
  );
}

/** Tasks to come of a store whose clock changes must be made anew, as when it is edited by hand. */
async function restartZones(tenant: Tenant, { stores }: FleetChanges): Promise<void> {
  const moved = stores
    .filter(({ before, after }) => before !== null && before.time_zone !== after.time_zone)
    .map(({ id }) => id);
  if (moved.length === 0) return;
  await tenant.rows(
    `UPDATE schedules SET generated_to = NULL, generated_revision = NULL
     WHERE store_id = ANY($1::uuid[]) AND ended_at IS NULL`,
    [moved],
  );
}

async function recordAll(
  tenant: Tenant,
  changes: FleetChanges,
  { actorId, importId }: { actorId: string; importId: string },
): Promise<void> {
  const events = tables.flatMap((table) =>
    (changes[table] as readonly Change<object>[]).map(({ id, row, before, after }) => ({
      kind: subjects[table].kind,
      id,
      action: before === null ? subjects[table].made : subjects[table].changed,
      detail: { importId, row, ...(before === null ? {} : { changes: changesOf(before, after) }) },
    })),
  );
  if (events.length === 0) return;
  await tenant.rows(
    `INSERT INTO audit_events (organisation_id, actor_id, subject_kind, subject_id, action, detail)
     SELECT $2, $3, kind, id, action, detail
     FROM jsonb_to_recordset($1::jsonb) AS r (kind text, id uuid, action text, detail jsonb)`,
    [JSON.stringify(events), tenant.organisationId, actorId],
  );
}
