import type { Routes } from '@angular/router';
import { can } from '../session/session-guard';
import { leaveUnsaved } from '../ui/confirm-dialog/leave-unsaved-guard';

const routes: Routes = [
  {
    path: '',
    title: $localize`:@@procedures.title:Procedures`,
    canActivate: [can('procedures.read')],
    loadComponent: () => import('./procedure-list/procedure-list').then((m) => m.ProcedureList),
  },
  {
    path: 'new',
    title: $localize`:@@procedures.new:New procedure`,
    canActivate: [can('procedures.edit')],
    canDeactivate: [leaveUnsaved],
    loadComponent: () => import('./editor/procedure-editor').then((m) => m.ProcedureEditor),
  },
  {
    path: ':id',
    canActivate: [can('procedures.read')],
    loadComponent: () => import('./procedure-page/procedure-page').then((m) => m.ProcedurePage),
  },
  {
    path: ':id/edit',
    title: $localize`:@@procedures.edit-title:Write a procedure`,
    canActivate: [can('procedures.edit')],
    canDeactivate: [leaveUnsaved],
    loadComponent: () => import('./editor/procedure-editor').then((m) => m.ProcedureEditor),
  },
];

export default routes;
