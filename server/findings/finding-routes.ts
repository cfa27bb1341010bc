import {
  exportFindings,
  listFindings,
  readFinding,
  reopenFinding as reopenEndpoint,
  reportFinding as reportEndpoint,
  settleFinding as settleEndpoint,
} from '@shared/findings/findings-contract';
import { exportTable } from '../exports/export-table';
import { pageBatches } from '../exports/read-batches';
import type { Routes } from '../http/routes';
import { findingFileColumns } from './finding-columns';
import { findingById, listFindingRows } from './finding-queries';
import { reportFinding } from './report-finding';
import { reopenFinding, settleFinding } from './settle-finding';

export function findingRoutes(routes: Routes): void {
  routes.on(listFindings, ({ tenant, actor, query }) => listFindingRows(tenant, actor, query));

  routes.download(exportFindings, ({ tenant, actor, query: { format, ...filters }, now }) =>
    exportTable(actor, {
      name: { en: 'findings', es: 'hallazgos' },
      format,
      columns: findingFileColumns,
      batches: pageBatches((page, pageSize) =>
        listFindingRows(tenant, actor, { ...filters, page, pageSize }),
      ),
      now: now(),
    }),
  );

  routes.on(readFinding, ({ tenant, actor, params }) => findingById(tenant, actor, params.id));

  routes.on(reportEndpoint, async ({ tenant, actor, body, now }) => {
    await reportFinding(tenant, actor, body, now());
    return findingById(tenant, actor, body.id);
  });

  routes.on(settleEndpoint, async ({ tenant, actor, params, body, now }) => {
    await findingById(tenant, actor, params.id);
    await settleFinding(tenant, actor, params.id, body, now());
    return findingById(tenant, actor, params.id);
  });

  routes.on(reopenEndpoint, async ({ tenant, actor, params, body, now }) => {
    await findingById(tenant, actor, params.id);
    await reopenFinding(tenant, actor, params.id, body.version, now());
    return findingById(tenant, actor, params.id);
  });
}
