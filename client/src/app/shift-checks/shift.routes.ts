import type { Routes } from '@angular/router';
import { can } from '../session/session-guard';

const routes: Routes = [
  {
    path: '',
    title: $localize`:@@shift-checks.title:Shift`,
    canActivate: [can('shift.read')],
    loadComponent: () => import('./shift-page/shift-page').then((m) => m.ShiftPage),
  },
];

export default routes;
