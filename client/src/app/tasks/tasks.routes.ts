import type { Routes } from '@angular/router';
import { can } from '../session/session-guard';

const routes: Routes = [
  {
    path: '',
    title: $localize`:@@tasks.title:Tasks`,
    canActivate: [can('tasks.read')],
    loadComponent: () => import('./task-table/task-table').then((m) => m.TaskTable),
  },
  {
    path: 'month',
    title: $localize`:@@tasks.month.title:Month`,
    canActivate: [can('tasks.read')],
    loadComponent: () => import('./task-month/task-month').then((m) => m.TaskMonth),
  },
  {
    path: ':id',
    canActivate: [can('tasks.read')],
    loadComponent: () => import('./task-page/task-page').then((m) => m.TaskPage),
  },
];

export default routes;
