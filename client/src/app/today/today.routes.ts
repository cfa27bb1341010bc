import type { Routes } from '@angular/router';
import { can } from '../session/session-guard';

const routes: Routes = [
  {
    path: '',
    title: $localize`:@@today.title:Today`,
    canActivate: [can('today.read')],
    loadComponent: () => import('./today-page/today-page').then((m) => m.TodayPage),
  },
];

export default routes;
