import { listTasks, readTask, readTaskBoard, readTaskCalendar } from '@shared/tasks/tasks-contract';
import type { Routes } from '../http/routes';
import { savedViewsRoutes } from './saved-views-routes';
import { taskBoard } from './task-board';
import { taskCalendar } from './task-calendar';
import { taskChangesRoutes } from './task-changes-routes';
import { pageOfTasks, taskById } from './task-queries';

export function tasksRoutes(routes: Routes): void {
  routes.on(listTasks, ({ tenant, actor, query, now }) => pageOfTasks(tenant, actor, query, now()));

  routes.on(readTaskCalendar, ({ tenant, actor, query, now }) =>
    taskCalendar(tenant, actor, query, now()),
  );

  routes.on(readTaskBoard, ({ tenant, actor, query, now }) =>
    taskBoard(tenant, actor, query, now()),
  );

  routes.on(readTask, ({ tenant, actor, params, now }) =>
    taskById(tenant, actor, params.id, now()),
  );

  taskChangesRoutes(routes);
  savedViewsRoutes(routes);
}
