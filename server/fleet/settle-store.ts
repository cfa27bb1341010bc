import type { BodyOf } from '@shared/contract/endpoint';
import type { editStore } from '@shared/fleet/stores-contract';
import { type FieldError, invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import { isTimeZone, placeOfZip, timeZoneAt } from './locate-store';

export type StoreInput = Omit<BodyOf<typeof editStore>, 'version'>;

/** The columns of a store as they will be written. */
export interface SettledStore {
  readonly chain_id: string;
  readonly region_id: string;
  readonly number: string;
  readonly name: string;
  readonly address_line: string;
  readonly city: string;
  readonly state: string;
  readonly postal_code: string;
  readonly latitude: number;
  readonly longitude: number;
  readonly position_from: 'coordinates' | 'postal-code';
  readonly time_zone: string;
  readonly phone: string;
  readonly access_note: string;
  readonly hours: object;
}

/**
 * Finds a store's position and zone, and holds what was entered against the rest of the fleet.
 * @throws Problem 422 with every field at fault.
 */
export async function settleStore(
  tenant: Tenant,
  id: string,
  input: StoreInput,
): Promise<SettledStore> {
  const errors: FieldError[] = [];
  const zip = input.position ? undefined : placeOfZip(input.postalCode);
  const position = input.position ?? zip;
  if (!position) {
    errors.push({
      field: 'postalCode',
      reason: 'position-unknown',
      message: 'This ZIP code is not known. Correct it, or give the position in degrees.',
    });
  }
  if (input.timeZone !== null && !isTimeZone(input.timeZone)) {
    errors.push({ field: 'timeZone', reason: 'time-zone', message: 'No such time zone.' });
  }
  errors.push(...(await clashes(tenant, id, input)));
  if (errors.length > 0 || !position) throw invalid(errors);
  return {
    chain_id: input.chainId,
    region_id: input.regionId,
    number: input.number,
    name: input.name,
    address_line: input.addressLine,
    city: input.city || (zip?.city ?? ''),
    state: input.usState || (zip?.usState ?? ''),
    postal_code: input.postalCode,
    latitude: position.latitude,
    longitude: position.longitude,
    position_from: input.position ? 'coordinates' : 'postal-code',
    time_zone: input.timeZone ?? timeZoneAt(position),
    phone: input.phone,
    access_note: input.accessNote,
    hours: input.hours,
  };
}

async function clashes(tenant: Tenant, id: string, input: StoreInput): Promise<FieldError[]> {
  const known = await tenant.row<{ chain: boolean; region: boolean; taken: boolean }>(
    `SELECT EXISTS (SELECT FROM chains WHERE id = $1 AND retired_at IS NULL) AS chain,
       EXISTS (SELECT FROM regions WHERE id = $2 AND retired_at IS NULL) AS region,
       EXISTS (SELECT FROM stores WHERE chain_id = $1 AND number = $3 AND id <> $4) AS taken`,
    [input.chainId, input.regionId, input.number, id],
  );
  const errors: FieldError[] = [];
  if (!known?.chain) {
    errors.push({ field: 'chainId', reason: 'unknown', message: 'Choose a chain in use.' });
  }
  if (!known?.region) {
    errors.push({ field: 'regionId', reason: 'unknown', message: 'Choose a region in use.' });
  }
  if (known?.taken) {
    errors.push({
      field: 'number',
      reason: 'store-number-taken',
      message: 'Another store of this chain has this number.',
    });
  }
  return errors;
}
