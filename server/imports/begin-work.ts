import { grantsWith } from '@shared/access/ability';
import { importLimits } from '@shared/imports/import-limits';
import { type ReadRow, readRow } from '@shared/imports/read-row';
import { Problem, forbidden } from '@shared/problem';
import type { Actor } from '../access/actor';
import { loadActor } from '../access/load-actor';
import type { LongJobRun, LongJobServices } from '../long-jobs/long-job';
import { FileStore } from '../uploads/file-store';
import { type ImportRecord, importRecord } from './import-record';
import { readTable } from './read-table';
import { isBlank } from './table-row';

const STRETCH = 1_000;

/** What a long job of an import works with. */
export interface ImportWork {
  readonly record: ImportRecord;
  /** Who asked for it, with the roles held now. */
  readonly actor: Actor;
  /** The file's rows below its headings, a thousand at a time, always cut at the same places. */
  stretches(): AsyncGenerator<ReadRow[]>;
}

/** @throws Problem 401 or 403 when the person may not import any more, 404 when the file is gone */
export async function beginWork(services: LongJobServices, run: LongJobRun): Promise<ImportWork> {
  const { importId } = run.input as { importId: string };
  const { record, actor } = await run.inTenant(async (tenant) => ({
    record: await importRecord(tenant, importId),
    actor: await loadActor(tenant, run.askedBy),
  }));
  if (grantsWith('fleet.import', actor.grants).length === 0) throw forbidden();
  const bytes = await new FileStore(services).read(record.storageKey);
  return { record, actor, stretches: () => stretchesOf(record, bytes) };
}

async function* stretchesOf(record: ImportRecord, bytes: Buffer): AsyncGenerator<ReadRow[]> {
  const fields = record.columns.map(({ field }) => field);
  let headings = true;
  let count = 0;
  let stretch: ReadRow[] = [];
  for await (const row of readTable(bytes, record.format)) {
    if (isBlank(row)) continue;
    if (headings) {
      headings = false;
      continue;
    }
    count += 1;
    if (count > importLimits.rows) throw tooMany();
    stretch.push(readRow(row.number, row.cells, fields, record.dateOrder));
    if (stretch.length < STRETCH) continue;
    yield stretch;
    stretch = [];
  }
  if (stretch.length > 0) yield stretch;
}

const tooMany = () =>
  new Problem(422, 'too-many-rows', `A file may have ${importLimits.rows} rows at most. Split it.`);
