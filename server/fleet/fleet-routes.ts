import type { Routes } from '../http/routes';
import { componentRoutes } from './component-routes';
import { groupRoutes } from './group-routes';
import { storeRoutes } from './store-routes';
import { unitRoutes } from './unit-routes';

export function fleetRoutes(routes: Routes): void {
  groupRoutes(routes, 'chain');
  groupRoutes(routes, 'region');
  storeRoutes(routes);
  unitRoutes(routes);
  componentRoutes(routes);
}
