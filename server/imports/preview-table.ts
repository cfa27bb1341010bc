import { importLimits } from '@shared/imports/import-limits';
import { readTable } from './read-table';
import { type TableFormat, isBlank, unreadable } from './table-row';

const ROWS = 50;
const SAMPLES = 3;

/** The headings of a file and what stands below them at first. */
export interface TablePreview {
  readonly columns: readonly { readonly heading: string; readonly samples: readonly string[] }[];
  /** Cells of the first rows, to guess the order of dates by. */
  readonly values: readonly string[];
}

/**
 * Reads the beginning of a file: its first row that is not blank has the headings.
 * @throws Problem 422 when there are no headings or nothing below them
 */
export async function previewTable(bytes: Buffer, format: TableFormat): Promise<TablePreview> {
  let headings: readonly string[] | undefined;
  const rows: (readonly string[])[] = [];
  for await (const row of readTable(bytes, format)) {
    if (isBlank(row)) continue;
    if (!headings) headings = row.cells;
    else rows.push(row.cells);
    if (rows.length === ROWS) break;
  }
  if (!headings) throw unreadable('It is empty.');
  if (rows.length === 0) throw unreadable('It has no rows below its headings.');
  const width = Math.min(
    importLimits.columns,
    Math.max(headings.length, ...rows.map((cells) => cells.length)),
  );
  return {
    columns: Array.from({ length: width }, (_, index) => ({
      heading: (headings[index] ?? '').slice(0, 120),
      samples: rows
        .map((cells) => (cells[index] ?? '').slice(0, 60))
        .filter((cell) => cell !== '')
        .slice(0, SAMPLES),
    })),
    values: rows.flat(),
  };
}
