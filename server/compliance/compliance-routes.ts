import {
  exportCompliance,
  readCompliance,
  readComplianceFilters,
  readCompliancePicture,
} from '@shared/compliance/compliance-contract';
import { exportTable } from '../exports/export-table';
import { pageBatches } from '../exports/read-batches';
import type { Routes } from '../http/routes';
import { complianceColumns } from './compliance-columns';
import { complianceFilters } from './compliance-filters';
import { compliancePicture } from './compliance-picture';
import { complianceTable } from './compliance-table';

export function complianceRoutes(routes: Routes): void {
  routes.on(readCompliance, ({ tenant, actor, query }) => complianceTable(tenant, actor, query));

  routes.on(readCompliancePicture, ({ tenant, actor, query }) =>
    compliancePicture(tenant, actor, query),
  );

  routes.download(exportCompliance, ({ tenant, actor, query: { format, ...query }, now }) =>
    exportTable(actor, {
      name: { en: 'compliance', es: 'cumplimiento' },
      format,
      columns: complianceColumns(query.by),
      batches: pageBatches((page, pageSize) =>
        complianceTable(tenant, actor, { ...query, page, pageSize }),
      ),
      now: now(),
    }),
  );

  routes.on(readComplianceFilters, ({ tenant, actor, query }) =>
    complianceFilters(tenant, actor, query.store),
  );
}
