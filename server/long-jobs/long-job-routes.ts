import * as contract from '@shared/long-jobs/long-jobs-contract';
import type { Routes } from '../http/routes';
import { cancelLongJob } from './cancel-long-job';
import { ownLongJob } from './long-job-queries';

export function longJobRoutes(routes: Routes): void {
  routes.on(contract.readLongJob, ({ tenant, actor, params }) =>
    ownLongJob(tenant, actor, params.id),
  );

  routes.on(contract.cancelLongJob, async ({ tenant, actor, params }) => {
    await ownLongJob(tenant, actor, params.id);
    await cancelLongJob(tenant, actor, params.id);
    return ownLongJob(tenant, actor, params.id);
  });
}
