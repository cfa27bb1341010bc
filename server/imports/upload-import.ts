import { guessDateOrder, guessFields } from '@shared/imports/guess-fields';
import type { ImportKind } from '@shared/imports/import-fields';
import { conflict } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import type { Services } from '../http/services';
import { FileStore, newFileKey } from '../uploads/file-store';
import type { ReceivedFile } from '../uploads/receive-file';
import { previewTable } from './preview-table';
import { formatOf } from './read-table';

const contentTypes = {
  csv: 'text/csv',
  xlsx: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
} as const;

/**
 * Keeps a file that is to be imported, with what its columns are taken for. Sent again under the same
 * id by the same person it changes nothing.
 * @throws Problem 422 when it cannot be read as a table; 409 when the id is another's; 503
 */
export async function uploadImport(
  tenant: Tenant,
  actor: Actor,
  services: Services,
  { id, kind }: { readonly id: string; readonly kind: ImportKind },
  file: ReceivedFile,
): Promise<void> {
  const before = await tenant.row<{ own: boolean }>(
    'SELECT created_by = $2 AS own FROM imports WHERE id = $1',
    [id, actor.personId],
  );
  if (before?.own === false) throw conflict('This id stands for another import.');
  if (before) return;
  const format = formatOf(file.bytes);
  const { columns, values } = await previewTable(file.bytes, format);
  const headings = columns.map(({ heading }) => heading);
  const fields = guessFields(kind, headings);
  const key = newFileKey(tenant.organisationId, 'import');
  await new FileStore(services).put(key, file.bytes, contentTypes[format]);
  const made = await tenant.row(
    `INSERT INTO imports (id, organisation_id, kind, storage_key, file_name, file_bytes, format,
       columns, date_order, created_by, created_at)
     VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11) ON CONFLICT DO NOTHING RETURNING id`,
    [
      id,
      tenant.organisationId,
      kind,
      key,
      file.name,
      file.bytes.length,
      format,
      JSON.stringify(columns.map((column, index) => ({ ...column, field: fields[index] ?? null }))),
      guessDateOrder(values, actor.locale === 'es' ? 'dmy' : 'mdy'),
      actor.personId,
      services.now(),
    ],
  );
  if (!made) throw conflict('This id stands for another import.');
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'import',
    subjectId: id,
    action: 'import-uploaded',
    detail: { kind, fileName: file.name, bytes: file.bytes.length },
  });
}
