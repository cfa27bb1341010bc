import { fieldsOf, importFields } from '@shared/imports/import-fields';
import { importLimits } from '@shared/imports/import-limits';
import * as contract from '@shared/imports/imports-contract';
import { type ExportColumn, figure, text } from '../exports/export-column';
import { exportTable } from '../exports/export-table';
import { oneBatch, pageBatches } from '../exports/read-batches';
import type { Routes } from '../http/routes';
import { cancelLongJob } from '../long-jobs/cancel-long-job';
import { receiveFile } from '../uploads/receive-file';
import { checkImport } from './check-import';
import { type ImportProblem, importById, pageOfImports, pageOfProblems } from './import-queries';
import { startImport } from './start-import';
import { uploadImport } from './upload-import';

const problemColumns: readonly ExportColumn<ImportProblem>[] = [
  figure({ en: 'Row', es: 'Fila' }, (it) => it.row),
  text({ en: 'Column', es: 'Columna' }, (it) => it.column),
  text({ en: 'Heading', es: 'Encabezado' }, (it) => it.heading),
  text({ en: 'Value', es: 'Valor' }, (it) => it.value),
  text({ en: 'Problem', es: 'Problema' }, (it) => it.message),
];

const spanish = {
  chains: 'cadenas',
  regions: 'regiones',
  stores: 'locales',
  units: 'equipos',
  components: 'piezas',
} as const;

export function importRoutes(routes: Routes): void {
  routes.on(contract.listImports, ({ tenant, actor, query }) =>
    pageOfImports(tenant, actor, query),
  );

  routes.download(contract.downloadTemplate, async ({ actor, query: { kind, format }, now }) =>
    exportTable(actor, {
      name: { en: kind, es: spanish[kind] },
      format,
      columns: fieldsOf[kind].map((field) => text<never>(importFields[field], () => '')),
      batches: oneBatch([]),
      now: now(),
    }),
  );

  routes.upload(
    contract.uploadImport,
    (req) => receiveFile(req, importLimits.fileBytes),
    async ({ tenant, actor, query, received, ...services }) => {
      await uploadImport(tenant, actor, services, query, received);
      return importById(tenant, actor, query.id);
    },
  );

  routes.on(contract.readImport, ({ tenant, actor, params }) =>
    importById(tenant, actor, params.id),
  );

  routes.on(contract.checkImport, async ({ tenant, actor, params, body }) => {
    await checkImport(tenant, actor, { ...body, ...params });
    return importById(tenant, actor, params.id);
  });

  routes.on(contract.listImportProblems, async ({ tenant, actor, params, query }) => {
    const view = await importById(tenant, actor, params.id);
    return pageOfProblems(tenant, actor, view, query);
  });

  routes.download(
    contract.exportImportProblems,
    async ({ tenant, actor, params, query: { format }, now }) => {
      const view = await importById(tenant, actor, params.id);
      return exportTable(actor, {
        name: { en: 'problems', es: 'problemas' },
        format,
        columns: problemColumns,
        batches: pageBatches((page, pageSize) =>
          pageOfProblems(tenant, actor, view, { page, pageSize }),
        ),
        now: now(),
      });
    },
  );

  routes.on(contract.startImport, async ({ tenant, actor, params, body }) => {
    await startImport(tenant, actor, { ...body, ...params });
    return importById(tenant, actor, params.id);
  });

  routes.on(contract.cancelImport, async ({ tenant, actor, params }) => {
    await importById(tenant, actor, params.id);
    const job = await tenant.row<{ id: string }>(
      'SELECT job_id AS id FROM imports WHERE id = $1 AND job_id IS NOT NULL',
      [params.id],
    );
    if (job) await cancelLongJob(tenant, actor, job.id);
    return importById(tenant, actor, params.id);
  });
}
