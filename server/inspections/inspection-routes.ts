import {
  closeTask as closeTaskEndpoint,
  readTaskHistory,
  readTaskSheet,
  reportCouldNot as reportCouldNotEndpoint,
  undoInspection as undoInspectionEndpoint,
} from '@shared/inspections/inspections-contract';
import type { Routes } from '../http/routes';
import { closeTask } from './close-task';
import { presentTaskSheet } from './present-task-sheet';
import { reportCouldNot } from './report-could-not';
import { taskHistory } from './task-history';
import { taskRow } from './task-rows';
import { undoInspection } from './undo-inspection';

export function inspectionRoutes(routes: Routes): void {
  routes.on(readTaskSheet, async ({ tenant, actor, params, now }) =>
    presentTaskSheet(tenant, actor, await taskRow(tenant, actor, 'tasks.read', params.id), now()),
  );

  routes.on(closeTaskEndpoint, async ({ tenant, actor, params, body, now }) => {
    const row = await taskRow(tenant, actor, 'tasks.read', params.id, true);
    return closeTask(tenant, actor, row, body, now());
  });

  routes.on(undoInspectionEndpoint, async ({ tenant, actor, params, now }) => {
    const row = await taskRow(tenant, actor, 'tasks.read', params.id, true);
    return { state: await undoInspection(tenant, actor, row, now()) };
  });

  routes.on(reportCouldNotEndpoint, async ({ tenant, actor, params, body }) => {
    const row = await taskRow(tenant, actor, 'tasks.read', params.id, true);
    await reportCouldNot(tenant, actor, row, body);
  });

  routes.on(readTaskHistory, async ({ tenant, actor, params }) => {
    await taskRow(tenant, actor, 'tasks.read', params.id);
    return taskHistory(tenant, params.id);
  });
}
