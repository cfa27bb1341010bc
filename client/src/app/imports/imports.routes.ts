import type { Routes } from '@angular/router';
import { can } from '../session/session-guard';

const importing = { canActivate: [can('fleet.import')] };

const routes: Routes = [
  {
    path: '',
    title: $localize`:@@imports.title:Imports`,
    ...importing,
    loadComponent: () => import('./import-list/import-list').then((m) => m.ImportList),
  },
  {
    path: 'new',
    title: $localize`:@@imports.new:New import`,
    ...importing,
    loadComponent: () => import('./import-upload/import-upload').then((m) => m.ImportUpload),
  },
  {
    path: ':id',
    ...importing,
    loadComponent: () => import('./import-page/import-page').then((m) => m.ImportPage),
  },
];

export default routes;
