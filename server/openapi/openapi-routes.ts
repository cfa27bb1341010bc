import { readApiDescription } from '@shared/openapi/openapi-contract';
import type { Routes } from '../http/routes';
import { type ApiDescription, describeApi } from './describe-api';

/** Registered last, so that it describes every other feature's endpoints too. */
export function openapiRoutes(routes: Routes): void {
  let description: ApiDescription | undefined;
  routes.open(readApiDescription, async () => {
    description ??= describeApi(routes.endpoints);
    return { ...description };
  });
}
