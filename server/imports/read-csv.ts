import { Readable } from 'node:stream';
import { CsvError, parse } from 'csv-parse';
import { importLimits } from '@shared/imports/import-limits';
import { type TableRow, unreadable } from './table-row';

const delimiters = [',', ';', '\t', '|'] as const;

/**
 * Reads delimited text as it comes: UTF-8 with or without a byte order mark, UTF-16, or else the
 * Windows code page of western Europe; comma, semicolon, tab or bar between the cells.
 * @throws Problem 422 when quotes never close or a row has no end
 */
export async function* readCsv(bytes: Buffer): AsyncGenerator<TableRow> {
  const encoding = encodingOf(bytes);
  const parser = Readable.from(decoded(bytes, encoding)).pipe(
    parse({
      delimiter: delimiterOf(decodedHead(bytes, encoding)),
      relax_column_count: true,
      max_record_size: importLimits.columns * importLimits.cell,
    }),
  );
  let number = 0;
  try {
    for await (const record of parser as AsyncIterable<string[]>) {
      number += 1;
      const cells = record.slice(0, importLimits.columns).map(tidy);
      yield { number, cells };
    }
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    throw unreadable(`Row ${number + 1} cannot be read: a quotation mark in it never closes.`);
  }
}

/** An export of ours leads text with an apostrophe that would run as a formula: it goes off again. */
const tidy = (cell: string) => cell.trim().replace(/^'(?=\s*[=+\-@\uff1d\uff0b\uff0d\uff20])/, '');

type Encoding = 'utf-8' | 'utf-16le' | 'utf-16be' | 'windows-1252';

/** What the bytes are written in; a file that is no valid UTF-8 comes from an older spreadsheet. */
export function encodingOf(bytes: Buffer): Encoding {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'utf-16le';
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return 'utf-16be';
  try {
    const strict = new TextDecoder('utf-8', { fatal: true });
    for (const chunk of chunksOf(bytes)) strict.decode(chunk, { stream: true });
    strict.decode();
    return 'utf-8';
  } catch {
    return 'windows-1252';
  }
}

/**
 * The mark that stands between cells: the one that the first lines have most of, outside of quotes.
 *
 * @example delimiterOf('Cadena;Local\nA;1,5\n') // ';'
 */
export function delimiterOf(head: string): string {
  const plain = head
    .split('\n')
    .slice(0, 5)
    .join('\n')
    .replace(/"[^"]*"/g, '');
  const counts = delimiters.map((mark) => plain.split(mark).length - 1);
  const first = plain.split('\n')[0] ?? '';
  // The headings decide where they can: a comma may be a decimal sign below.
  const ofHeadings = delimiters.map((mark) => first.split(mark).length - 1);
  const deciding = Math.max(...ofHeadings) > 0 ? ofHeadings : counts;
  return delimiters[deciding.indexOf(Math.max(...deciding))] ?? ',';
}

function decodedHead(bytes: Buffer, encoding: Encoding): string {
  return new TextDecoder(encoding).decode(bytes.subarray(0, 64_000));
}

function* decoded(bytes: Buffer, encoding: Encoding): Generator<string> {
  // The decoder takes the byte order mark off.
  const decoder = new TextDecoder(encoding);
  for (const chunk of chunksOf(bytes)) {
    const text = decoder.decode(chunk, { stream: true });
    if (text !== '') yield text;
  }
  yield decoder.decode();
}

function* chunksOf(bytes: Buffer): Generator<Buffer> {
  for (let at = 0; at < bytes.length; at += 65_536) yield bytes.subarray(at, at + 65_536);
}
