import { acknowledge, readShift } from '@shared/shift-checks/shift-checks-contract';
import type { Routes } from '../http/routes';
import { closeTask } from '../inspections/close-task';
import { taskRow } from '../inspections/task-rows';
import { presentShift } from './present-shift';

export function shiftCheckRoutes(routes: Routes): void {
  routes.on(readShift, async ({ tenant, actor, query, now }) =>
    presentShift(tenant, actor, query.store, now()),
  );

  routes.on(acknowledge, async ({ tenant, actor, body, now }) => {
    let findings = 0;
    for (const { taskId, inspection } of body.checks) {
      const row = await taskRow(tenant, actor, 'tasks.acknowledge', taskId, true);
      findings += (await closeTask(tenant, actor, row, inspection, now())).findings;
    }
    return { acknowledged: body.checks.length, findings };
  });
}
