import type { Nameplate } from '@shared/fleet/nameplate';
import { type StoreHours, unknownHours } from '@shared/fleet/store-hours';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { cursorBatches } from '../exports/read-batches';
import {
  type UnitFilters,
  type UnitRow,
  unitColumns,
  unitConditions,
  unitSorts,
  unitsFrom,
} from './unit-queries';

/** A part that is fitted, as a row of its unit shows it. */
interface FittedPart {
  readonly serialNumber: string;
  readonly model: string;
  readonly installedOn: string;
}

/** A unit with its store and the parts now fitted: all that an import can take in again. */
export interface UnitFileRow extends Omit<UnitRow, 'retiredAt' | 'lastInspectedAt'> {
  readonly retiredAt: Date | null;
  readonly lastInspectedAt: Date | null;
  readonly store: {
    readonly name: string;
    readonly addressLine: string;
    readonly city: string;
    readonly usState: string;
    readonly postalCode: string;
    readonly latitude: number;
    readonly longitude: number;
    readonly timeZone: string;
    readonly phone: string;
    readonly accessNote: string;
    readonly hours: StoreHours;
  };
  readonly pump: FittedPart | null;
  readonly motor: (FittedPart & { readonly nameplate: Nameplate }) | null;
  readonly pan: FittedPart | null;
  /** The one fitted first, where a unit has several. */
  readonly hose: FittedPart | null;
}

/** All units of a list with store and parts, for a file. */
export function unitsForFile(
  tenant: Tenant,
  actor: Actor,
  filters: UnitFilters,
): AsyncIterable<UnitFileRow[]> {
  const binds = new Binds();
  const where = unitConditions(actor, filters, binds);
  const part = (kind: string) => `(SELECT jsonb_build_object('serialNumber', p.serial_number,
      'model', p.model, 'installedOn', p.installed_on, 'nameplate', p.nameplate)
    FROM components p WHERE p.unit_id = u.id AND p.kind = '${kind}' AND p.removed_on IS NULL
    ORDER BY p.installed_on, p.id LIMIT 1) AS ${kind}`;
  return cursorBatches(
    tenant,
    `SELECT ${unitColumns}, ${['pump', 'motor', 'pan', 'hose'].map(part).join(', ')},
       jsonb_build_object('name', s.name, 'addressLine', s.address_line, 'city', s.city,
         'usState', s.state, 'postalCode', s.postal_code, 'latitude', s.latitude,
         'longitude', s.longitude, 'timeZone', s.time_zone, 'phone', s.phone,
         'accessNote', s.access_note, 'hours', s.hours) AS store
     ${unitsFrom} WHERE ${where} ORDER BY ${unitSorts[filters.sort]}`,
    binds.values,
    (row: UnitFileRow) => ({
      ...row,
      store: { ...row.store, hours: { ...unknownHours, ...row.store.hours } },
    }),
  );
}
