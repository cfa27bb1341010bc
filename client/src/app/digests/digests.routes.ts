import type { Routes } from '@angular/router';
import { can } from '../session/session-guard';

const routes: Routes = [
  {
    path: '',
    title: $localize`:@@digests.title:Digests`,
    canActivate: [can('digests.read')],
    loadComponent: () => import('./digest-list/digest-list').then((m) => m.DigestList),
  },
  {
    path: ':id',
    canActivate: [can('digests.read')],
    loadComponent: () => import('./digest-page/digest-page').then((m) => m.DigestPage),
  },
];

export default routes;
