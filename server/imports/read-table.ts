import { readCsv } from './read-csv';
import { readXlsx } from './read-xlsx';
import { type TableFormat, type TableRow, unreadable } from './table-row';

/**
 * What a file is by its bytes, whatever its name says.
 * @throws Problem 422 for what is no table, with what to do about it
 */
export function formatOf(bytes: Buffer): TableFormat {
  const starts = (hex: string) => bytes.subarray(0, hex.length / 2).toString('hex') === hex;
  if (starts('504b0304')) return 'xlsx';
  if (starts('d0cf11e0')) {
    throw unreadable(
      'It is a workbook of the old kind (XLS), or locked by a password. Save it as XLSX.',
    );
  }
  const utf16 = starts('fffe') || starts('feff');
  if (!utf16 && bytes.subarray(0, 65_536).includes(0)) {
    throw unreadable('It is neither CSV nor XLSX.');
  }
  return 'csv';
}

/** The rows of a file in order, blank ones too; nothing is held but the row at hand. */
export const readTable = (bytes: Buffer, format: TableFormat): AsyncGenerator<TableRow> =>
  format === 'xlsx' ? readXlsx(bytes) : readCsv(bytes);
