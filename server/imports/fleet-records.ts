import type { StoreHours } from '@shared/fleet/store-hours';
import type { SettledStore } from '../fleet/settle-store';
import type { UnitColumns } from '../fleet/editable-unit';

/** Columns of a store as a row is written; its hours always complete. */
export type StoreColumns = Omit<SettledStore, 'hours'> & { readonly hours: StoreHours };

/** Columns of a part as a row is written. */
export interface PartColumns {
  readonly unit_id: string;
  readonly kind: string;
  readonly serial_number: string;
  readonly model: string;
  readonly nameplate: object;
  readonly pump_face: string | null;
  readonly installed_on: string;
}

/** A thing that stands in the database. */
export interface Known<Columns> {
  readonly id: string;
  readonly columns: Columns;
  readonly retired: boolean;
}

/** A thing to be written: as it was (null: it is new) and as it shall be. */
export interface Change<Columns> {
  readonly id: string;
  /** The row of the file that says so. */
  readonly row: number;
  readonly before: Columns | null;
  readonly after: Columns;
}

export type { UnitColumns };

/** A chain or region by its name. */
export interface GroupColumns {
  readonly name: string;
}

/** All that a stretch of rows does to the fleet. */
export interface FleetChanges {
  readonly chains: Change<GroupColumns>[];
  readonly regions: Change<GroupColumns>[];
  readonly stores: Change<StoreColumns>[];
  readonly units: Change<UnitColumns>[];
  readonly components: Change<PartColumns>[];
}

export const noChanges = (): FleetChanges => ({
  chains: [],
  regions: [],
  stores: [],
  units: [],
  components: [],
});

/** Whether two rows of columns say the same. */
export const same = <Columns extends object>(a: Columns, b: Columns): boolean =>
  (Object.keys(b) as (keyof Columns)[]).every(
    (key) => JSON.stringify(a[key]) === JSON.stringify(b[key]),
  );
