import { randomUUID } from 'node:crypto';
import {
  type DateOrder,
  type ImportField,
  fieldsOf,
  importFields,
  neededFields,
} from '@shared/imports/import-fields';
import { type FieldError, invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { askLongJob } from '../long-jobs/ask-long-job';
import { editableImport } from './editable-import';
import type { ImportRecord } from './import-record';

export interface CheckRequest {
  readonly id: string;
  readonly version: number;
  readonly fields: readonly (ImportField | null)[];
  readonly dateOrder: DateOrder;
}

/**
 * Writes down what the columns hold, and asks for every row to be looked at.
 * @throws Problem 404; 409 when it runs or is done; 422 for columns that cannot be so
 */
export async function checkImport(
  tenant: Tenant,
  actor: Actor,
  { id, version, fields, dateOrder }: CheckRequest,
): Promise<void> {
  const record = await editableImport(tenant, actor, { id, version });
  const errors = faultsOf(record, fields, actor.locale);
  if (errors.length > 0) throw invalid(errors);
  const jobId = randomUUID();
  await askLongJob(tenant, {
    id: jobId,
    kind: 'import-check',
    input: { importId: id },
    askedBy: actor.personId,
  });
  await tenant.rows(
    `UPDATE imports SET columns = $2, date_order = $3, job_id = $4, checked = NULL, mode = NULL,
       version = version + 1 WHERE id = $1`,
    [
      id,
      JSON.stringify(
        record.columns.map((column, at) => ({ ...column, field: fields[at] ?? null })),
      ),
      dateOrder,
      jobId,
    ],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'import',
    subjectId: id,
    action: 'import-check-asked',
  });
}

function faultsOf(
  { kind, columns }: ImportRecord,
  fields: readonly (ImportField | null)[],
  locale: 'en' | 'es',
): FieldError[] {
  const errors: FieldError[] = [];
  if (fields.length !== columns.length) {
    const message = `The file has ${columns.length} columns.`;
    errors.push({ field: 'fields', reason: 'count', message });
  }
  fields.forEach((field, at) => {
    if (field === null) return;
    const heading = importFields[field][locale];
    if (!fieldsOf[kind].includes(field)) {
      const message = `A file of this kind has no “${heading}”.`;
      errors.push({ field: `fields.${at}`, reason: 'not-of-kind', message });
    } else if (fields.indexOf(field) < at) {
      const message = `Another column is taken for “${heading}” already.`;
      errors.push({ field: `fields.${at}`, reason: 'twice', message });
    }
  });
  for (const field of neededFields[kind].filter((it) => !fields.includes(it))) {
    const message = `Say which column holds “${importFields[field][locale]}”.`;
    errors.push({ field: 'fields', reason: 'needed', message, params: { field } });
  }
  return errors;
}
