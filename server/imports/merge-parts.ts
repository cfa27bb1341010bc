import { randomUUID } from 'node:crypto';
import type { ComponentKind } from '@shared/fleet/fleet-words';
import type { ImportField } from '@shared/imports/import-fields';
import type { RowValues } from '@shared/imports/read-row';
import { type PartColumns, same } from './fleet-records';
import type { RowDraft } from './row-draft';

/** What a row says of one part, and in which fields it says so. */
interface SaidPart {
  readonly kind: ComponentKind;
  readonly serialNumber?: string;
  readonly model?: string;
  readonly face?: 'drain-slot' | 'gasket';
  readonly installedOn?: string;
  readonly plate: object;
  readonly serialField: ImportField;
  readonly dateField: ImportField;
}

/** A part fitted to a unit, with the row of the file that spoke of it. */
export interface PartState {
  readonly id: string;
  readonly columns: PartColumns;
  readonly row: number | null;
}

function plateOf({ volts, amps, horsepower, phase, rpm }: RowValues): object {
  const said = Object.entries({ volts, amps, horsepower, phase, rpm });
  return Object.fromEntries(said.filter(([, figure]) => figure !== undefined));
}

/** The parts that a row of a unit, or of a part, speaks of. */
export function saidParts(values: RowValues): SaidPart[] {
  const plate = plateOf(values);
  if (values.partKind) {
    return [
      {
        kind: values.partKind,
        serialNumber: values.partSerial,
        model: values.partModel,
        face: values.partFace,
        installedOn: values.partInstalledOn,
        plate: values.partKind === 'motor' ? plate : {},
        serialField: 'partSerial',
        dateField: 'partInstalledOn',
      },
    ];
  }
  const said = (
    kind: ComponentKind,
    more: Omit<SaidPart, 'kind' | 'serialField' | 'dateField'>,
  ) => ({
    kind,
    ...more,
    serialField: `${kind}Serial` as ImportField,
    dateField: `${kind}InstalledOn` as ImportField,
  });
  const all = [
    said('pump', {
      serialNumber: values.pumpSerial,
      model: values.pumpModel,
      face: values.pumpFace,
      installedOn: values.pumpInstalledOn,
      plate: {},
    }),
    said('motor', {
      serialNumber: values.motorSerial,
      model: values.motorModel,
      installedOn: values.motorInstalledOn,
      plate,
    }),
    said('pan', { serialNumber: values.panSerial, installedOn: values.panInstalledOn, plate: {} }),
    said('hose', {
      serialNumber: values.hoseSerial,
      installedOn: values.hoseInstalledOn,
      plate: {},
    }),
  ];
  return all.filter(
    (it) =>
      it.serialNumber !== undefined ||
      it.model !== undefined ||
      it.face !== undefined ||
      it.installedOn !== undefined ||
      Object.keys(it.plate).length > 0,
  );
}

/**
 * One part after a row. Another serial number than that of the part fitted is a replacement, which has
 * a cause that no file tells: it is refused.
 * @param fitted the unit's parts of this kind
 * @returns null, with the fault in the draft, where the row cannot be taken
 */
export function mergePart(
  draft: RowDraft,
  said: SaidPart,
  unit: { readonly id: string; readonly installedOn: string | null },
  fitted: readonly PartState[],
  today: string,
): { readonly part: PartState; readonly before: PartColumns | null } | null {
  const { serialNumber = '', kind } = said;
  draft.notAhead(said.dateField, said.installedOn, today);
  if (said.face !== undefined && kind !== 'pump') draft.fault('partFace', 'pump-only', said.face);
  const known =
    kind === 'hose'
      ? fitted.find(({ columns }) => columns.serial_number === serialNumber)
      : fitted[0];
  if (known?.row != null) {
    draft.fault(said.serialField, 'doubled', serialNumber, { row: known.row });
    return null;
  }
  const knownSerial = known?.columns.serial_number ?? '';
  if (serialNumber !== '' && knownSerial !== '' && serialNumber !== knownSerial) {
    draft.fault(said.serialField, 'part-differs', serialNumber, { known: knownSerial });
    return null;
  }
  const installedOn = said.installedOn ?? known?.columns.installed_on ?? unit.installedOn;
  if (installedOn === null) {
    draft.fault(said.dateField, 'part-date-needed');
    return null;
  }
  const before = known?.columns ?? null;
  const after: PartColumns = {
    unit_id: unit.id,
    kind,
    serial_number: serialNumber || knownSerial,
    model: said.model ?? before?.model ?? '',
    nameplate: sorted({ ...before?.nameplate, ...said.plate }),
    pump_face: said.face ?? before?.pump_face ?? null,
    installed_on: installedOn,
  };
  const settled = before && { ...before, nameplate: sorted(before.nameplate) };
  return {
    part: { id: known?.id ?? randomUUID(), columns: after, row: draft.row.number },
    before: settled && same(settled, after) ? after : settled,
  };
}

/** The database keeps the figures of a plate in an order of its own. */
const sorted = (plate: object) =>
  Object.fromEntries(Object.entries(plate).sort(([a], [b]) => a.localeCompare(b)));
