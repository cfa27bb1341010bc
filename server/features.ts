import { findingRoutes } from './findings/finding-routes';
import { inspectionRoutes } from './inspections/inspection-routes';
import { shiftCheckRoutes } from './shift-checks/shift-check-routes';
import { proceduresRoutes } from './procedures/procedures-routes';
import type { Routes } from './http/routes';
import { signInRoutes } from './sign-in/sign-in-routes';

/** The only file that lists every feature. */
export function registerFeatures(routes: Routes): void {
  signInRoutes(routes);
  proceduresRoutes(routes);
  inspectionRoutes(routes);
  shiftCheckRoutes(routes);
  findingRoutes(routes);
}
