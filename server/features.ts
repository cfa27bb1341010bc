import { fleetRoutes } from './fleet/fleet-routes';
import { findingRoutes } from './findings/finding-routes';
import { importRoutes } from './imports/import-routes';
import { inspectionRoutes } from './inspections/inspection-routes';
import { longJobRoutes } from './long-jobs/long-job-routes';
import { shiftCheckRoutes } from './shift-checks/shift-check-routes';
import { proceduresRoutes } from './procedures/procedures-routes';
import { programmesRoutes } from './programmes/programmes-routes';
import { rulesRoutes } from './programmes/rules-routes';
import { complianceRoutes } from './compliance/compliance-routes';
import { digestRoutes } from './digests/digest-routes';
import { mailRoutes } from './mail/mail-routes';
import { tasksRoutes } from './tasks/tasks-routes';
import type { Routes } from './http/routes';
import { openapiRoutes } from './openapi/openapi-routes';
import { uploadRoutes } from './uploads/upload-routes';
import { todayRoutes } from './today/today-routes';
import { peopleRoutes } from './people/people-routes';
import { signInRoutes } from './sign-in/sign-in-routes';
import { visitRoutes } from './visits/visit-routes';

/** The only file that lists every feature. */
export function registerFeatures(routes: Routes): void {
  signInRoutes(routes);
  peopleRoutes(routes);
  fleetRoutes(routes);
  importRoutes(routes);
  longJobRoutes(routes);
  proceduresRoutes(routes);
  programmesRoutes(routes);
  rulesRoutes(routes);
  inspectionRoutes(routes);
  visitRoutes(routes);
  todayRoutes(routes);
  uploadRoutes(routes);
  shiftCheckRoutes(routes);
  findingRoutes(routes);
  complianceRoutes(routes);
  digestRoutes(routes);
  mailRoutes(routes);
  tasksRoutes(routes);
  openapiRoutes(routes);
}
