import { proceduresRoutes } from './procedures/procedures-routes';
import type { Routes } from './http/routes';
import { signInRoutes } from './sign-in/sign-in-routes';

/** The only file that lists every feature. */
export function registerFeatures(routes: Routes): void {
  signInRoutes(routes);
  proceduresRoutes(routes);
}
