import { createWriteStream } from 'node:fs';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { stringify } from 'csv-stringify';
import { type ExportColumn, type Reader, headingOf, wallClock } from './export-column';

/**
 * Text that a spreadsheet would run as a formula is led by an apostrophe, which makes it text: the
 * signs are those of OWASP's page on CSV injection, with their full-width forms. Figures are written
 * by us and stay figures, minus sign and all. An import takes the apostrophe off again.
 *
 * @example asPlainText('=1+1') // "'=1+1"
 */
export function asPlainText(text: string): string {
  return /^\s*[=+\-@\uff1d\uff0b\uff0d\uff20]|^[\t\r\n]/.test(text) ? `'${text}` : text;
}

function cellOf<Row>(column: ExportColumn<Row>, row: Row, reader: Reader): string {
  switch (column.kind) {
    case 'text': {
      const value = column.value(row) ?? '';
      return asPlainText(typeof value === 'string' ? value : value[reader.locale]);
    }
    case 'number':
      return String(column.value(row) ?? '');
    case 'date':
      return column.value(row) ?? '';
    case 'instant': {
      const at = column.value(row);
      return at ? wallClock(at, reader.timeZone) : '';
    }
  }
}

/**
 * Writes a table as RFC 4180 has it: comma, CRLF, quotes where needed; UTF-8 with a byte order mark,
 * without which spreadsheets on Windows misread accents.
 */
export async function writeCsv<Row>(
  path: string,
  columns: readonly ExportColumn<Row>[],
  batches: AsyncIterable<readonly Row[]>,
  reader: Reader,
): Promise<void> {
  async function* lines() {
    yield columns.map((column) => headingOf(column, reader));
    for await (const batch of batches) {
      for (const row of batch) yield columns.map((column) => cellOf(column, row, reader));
    }
  }
  await pipeline(
    Readable.from(lines()),
    stringify({ bom: true, record_delimiter: '\r\n', quoted_match: /[\s']/ }),
    createWriteStream(path),
  );
}
