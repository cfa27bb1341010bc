import {
  assignTasks as assignEndpoint,
  deferTasks as deferEndpoint,
  excuseTasks as excuseEndpoint,
  undoTaskChange as undoEndpoint,
} from '@shared/tasks/task-changes-contract';
import type { Routes } from '../http/routes';
import { assignTasks } from './assign-tasks';
import { deferTasks } from './defer-tasks';
import { excuseTasks } from './excuse-tasks';
import { undoTaskChange } from './undo-task-change';

export function taskChangesRoutes(routes: Routes): void {
  routes.on(assignEndpoint, ({ tenant, actor, body, now }) =>
    assignTasks(tenant, actor, body, now()),
  );

  routes.on(excuseEndpoint, ({ tenant, actor, body, now }) =>
    excuseTasks(tenant, actor, body, now()),
  );

  routes.on(deferEndpoint, ({ tenant, actor, body, now }) =>
    deferTasks(tenant, actor, body, now()),
  );

  routes.on(undoEndpoint, ({ tenant, actor, params, now }) =>
    undoTaskChange(tenant, actor, params.id, now()),
  );
}
