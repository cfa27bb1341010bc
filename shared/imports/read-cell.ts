import type { DateOrder } from './import-fields';
import type { ProblemReason } from './problem-words';

/** A cell understood, or what is wrong with it. */
export type CellReading<T> =
  | { readonly value: T }
  | { readonly reason: ProblemReason; readonly params?: Readonly<Record<string, string | number>> };

export const line =
  (max: number) =>
  (cell: string): CellReading<string> =>
    cell.length > max ? { reason: 'too-long', params: { max } } : { value: cell };

/**
 * A figure, with a point or a comma before its decimals. A comma before exactly three digits parts
 * thousands, unless the figure is never that large (`commaIsDecimal`).
 *
 * @example
 * figure(0, 10_000)('1,725') // { value: 1725 }
 * figure(0, 9_999)('50,5') // { value: 50.5 }
 */
export const figure =
  (min: number, max: number, { whole = false, commaIsDecimal = false } = {}) =>
  (cell: string): CellReading<number> => {
    const thousands = !commaIsDecimal && /^[-+]?\d{1,3}(,\d{3})+(\.\d+)?$/.test(cell);
    const plain = thousands ? cell.replaceAll(',', '') : cell.replace(',', '.');
    if (!/^[-+]?(\d+\.?\d*|\.\d+)$/.test(plain)) return { reason: 'not-a-number' };
    const value = Number(plain);
    if (whole && !Number.isInteger(value)) return { reason: 'not-whole' };
    if (value < min || value > max) return { reason: 'out-of-range', params: { min, max } };
    return { value };
  };

/**
 * A calendar date as `YYYY-MM-DD`; a time behind it is passed over. Two digits of a year are of this
 * century.
 *
 * @example
 * calendarDate('5/31/26', 'mdy') // { value: '2026-05-31' }
 * calendarDate('31.05.2026', 'mdy') // { reason: 'not-a-date' }
 */
export function calendarDate(cell: string, order: DateOrder): CellReading<string> {
  const day = cell.replace(/[T ]\d{1,2}:\d{2}.*$/, '');
  const iso = /^(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})$/.exec(day);
  const local = /^(\d{1,2})[-/.](\d{1,2})[-/.](\d{4}|\d{2})$/.exec(day);
  const parts = iso
    ? [iso[1], iso[2], iso[3]]
    : local && (order === 'mdy' ? [local[3], local[1], local[2]] : [local[3], local[2], local[1]]);
  if (!parts) return { reason: 'not-a-date' };
  const [year = '', month = '', date = ''] = parts as string[];
  const value = `${year.padStart(4, '20')}-${month.padStart(2, '0')}-${date.padStart(2, '0')}`;
  const read = new Date(`${value}T00:00:00Z`);
  const exists = !Number.isNaN(read.getTime()) && read.toISOString().slice(0, 10) === value;
  return exists && value >= '1950-01-01' ? { value } : { reason: 'not-a-date' };
}

/**
 * A time of day as `HH:MM`.
 *
 * @example timeOfDay('6:30 pm') // { value: '18:30' }; timeOfDay('6') // { value: '06:00' }
 */
export function timeOfDay(cell: string): CellReading<string> {
  const found = /^(\d{1,2})(?::(\d{2}))?(?::\d{2})?\s*([ap])?\.?\s?m?\.?$/i.exec(cell);
  if (!found) return { reason: 'not-a-time' };
  const [, hours = '', minutes = '00', half] = found;
  let hour = Number(hours);
  if (half) {
    if (hour < 1 || hour > 12) return { reason: 'not-a-time' };
    hour = (hour % 12) + (half.toLowerCase() === 'p' ? 12 : 0);
  }
  if (hour === 24 && minutes === '00') hour = 0;
  if (hour > 23 || Number(minutes) > 59) return { reason: 'not-a-time' };
  return { value: `${String(hour).padStart(2, '0')}:${minutes}` };
}

/**
 * Spans of a day in which nobody may work on the line.
 *
 * @example rushSpans('11:00-13:30; 17-19') // two spans
 */
export function rushSpans(cell: string): CellReading<{ from: string; to: string }[]> {
  const spans: { from: string; to: string }[] = [];
  for (const part of cell.split(/[;,|]/).filter((it) => it.trim() !== '')) {
    const [from, to, ...more] = part
      .split(/\s*(?:-|–|\bto\b|\ba\b)\s*/)
      .map((it) => timeOfDay(it.trim()));
    if (!from || !to || more.length > 0 || !('value' in from) || !('value' in to)) {
      return { reason: 'rush-unreadable' };
    }
    if (from.value >= to.value) return { reason: 'rush-unreadable' };
    spans.push({ from: from.value, to: to.value });
  }
  return spans.length > 6 ? { reason: 'rush-unreadable' } : { value: spans };
}
