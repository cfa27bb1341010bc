import type { Routes } from '@angular/router';
import { can } from '../session/session-guard';

const routes: Routes = [
  {
    path: '',
    title: $localize`:@@letters.title:Letters`,
    canActivate: [can('mail.read')],
    loadComponent: () => import('./letter-list/letter-list').then((m) => m.LetterList),
  },
  {
    path: ':id',
    title: $localize`:@@letters.one:Letter`,
    canActivate: [can('mail.read')],
    loadComponent: () => import('./letter-page/letter-page').then((m) => m.LetterPage),
  },
];

export default routes;
