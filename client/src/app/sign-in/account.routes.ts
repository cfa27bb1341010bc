import type { Routes } from '@angular/router';

const routes: Routes = [
  {
    path: '',
    title: $localize`:@@sign-in.account-title:Your account`,
    loadComponent: () => import('./account/account-page').then((m) => m.AccountPage),
  },
];

export default routes;
