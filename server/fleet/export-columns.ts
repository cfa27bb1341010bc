import { componentKindWords, pumpFaceWords, unitKindWords } from '@shared/fleet/fleet-words';
import { type ImportField, importFields } from '@shared/imports/import-fields';
import { causeWords } from '@shared/findings/cause';
import { removalReasonWords } from '@shared/fleet/fleet-words';
import type { StoreHours } from '@shared/fleet/store-hours';
import {
  type ExportColumn,
  type Words,
  date,
  figure,
  instant,
  text,
} from '../exports/export-column';
import type { ComponentFileRow } from './component-queries';
import type { Group } from './group-queries';
import type { StoreFileRow } from './store-queries';
import type { UnitFileRow } from './unit-file';

/** What an import reads it as again. */
const of = (field: ImportField): Words => importFields[field];

const rushOf = ({ rush }: StoreHours) => rush.map(({ from, to }) => `${from}-${to}`).join('; ');
const retired = { en: 'Retired', es: 'Retirado' };
const openFindings = { en: 'Open findings', es: 'Hallazgos abiertos' };

/** Columns that describe a store, in files of stores and of units alike. */
function storeColumnsOf<Row>(
  pick: (row: Row) => Omit<UnitFileRow['store'], 'usState'> & { usState: string },
): ExportColumn<Row>[] {
  return [
    text(of('storeName'), (row) => pick(row).name),
    text(of('addressLine'), (row) => pick(row).addressLine),
    text(of('city'), (row) => pick(row).city),
    text(of('usState'), (row) => pick(row).usState),
    text(of('postalCode'), (row) => pick(row).postalCode),
    figure(of('latitude'), (row) => pick(row).latitude),
    figure(of('longitude'), (row) => pick(row).longitude),
    text(of('timeZone'), (row) => pick(row).timeZone),
    text(of('phone'), (row) => pick(row).phone),
    text(of('accessNote'), (row) => pick(row).accessNote),
    text(of('opens'), (row) => pick(row).hours.open),
    text(of('closes'), (row) => pick(row).hours.close),
    text(of('rush'), (row) => rushOf(pick(row).hours)),
  ];
}

export const groupColumns = (kind: 'chain' | 'region'): ExportColumn<Group>[] => [
  text(of(kind), (row) => row.name),
  figure({ en: 'Stores', es: 'Locales' }, (row) => row.stores),
  figure({ en: 'Units', es: 'Equipos' }, (row) => row.units),
  instant(retired, (row) => row.retiredAt),
];

export const storeColumns: readonly ExportColumn<StoreFileRow>[] = [
  text(of('chain'), (row) => row.chainName),
  text(of('region'), (row) => row.regionName),
  text(of('storeNumber'), (row) => row.number),
  ...storeColumnsOf<StoreFileRow>((row) => row),
  figure({ en: 'Units', es: 'Equipos' }, (row) => row.units),
  figure(openFindings, (row) => row.openFindings),
  instant(retired, (row) => row.retiredAt),
];

export const unitFileColumns: readonly ExportColumn<UnitFileRow>[] = [
  text(of('chain'), (row) => row.chainName),
  text(of('region'), (row) => row.regionName),
  text(of('storeNumber'), (row) => row.storeNumber),
  text(of('unitTag'), (row) => row.tag),
  text(of('unitKind'), (row) => unitKindWords[row.kind]),
  figure(of('vats'), (row) => row.vats),
  figure(of('oilPounds'), (row) => row.oilPounds),
  text(of('unitModel'), (row) => row.model),
  date(of('unitInstalledOn'), (row) => row.installedOn),
  date(of('outOfServiceSince'), (row) => row.outOfServiceSince),
  text(of('pumpSerial'), (row) => row.pump?.serialNumber),
  text(of('pumpModel'), (row) => row.pump?.model),
  text(of('pumpFace'), (row) => row.pumpFace && pumpFaceWords[row.pumpFace]),
  date(of('pumpInstalledOn'), (row) => row.pump?.installedOn),
  text(of('motorSerial'), (row) => row.motor?.serialNumber),
  text(of('motorModel'), (row) => row.motor?.model),
  date(of('motorInstalledOn'), (row) => row.motor?.installedOn),
  figure(of('volts'), (row) => row.motor?.nameplate.volts),
  figure(of('amps'), (row) => row.motor?.nameplate.amps),
  figure(of('horsepower'), (row) => row.motor?.nameplate.horsepower),
  figure(of('phase'), (row) => row.motor?.nameplate.phase),
  figure(of('rpm'), (row) => row.motor?.nameplate.rpm),
  text(of('panSerial'), (row) => row.pan?.serialNumber),
  date(of('panInstalledOn'), (row) => row.pan?.installedOn),
  text(of('hoseSerial'), (row) => row.hose?.serialNumber),
  date(of('hoseInstalledOn'), (row) => row.hose?.installedOn),
  ...storeColumnsOf<UnitFileRow>((row) => row.store),
  instant({ en: 'Last inspected', es: 'Última inspección' }, (row) => row.lastInspectedAt),
  figure(openFindings, (row) => row.openFindings),
  instant(retired, (row) => row.retiredAt),
];

const removalWords: Readonly<Record<string, Words>> = { ...causeWords, ...removalReasonWords };

export const componentColumns: readonly ExportColumn<ComponentFileRow>[] = [
  text(of('chain'), (row) => row.chainName),
  text(of('storeNumber'), (row) => row.storeNumber),
  text({ en: 'Store name', es: 'Nombre del local' }, (row) => row.storeName),
  text(of('unitTag'), (row) => row.unitTag),
  text(of('partKind'), (row) => componentKindWords[row.kind]),
  text(of('partSerial'), (row) => row.serialNumber),
  text(of('partModel'), (row) => row.model),
  text(of('partFace'), (row) => row.pumpFace && pumpFaceWords[row.pumpFace]),
  date(of('partInstalledOn'), (row) => row.installedOn),
  figure(of('volts'), (row) => row.nameplate.volts),
  figure(of('amps'), (row) => row.nameplate.amps),
  figure(of('horsepower'), (row) => row.nameplate.horsepower),
  figure(of('phase'), (row) => row.nameplate.phase),
  figure(of('rpm'), (row) => row.nameplate.rpm),
  date({ en: 'Came off on', es: 'Retirada el' }, (row) => row.removedOn),
  text({ en: 'Cause', es: 'Causa' }, (row) => removalWords[row.removalCause ?? '']),
];
