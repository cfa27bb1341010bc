import type { Routes } from '@angular/router';
import { can } from '../session/session-guard';
import { leaveUnsaved } from '../ui/confirm-dialog/leave-unsaved-guard';

const routes: Routes = [
  {
    path: '',
    title: $localize`:@@people.title:People`,
    canActivate: [can('people.read')],
    loadComponent: () => import('./person-list/person-list').then((m) => m.PersonList),
  },
  {
    path: 'new',
    title: $localize`:@@people.invite:Invite somebody`,
    canActivate: [can('people.edit')],
    canDeactivate: [leaveUnsaved],
    loadComponent: () => import('./invite-form/invite-form').then((m) => m.InviteForm),
  },
  {
    path: ':id',
    canActivate: [can('people.read')],
    canDeactivate: [leaveUnsaved],
    loadComponent: () => import('./person-page/person-page').then((m) => m.PersonPage),
  },
];

export default routes;
