import { columnIndex } from '@shared/exports/column-letters';
import { importLimits } from '@shared/imports/import-limits';
import type { TableRow } from './table-row';
import { XlsxArchive } from './xlsx-archive';
import { type XlsxBook, readBook } from './xlsx-book';
import { xmlEvents } from './xml-events';

/**
 * Reads the first sheet of a workbook row by row; formulas give their last result.
 * @throws Problem 422 when it is no workbook or unpacks to too much
 */
export async function* readXlsx(bytes: Buffer): AsyncGenerator<TableRow> {
  const archive = await XlsxArchive.open(bytes);
  const book = await readBook(archive);
  let ready: TableRow[] = [];
  let number = 0;
  let cells: string[] = [];
  let column = -1;
  let type = 'n';
  let format = 0;
  let value = '';
  let reading = false;
  const events = xmlEvents(archive.chunks(book.sheet, importLimits.unpackedBytes), {
    open: (name, attributes) => {
      if (name === 'row') {
        number = Number(attributes['r'] ?? number + 1);
        cells = [];
        column = -1;
      } else if (name === 'c') {
        const letters = (attributes['r'] ?? '').replace(/\d+$/, '');
        column = letters === '' ? column + 1 : columnIndex(letters);
        type = attributes['t'] ?? 'n';
        format = Number(attributes['s'] ?? 0);
        value = '';
      }
      reading = name === 'v' || name === 't';
    },
    text: (text) => {
      if (reading && value.length <= importLimits.cell) value += text;
    },
    close: (name) => {
      reading = false;
      if (name === 'c' && column >= 0 && column < importLimits.columns && value !== '') {
        while (cells.length < column) cells.push('');
        cells[column] = cellText(value, type, format, book).trim();
      }
      if (name === 'row') ready.push({ number, cells });
    },
  });
  for await (const _ of events) {
    void _;
    const rows = ready;
    ready = [];
    yield* rows;
  }
}

function cellText(value: string, type: string, format: number, book: XlsxBook): string {
  if (type === 's') return book.sharedStrings[Number(value)] ?? '';
  if (type === 'b') return value === '1' ? 'TRUE' : 'FALSE';
  if (type === 'd') return value.replace('T00:00:00', '').replace(/Z$|\.0+$/, '');
  if (type !== 'n') return value;
  const figure = Number(value);
  if (!Number.isFinite(figure)) return value;
  if (book.showsDate[format]) return dateText(figure, book.from1904);
  // Files keep 41.880000000000003 where a person typed 41.88.
  return String(Number(figure.toPrecision(15)));
}

/**
 * A day number of a spreadsheet as text: a date, a date with time, or a time of day alone.
 *
 * @example dateText(46173, false) // '2026-05-31'; dateText(0.25, false) // '06:00'
 */
export function dateText(serial: number, from1904: boolean): string {
  const minutes = Math.round(serial * 1440);
  const time = new Date((((minutes % 1440) + 1440) % 1440) * 60_000).toISOString().slice(11, 16);
  if (serial >= 0 && minutes < 1440 && !from1904) return time;
  // 1900 counts a 29 February that never was; days before it are one off.
  const epoch = from1904 ? Date.UTC(1904, 0, 1) : Date.UTC(1899, 11, serial < 61 ? 31 : 30);
  const day = new Date(epoch + minutes * 60_000);
  if (Number.isNaN(day.getTime())) return String(serial);
  const date = day.toISOString().slice(0, 10);
  return minutes % 1440 === 0 ? date : `${date} ${time}`;
}
