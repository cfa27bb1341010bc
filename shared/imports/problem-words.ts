import { type ImportField, importFields } from './import-fields';

/** All that can be wrong with a row. Codes are stored; the words are for people. */
export const problemReasons = [
  'needed',
  'too-long',
  'not-a-number',
  'not-whole',
  'out-of-range',
  'not-a-date',
  'not-a-time',
  'rush-unreadable',
  'in-future',
  'unknown-word',
  'time-zone',
  'half-a-position',
  'position-unknown',
  'pump-only',
  'doubled',
  'differs',
  'chain-unknown',
  'store-unknown',
  'unit-unknown',
  'retired',
  'part-differs',
  'part-date-needed',
  'not-yours',
] as const;
export type ProblemReason = (typeof problemReasons)[number];

export interface RowProblem {
  readonly field: ImportField | null;
  readonly reason: ProblemReason;
  /** What stands in the file, cut to a readable length. */
  readonly value: string;
  readonly params?: Readonly<Record<string, string | number>>;
}

type Say = (heading: string, value: string, params: Record<string, string | number>) => string;

const en: Readonly<Record<ProblemReason, Say>> = {
  needed: (heading) => `${heading} is missing.`,
  'too-long': (heading, _, { max }) => `${heading} is longer than ${max} characters.`,
  'not-a-number': (_, value) => `“${value}” is not a number.`,
  'not-whole': (_, value) => `“${value}” is not a whole number.`,
  'out-of-range': (_, value, { min, max }) => `“${value}” must lie between ${min} and ${max}.`,
  'not-a-date': (_, value) => `“${value}” is not a date. Write it as 2026-05-31.`,
  'not-a-time': (_, value) => `“${value}” is not a time of day. Write it as 06:30.`,
  'rush-unreadable': (_, value) =>
    `“${value}” cannot be read. Write spans as 11:00-13:30, several with a semicolon between.`,
  'in-future': (_, value) => `${value} has not come yet.`,
  'unknown-word': (_, value, { choices }) => `“${value}” is none of: ${choices}.`,
  'time-zone': (_, value) => `There is no time zone “${value}”. One is called America/Chicago.`,
  'half-a-position': () => 'A position needs both latitude and longitude.',
  'position-unknown': (_, value) =>
    value === ''
      ? 'Where the store lies is not known: give its ZIP code, or latitude and longitude.'
      : `The ZIP code “${value}” is not known. Correct it, or give latitude and longitude.`,
  'pump-only': () => 'Only a pump has a face with a drain slot or a gasket.',
  doubled: (_, _value, { row }) => `Row ${row} is about the same one.`,
  differs: (heading, value, { row }) =>
    `${heading} “${value}” differs from what row ${row} says of the same store.`,
  'chain-unknown': (_, value) =>
    value === '' ? 'Say which chain the store belongs to.' : `There is no chain “${value}”.`,
  'store-unknown': (_, value) =>
    `The chain has no store “${value}”. Import the stores first, or add a column with its name.`,
  'unit-unknown': (_, value) => `The store has no unit “${value}”. Import the units first.`,
  retired: (heading, value) => `${heading} “${value}” is retired. Restore it first.`,
  'part-differs': (_, value, { known }) =>
    `The unit has another one fitted, with serial number ${known}, not “${value}”. Record the ` +
    'replacement with its cause at the unit, or correct the file.',
  'part-date-needed': (heading) =>
    `${heading} is missing, and the unit has no date either: a part needs the day it was fitted.`,
  'not-yours': () => 'Your role does not allow you to change this one.',
};

const es: Readonly<Record<ProblemReason, Say>> = {
  needed: (heading) => `Falta: ${heading}.`,
  'too-long': (heading, _, { max }) => `${heading} tiene más de ${max} caracteres.`,
  'not-a-number': (_, value) => `«${value}» no es un número.`,
  'not-whole': (_, value) => `«${value}» no es un número entero.`,
  'out-of-range': (_, value, { min, max }) => `«${value}» debe estar entre ${min} y ${max}.`,
  'not-a-date': (_, value) => `«${value}» no es una fecha. Escríbala como 2026-05-31.`,
  'not-a-time': (_, value) => `«${value}» no es una hora. Escríbala como 06:30.`,
  'rush-unreadable': (_, value) =>
    `«${value}» no se entiende. Escriba los tramos como 11:00-13:30, separados por punto y coma.`,
  'in-future': (_, value) => `${value} todavía no ha llegado.`,
  'unknown-word': (_, value, { choices }) => `«${value}» no es ninguna de estas: ${choices}.`,
  'time-zone': (_, value) => `No existe la zona horaria «${value}». Una se llama America/Chicago.`,
  'half-a-position': () => 'Una posición necesita latitud y longitud.',
  'position-unknown': (_, value) =>
    value === ''
      ? 'No se sabe dónde está el local: indique su código postal, o latitud y longitud.'
      : `No se conoce el código postal «${value}». Corríjalo, o indique latitud y longitud.`,
  'pump-only': () => 'Solo una bomba tiene cara con ranura de drenaje o junta.',
  doubled: (_, _value, { row }) => `La fila ${row} trata de lo mismo.`,
  differs: (heading, value, { row }) =>
    `${heading} «${value}» difiere de lo que la fila ${row} dice del mismo local.`,
  'chain-unknown': (_, value) =>
    value === '' ? 'Indique a qué cadena pertenece el local.' : `No existe la cadena «${value}».`,
  'store-unknown': (_, value) =>
    `La cadena no tiene el local «${value}». Importe primero los locales, o añada una columna con su nombre.`,
  'unit-unknown': (_, value) =>
    `El local no tiene el equipo «${value}». Importe primero los equipos.`,
  retired: (heading, value) => `${heading} «${value}» está retirado. Restáurelo primero.`,
  'part-differs': (_, value, { known }) =>
    `El equipo tiene instalada otra, con número de serie ${known}, no «${value}». Registre el cambio ` +
    'con su causa en el equipo, o corrija el archivo.',
  'part-date-needed': (heading) =>
    `Falta: ${heading}, y el equipo tampoco tiene fecha; una pieza necesita el día en que se instaló.`,
  'not-yours': () => 'Su función no le permite cambiar esto.',
};

/**
 * What is wrong, as a sentence for the person who can put it right.
 *
 * @example
 * problemInWords({ field: 'vats', reason: 'not-a-number', value: 'two' }, 'en')
 * // '“two” is not a number.'
 */
export function problemInWords(problem: RowProblem, locale: 'en' | 'es'): string {
  const heading = problem.field ? importFields[problem.field][locale] : '';
  return (locale === 'es' ? es : en)[problem.reason](heading, problem.value, { ...problem.params });
}
