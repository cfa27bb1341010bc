import { type StoreHours, unknownHours } from '@shared/fleet/store-hours';
import type { Tenant } from '@db/tenant-transaction';
import type { GroupColumns, Known, PartColumns, StoreColumns, UnitColumns } from './fleet-records';

/** A number without leading zeros: spreadsheets take them off, so that 0101 and 101 are one store. */
export const bareNumber = (number: string) => number.replace(/^0+/, '').toLowerCase();

/** All chains or regions of the organisation. */
export async function groupsOf(
  tenant: Tenant,
  table: 'chains' | 'regions',
): Promise<Known<GroupColumns>[]> {
  const rows = await tenant.rows<{ id: string; name: string; retired: boolean }>(
    `SELECT id, name, retired_at IS NOT NULL AS retired FROM ${table} ORDER BY name`,
  );
  return rows.map(({ id, name, retired }) => ({ id, columns: { name }, retired }));
}

type StoreRow = StoreColumns & { id: string; retired: boolean; hours: Partial<StoreHours> };

/**
 * Stores by chain and number, leading zeros aside.
 * @param lock keeps them as they are until the transaction ends
 */
export async function storesByNumber(
  tenant: Tenant,
  wanted: readonly { readonly chainId: string; readonly number: string }[],
  lock: boolean,
): Promise<Known<StoreColumns>[]> {
  if (wanted.length === 0) return [];
  const rows = await tenant.rows<StoreRow>(
    `SELECT s.id, s.retired_at IS NOT NULL AS retired, s.chain_id, s.region_id, s.number, s.name,
       s.address_line, s.city, s.state, s.postal_code, s.latitude, s.longitude, s.position_from,
       s.time_zone, s.phone, s.access_note, s.hours
     FROM stores s
     WHERE s.chain_id = ANY($1::uuid[]) AND (s.chain_id, lower(ltrim(s.number, '0'))) IN (
       SELECT * FROM unnest($1::uuid[], $2::text[]))
     ORDER BY s.id ${lock ? 'FOR NO KEY UPDATE OF s' : ''}`,
    [wanted.map(({ chainId }) => chainId), wanted.map(({ number }) => bareNumber(number))],
  );
  return rows.map(({ id, retired, hours, ...columns }) => ({
    id,
    retired,
    columns: { ...columns, hours: inOrder({ ...unknownHours, ...hours }) },
  }));
}

/** The database keeps names in an order of its own; two hours that say the same must look the same. */
const inOrder = (hours: StoreHours): StoreHours => ({
  ...hours,
  rush: hours.rush.map(({ from, to }) => ({ from, to })),
});

/** Units by store and tag, whatever the case. */
export async function unitsByTag(
  tenant: Tenant,
  wanted: readonly { readonly storeId: string; readonly tag: string }[],
  lock: boolean,
): Promise<Known<UnitColumns>[]> {
  if (wanted.length === 0) return [];
  const rows = await tenant.rows<UnitColumns & { id: string; retired: boolean }>(
    `SELECT u.id, u.retired_at IS NOT NULL AS retired, u.store_id, u.tag, u.kind, u.vats,
       u.oil_pounds::float8 AS oil_pounds, u.model, u.installed_on, u.out_of_service_since
     FROM units u
     WHERE u.store_id = ANY($1::uuid[]) AND (u.store_id, lower(u.tag)) IN (
       SELECT * FROM unnest($1::uuid[], $2::text[]))
     ORDER BY u.id ${lock ? 'FOR NO KEY UPDATE OF u' : ''}`,
    [wanted.map(({ storeId }) => storeId), wanted.map(({ tag }) => tag.toLowerCase())],
  );
  return rows.map(({ id, retired, ...columns }) => ({ id, retired, columns }));
}

/** Parts fitted to units now. */
export async function partsOf(
  tenant: Tenant,
  unitIds: readonly string[],
  lock: boolean,
): Promise<Known<PartColumns>[]> {
  if (unitIds.length === 0) return [];
  const rows = await tenant.rows<PartColumns & { id: string }>(
    `SELECT id, unit_id, kind, serial_number, model, nameplate, pump_face, installed_on
     FROM components WHERE unit_id = ANY($1::uuid[]) AND removed_on IS NULL
     ORDER BY id ${lock ? 'FOR NO KEY UPDATE' : ''}`,
    [unitIds],
  );
  return rows.map(({ id, ...columns }) => ({ id, retired: false, columns }));
}
