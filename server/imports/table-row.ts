import { Problem } from '@shared/problem';

/** One row of a file: its number as spreadsheets count (from 1), and its cells from the left. */
export interface TableRow {
  readonly number: number;
  /** Text as typed; figures in plain digits, dates as `YYYY-MM-DD`, times as `HH:MM`. */
  readonly cells: readonly string[];
}

/** What a file turned out to be. */
export type TableFormat = 'csv' | 'xlsx';

export const isBlank = ({ cells }: TableRow) => cells.every((cell) => cell === '');

/** A file that cannot be read as a table; `message` says what to do about it. */
export const unreadable = (message: string) =>
  new Problem(422, 'file-unreadable', 'This file cannot be read.', {
    errors: [{ field: 'file', reason: 'unreadable', message }],
  });
