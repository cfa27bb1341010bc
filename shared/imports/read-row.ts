import {
  type ComponentKind,
  type PumpFace,
  type UnitKind,
  componentKindWords,
  pumpFaceWords,
  unitKindWords,
} from '../fleet/fleet-words';
import { plainHeading } from './guess-fields';
import type { DateOrder, ImportField } from './import-fields';
import type { RowProblem } from './problem-words';
import { type CellReading, calendarDate, figure, line, rushSpans, timeOfDay } from './read-cell';

type Words = Readonly<Record<'en' | 'es', string>>;

/** One of a few things, under our own words for it or others that people use. */
const oneOf =
  <T extends string>(
    words: Readonly<Record<T, Words>>,
    also: Readonly<Record<T, readonly string[]>>,
  ) =>
  (cell: string): CellReading<T> => {
    const said = plainHeading(cell);
    const found = (Object.keys(words) as T[]).find((it) =>
      [it, words[it].en, words[it].es, ...also[it]].some((word) => plainHeading(word) === said),
    );
    if (found) return { value: found };
    const choices = Object.values<Words>(words).map((it) => it.en);
    return { reason: 'unknown-word', params: { choices: choices.join(', ') } };
  };

const unitKind = oneOf<UnitKind>(unitKindWords, {
  'built-in': ['built in', 'builtin', 'integrated', 'fixed', 'integrado', 'fijo'],
  portable: ['portable', 'mobile', 'portátil', 'móvil'],
});
const face = oneOf<PumpFace>(pumpFaceWords, {
  'drain-slot': ['slot', 'drain', 'ranura', 'drenaje'],
  gasket: ['seal', 'empaque', 'junta'],
});
const partKind = oneOf<ComponentKind>(componentKindWords, {
  pump: ['pump', 'bomba', 'bomba de filtro'],
  motor: ['pump motor', 'motor de la bomba'],
  pan: ['pan', 'bandeja', 'charola', 'bandeja de filtro'],
  hose: ['filter hose', 'manguera de filtrado'],
});
/** Spreadsheets take the leading zeros off: 2134 is 02134. */
const zipCode = (cell: string) => line(20)(/^\d{3,4}$/.test(cell) ? cell.padStart(5, '0') : cell);
const longitude = figure(-180, 180, { commaIsDecimal: true });
const latitude = figure(-90, 90, { commaIsDecimal: true });

/** How each field is read, with the limits that the forms have. */
const readers = {
  chain: line(120),
  region: line(120),
  storeNumber: line(40),
  storeName: line(120),
  addressLine: line(200),
  city: line(100),
  usState: line(40),
  postalCode: zipCode,
  latitude,
  longitude,
  timeZone: line(60),
  phone: line(40),
  accessNote: line(1000),
  opens: timeOfDay,
  closes: timeOfDay,
  rush: rushSpans,
  unitTag: line(40),
  unitKind,
  vats: figure(1, 12, { whole: true }),
  oilPounds: figure(0.1, 9999),
  unitModel: line(80),
  unitInstalledOn: calendarDate,
  outOfServiceSince: calendarDate,
  pumpSerial: line(80),
  pumpModel: line(80),
  pumpFace: face,
  pumpInstalledOn: calendarDate,
  motorSerial: line(80),
  motorModel: line(80),
  motorInstalledOn: calendarDate,
  volts: figure(0.1, 1000),
  amps: figure(0.01, 200),
  horsepower: figure(0.01, 20),
  phase: figure(1, 3, { whole: true }),
  rpm: figure(1, 10_000),
  panSerial: line(80),
  panInstalledOn: calendarDate,
  hoseSerial: line(80),
  hoseInstalledOn: calendarDate,
  partKind,
  partSerial: line(80),
  partModel: line(80),
  partFace: face,
  partInstalledOn: calendarDate,
} satisfies Record<ImportField, (cell: string, order: DateOrder) => CellReading<unknown>>;

type ValueOf<R> = R extends (...args: never[]) => CellReading<infer T> ? T : never;

/** What a row says; a blank cell says nothing. */
export type RowValues = { readonly [F in ImportField]?: ValueOf<(typeof readers)[F]> };

/** A row as it was understood, before it is held against the fleet. */
export interface ReadRow {
  readonly number: number;
  readonly values: RowValues;
  readonly problems: readonly RowProblem[];
}

/**
 * Reads one row of a file by what its columns hold. Pure: the check and the import read alike.
 *
 * @param fields what each column holds, from the left
 */
export function readRow(
  number: number,
  cells: readonly string[],
  fields: readonly (ImportField | null)[],
  order: DateOrder,
): ReadRow {
  const values: Record<string, unknown> = {};
  const problems: RowProblem[] = [];
  fields.forEach((field, index) => {
    const cell = cells[index] ?? '';
    if (field === null || cell === '') return;
    const reading: CellReading<unknown> = readers[field](cell, order);
    if ('value' in reading) values[field] = reading.value;
    else problems.push({ field, value: cell.slice(0, 80), ...reading });
  });
  // Motors have one phase or three.
  if (values['phase'] === 2) {
    problems.push({
      field: 'phase',
      reason: 'unknown-word',
      value: '2',
      params: { choices: '1, 3' },
    });
  }
  return { number, values: values as RowValues, problems };
}
