import { createWriteStream } from 'node:fs';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { ZipFile } from 'yazl';
import { columnLetters } from '@shared/exports/column-letters';
import { type ExportColumn, type Reader, headingOf, wallClock } from './export-column';
import { bookParts } from './xlsx-parts';

/** Styles by their place in `cellXfs` of the book's style sheet. */
const styles = { heading: 1, date: 2, instant: 3 } as const;

/** A spreadsheet's cell holds no more (ECMA-376 readers' common limit). */
const CELL = 32_767;

// What XML 1.0 (2.2) lets stand in no document: control characters and halves of a pair.
const unfit =
  // eslint-disable-next-line no-control-regex
  /[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]|[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/g;

const escaped = (text: string) =>
  text
    .slice(0, CELL)
    .replace(unfit, '')
    .replace(/&/g, '&amp;')
    .replace(/</g, '&lt;')
    .replace(/>/g, '&gt;');

const textCell = (at: string, text: string, style = 0) =>
  `<c r="${at}" t="inlineStr" s="${style}"><is><t xml:space="preserve">${escaped(text)}</t></is></c>`;
const figureCell = (at: string, value: number, style = 0) =>
  `<c r="${at}" s="${style}"><v>${value}</v></c>`;

/**
 * Days since the epoch of spreadsheets, 1899-12-30 for every date after February 1900
 * (ECMA-376 part 1, 18.17.4.1).
 *
 * @example serialOf('2026-05-31 12:00') // 46173.5
 */
export function serialOf(wallTime: string): number {
  const [day = '', time = '00:00'] = wallTime.split(/[ T]/);
  return (Date.parse(`${day}T${time}Z`) - Date.UTC(1899, 11, 30)) / 86_400_000;
}

function cellOf<Row>(column: ExportColumn<Row>, row: Row, at: string, reader: Reader): string {
  const value = column.value(row);
  if (value === null || value === undefined || value === '') return '';
  switch (column.kind) {
    case 'text':
      return textCell(
        at,
        typeof value === 'object' && 'en' in value ? value[reader.locale] : String(value),
      );
    case 'number':
      return Number.isFinite(value) ? figureCell(at, value as number) : '';
    case 'date':
      return figureCell(at, serialOf(value as string), styles.date);
    case 'instant':
      return figureCell(
        at,
        serialOf(wallClock(value as Date | string, reader.timeZone)),
        styles.instant,
      );
  }
}

/**
 * Writes a table as a workbook of one sheet, row by row, so that its length costs no memory. Text is
 * stored as text and can be no formula. The headings are bold and stay in sight.
 */
export async function writeXlsx<Row>(
  path: string,
  columns: readonly ExportColumn<Row>[],
  batches: AsyncIterable<readonly Row[]>,
  reader: Reader,
): Promise<void> {
  const letters = columns.map((_, index) => columnLetters(index));
  async function* sheet() {
    const headings = columns.map((column) => headingOf(column, reader));
    yield sheetHead(headings);
    yield `<row r="1">${headings
      .map((heading, index) => textCell(`${letters[index]}1`, heading, styles.heading))
      .join('')}</row>`;
    let number = 1;
    for await (const batch of batches) {
      let rows = '';
      for (const row of batch) {
        number += 1;
        const cells = columns.map((it, at) => cellOf(it, row, `${letters[at]}${number}`, reader));
        rows += `<row r="${number}">${cells.join('')}</row>`;
      }
      yield rows;
    }
    yield '</sheetData></worksheet>';
  }
  const zip = new ZipFile();
  for (const [name, content] of Object.entries(bookParts)) {
    zip.addBuffer(Buffer.from(content), name);
  }
  const rows = Readable.from(sheet(), { objectMode: false });
  zip.addReadStream(rows, 'xl/worksheets/sheet1.xml');
  zip.end();
  // The archive does not pass on a fault of what it packs.
  const packed = zip.outputStream as Readable;
  rows.on('error', (error) => packed.destroy(error));
  await pipeline(packed, createWriteStream(path));
}

function sheetHead(headings: readonly string[]): string {
  const widths = headings.map((heading, index) => {
    const width = Math.min(40, Math.max(12, heading.length + 2));
    return `<col min="${index + 1}" max="${index + 1}" width="${width}" customWidth="1"/>`;
  });
  return (
    '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>' +
    '<worksheet xmlns="http://schemas.openxmlformats.org/spreadsheetml/2006/main">' +
    '<sheetViews><sheetView workbookViewId="0"><pane ySplit="1" topLeftCell="A2" ' +
    'activePane="bottomLeft" state="frozen"/></sheetView></sheetViews>' +
    `<cols>${widths.join('')}</cols><sheetData>`
  );
}
