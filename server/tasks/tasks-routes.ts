import {
  explainTask as explainEndpoint,
  exportTasks,
  listTasks,
  readTask,
  readTaskBoard,
  readTaskCalendar,
} from '@shared/tasks/tasks-contract';
import { exportTable } from '../exports/export-table';
import type { Routes } from '../http/routes';
import { explainTask } from './explain-task';
import { savedViewsRoutes } from './saved-views-routes';
import { taskBoard } from './task-board';
import { taskCalendar } from './task-calendar';
import { taskChangesRoutes } from './task-changes-routes';
import { taskFileColumns } from './task-columns';
import { pageOfTasks, taskBatches, taskById } from './task-queries';

export function tasksRoutes(routes: Routes): void {
  routes.on(listTasks, ({ tenant, actor, query, now }) => pageOfTasks(tenant, actor, query, now()));

  routes.download(exportTasks, ({ tenant, actor, query: { format, ...query }, now }) =>
    exportTable(actor, {
      name: { en: 'tasks', es: 'tareas' },
      format,
      columns: taskFileColumns,
      batches: taskBatches(tenant, actor, query, now()),
      now: now(),
    }),
  );

  routes.on(readTaskCalendar, ({ tenant, actor, query, now }) =>
    taskCalendar(tenant, actor, query, now()),
  );

  routes.on(readTaskBoard, ({ tenant, actor, query, now }) =>
    taskBoard(tenant, actor, query, now()),
  );

  routes.on(readTask, ({ tenant, actor, params, now }) =>
    taskById(tenant, actor, params.id, now()),
  );

  routes.on(explainEndpoint, ({ tenant, actor, params, now }) =>
    explainTask(tenant, actor, params.id, now()),
  );

  taskChangesRoutes(routes);
  savedViewsRoutes(routes);
}
