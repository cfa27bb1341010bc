import {
  readCompliance,
  readComplianceFilters,
  readCompliancePicture,
} from '@shared/compliance/compliance-contract';
import type { Routes } from '../http/routes';
import { complianceFilters } from './compliance-filters';
import { compliancePicture } from './compliance-picture';
import { complianceTable } from './compliance-table';

export function complianceRoutes(routes: Routes): void {
  routes.on(readCompliance, ({ tenant, actor, query }) => complianceTable(tenant, actor, query));

  routes.on(readCompliancePicture, ({ tenant, actor, query }) =>
    compliancePicture(tenant, actor, query),
  );

  routes.on(readComplianceFilters, ({ tenant, actor, query }) =>
    complianceFilters(tenant, actor, query.store),
  );
}
