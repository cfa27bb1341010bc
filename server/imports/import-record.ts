import type { DateOrder, ImportField, ImportKind } from '@shared/imports/import-fields';
import type { ImportMode, ImportOutcome } from '@shared/imports/imports-contract';
import { notFound } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { TableFormat } from './table-row';

export interface ImportColumn {
  readonly heading: string;
  readonly samples: readonly string[];
  readonly field: ImportField | null;
}

/** An import as the database keeps it. */
export interface ImportRecord {
  readonly id: string;
  readonly kind: ImportKind;
  readonly storageKey: string;
  readonly format: TableFormat;
  readonly columns: readonly ImportColumn[];
  readonly dateOrder: DateOrder;
  readonly checked: ImportOutcome | null;
  readonly mode: ImportMode | null;
  readonly version: number;
  readonly createdBy: string;
  readonly jobKind: string | null;
  readonly jobState: 'waiting' | 'running' | 'finished' | 'failed' | 'cancelled' | null;
}

export const recordColumns = `i.id, i.kind, i.storage_key AS "storageKey", i.format, i.columns,
  i.date_order AS "dateOrder", i.checked, i.mode, i.version, i.created_by AS "createdBy",
  j.kind AS "jobKind", j.state AS "jobState"`;

/** One import, for those who work on it. @throws Problem 404 */
export async function importRecord(tenant: Tenant, id: string): Promise<ImportRecord> {
  const record = await tenant.row<ImportRecord>(
    `SELECT ${recordColumns} FROM imports i LEFT JOIN long_jobs j ON j.id = i.job_id WHERE i.id = $1`,
    [id],
  );
  if (!record) throw notFound('import');
  return record;
}
