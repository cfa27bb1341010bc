import { listDigests, readDigest } from '@shared/digests/digests-contract';
import type { Routes } from '../http/routes';
import { digestById, digestRows } from './digest-queries';

export function digestRoutes(routes: Routes): void {
  routes.on(listDigests, ({ tenant, actor, query }) => digestRows(tenant, actor, query));

  routes.on(readDigest, ({ tenant, actor, params }) => digestById(tenant, actor, params.id));
}
