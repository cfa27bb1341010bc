import { unknownHours } from '@shared/fleet/store-hours';
import type { ImportField } from '@shared/imports/import-fields';
import type { RowValues } from '@shared/imports/read-row';
import { isTimeZone, placeOfZip, timeZoneAt } from '../fleet/locate-store';
import { same, type StoreColumns } from './fleet-records';
import type { RowDraft } from './row-draft';

/** What a row says of a store, held against what is known of it. */
export interface StoreToMerge {
  readonly chainId: string;
  readonly regionId: string;
  readonly before: StoreColumns | null;
}

/**
 * A store's columns after a row: what the row says, else what was known. Position and time zone are
 * found from coordinates, or from the ZIP code where neither the row nor the store has any.
 * @returns null, and the faults in the draft, where that cannot be told
 */
export function mergeStore(
  draft: RowDraft,
  { chainId, regionId, before }: StoreToMerge,
): StoreColumns | null {
  const { values } = draft.row;
  const zone = values.timeZone;
  if (zone !== undefined && !isTimeZone(zone)) draft.fault('timeZone', 'time-zone', zone);
  if (before === null && values.storeName === undefined) draft.need('storeName');
  const place = placeOf(draft, values, before);
  if (!place || draft.isBad) return null;
  const { latitude, longitude, position_from, zip } = place;
  const known = before ?? { hours: unknownHours };
  const hours = known.hours;
  return {
    chain_id: chainId,
    region_id: regionId,
    number: before?.number ?? values.storeNumber ?? '',
    name: values.storeName ?? before?.name ?? '',
    address_line: values.addressLine ?? before?.address_line ?? '',
    city: values.city ?? before?.city ?? zip?.city ?? '',
    state: values.usState ?? before?.state ?? zip?.usState ?? '',
    postal_code: values.postalCode ?? before?.postal_code ?? '',
    latitude,
    longitude,
    position_from,
    time_zone: zone ?? zoneAfter(before, place),
    phone: values.phone ?? before?.phone ?? '',
    access_note: values.accessNote ?? before?.access_note ?? '',
    hours: {
      ...hours,
      open: values.opens ?? hours.open,
      close: values.closes ?? hours.close,
      rush: values.rush ?? hours.rush,
    },
  };
}

interface Place {
  readonly latitude: number;
  readonly longitude: number;
  readonly position_from: 'coordinates' | 'postal-code';
  readonly zip?: ReturnType<typeof placeOfZip>;
}

function placeOf(draft: RowDraft, values: RowValues, before: StoreColumns | null): Place | null {
  const { latitude, longitude, postalCode = '' } = values;
  if (latitude !== undefined && longitude !== undefined) {
    const zip = placeOfZip(postalCode);
    const asKnown = before?.latitude === latitude && before.longitude === longitude;
    return {
      latitude,
      longitude,
      position_from: asKnown ? before.position_from : 'coordinates',
      zip,
    };
  }
  if (latitude !== undefined || longitude !== undefined) {
    draft.fault(latitude === undefined ? 'latitude' : 'longitude', 'half-a-position');
    return null;
  }
  const stays = before && (postalCode === '' || postalCode === before.postal_code);
  if (stays || before?.position_from === 'coordinates') return before;
  const zip = placeOfZip(postalCode);
  if (zip) return { ...zip, position_from: 'postal-code', zip };
  draft.fault('postalCode', 'position-unknown', postalCode);
  return null;
}

/** A zone that came from the position goes with it; one that was said outright stays. */
function zoneAfter(before: StoreColumns | null, place: Place): string {
  if (before === null) return timeZoneAt(place);
  const moved = before.latitude !== place.latitude || before.longitude !== place.longitude;
  if (!moved || before.time_zone !== timeZoneAt(before)) return before.time_zone;
  return timeZoneAt(place);
}

const fieldOf: Partial<Record<keyof StoreColumns, ImportField>> = {
  region_id: 'region',
  name: 'storeName',
  address_line: 'addressLine',
  city: 'city',
  state: 'usState',
  latitude: 'latitude',
  longitude: 'longitude',
  postal_code: 'postalCode',
  time_zone: 'timeZone',
  phone: 'phone',
  access_note: 'accessNote',
  hours: 'rush',
};

/** The field in which two rows disagree about a store; null where they agree. */
export function disagreement(earlier: StoreColumns, later: StoreColumns): ImportField | null {
  if (same(earlier, later)) return null;
  const columns = Object.keys(fieldOf) as (keyof StoreColumns)[];
  const at = columns.find((it) => JSON.stringify(earlier[it]) !== JSON.stringify(later[it]));
  return (at && fieldOf[at]) ?? 'storeNumber';
}
