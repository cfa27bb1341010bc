import { randomUUID } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { rm, stat } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import type { Response } from 'express';
import type { ExportFormat } from '@shared/exports/export-format';
import type { ExportColumn, Reader, Words } from './export-column';
import { writeCsv } from './write-csv';
import { writeXlsx } from './write-xlsx';

const contentTypes: Readonly<Record<ExportFormat, string>> = {
  csv: 'text/csv; charset=utf-8',
  xlsx: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
};

export interface ExportedTable<Row> {
  /** What the file is called, without ending: `stores`. */
  readonly name: Words;
  readonly format: ExportFormat;
  readonly columns: readonly ExportColumn<Row>[];
  readonly batches: AsyncIterable<readonly Row[]>;
  /** The present instant: its day in the reader's zone stands in the file's name. */
  readonly now: Date;
}

/**
 * Writes a list into a file and gives back how to send it. The file is complete before the first byte
 * leaves, so that a fault becomes a problem document instead of half a file, and a slow reader keeps
 * no database connection. Its rows stream through; 100,000 at most.
 *
 * A feature adds the export of its list in three steps:
 *
 * 1. In its contract an endpoint with the list's filters and `...fileFormat`, replying `fileReply`
 *    (both from `@shared/exports/export-format`), say `GET /findings/export`.
 * 2. A file of columns, in the order of the table on screen:
 *    `const findingColumns = [text<FindingRow>({ en: 'Store', es: 'Local' }, (row) => row.storeName), …]`.
 * 3. In its routes, before any `/findings/:id`:
 *
 * @example
 * routes.download(contract.exportFindings, ({ tenant, actor, query: { format, ...filters }, now }) =>
 *   exportTable(actor, {
 *     name: { en: 'findings', es: 'hallazgos' },
 *     format,
 *     columns: findingColumns,
 *     batches: pageBatches((page, pageSize) =>
 *       pageOfFindings(tenant, actor, { ...filters, page, pageSize })),
 *     now: now(),
 *   }),
 * );
 *
 * Lists of tens of thousands read faster through `cursorBatches`. On the client
 * `<vw-export-menu [csv]="address('csv')" [xlsx]="address('xlsx')" />` links to it.
 */
export async function exportTable<Row>(
  reader: Reader,
  { name, format, columns, batches, now }: ExportedTable<Row>,
): Promise<(res: Response) => Promise<void>> {
  const path = join(tmpdir(), `export-${randomUUID()}.${format}`);
  const write = format === 'csv' ? writeCsv : writeXlsx;
  try {
    await write(path, columns, batches, reader);
  } catch (error) {
    await rm(path, { force: true });
    throw error;
  }
  const day = new Intl.DateTimeFormat('en-CA', { timeZone: reader.timeZone }).format(now);
  return async (res) => {
    try {
      res.set({
        'Content-Type': contentTypes[format],
        'Content-Length': String((await stat(path)).size),
        // Only letters and hyphens of our own: no name needs escaping.
        'Content-Disposition': `attachment; filename="${name[reader.locale]}-${day}.${format}"`,
        'X-Content-Type-Options': 'nosniff',
      });
      await pipeline(createReadStream(path), res);
    } finally {
      await rm(path, { force: true });
    }
  };
}
