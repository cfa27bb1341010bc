import type { Routes } from '@angular/router';
import { can } from '../session/session-guard';

const routes: Routes = [
  {
    path: '',
    title: $localize`:@@tasks.board.title:Board`,
    canActivate: [can('board.read')],
    loadComponent: () => import('./task-board/task-board').then((m) => m.TaskBoard),
  },
];

export default routes;
