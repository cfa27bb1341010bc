import type { Routes } from '@angular/router';
import { can } from '../session/session-guard';

const routes: Routes = [
  {
    path: '',
    title: $localize`:@@task-sheet.title:Task`,
    canActivate: [can('tasks.read')],
    loadComponent: () => import('./sheet-page/sheet-page').then((m) => m.SheetPage),
  },
];

export default routes;
