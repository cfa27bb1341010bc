import type { Routes } from '@angular/router';
import { can } from '../session/session-guard';
import { leaveUnsaved } from '../ui/confirm-dialog/leave-unsaved-guard';

const routes: Routes = [
  {
    path: '',
    title: $localize`:@@findings.title:Findings`,
    canActivate: [can('findings.read')],
    loadComponent: () => import('./finding-list/finding-list').then((m) => m.FindingList),
  },
  {
    path: 'new',
    title: $localize`:@@findings.report:Report a finding`,
    canActivate: [can('findings.report')],
    canDeactivate: [leaveUnsaved],
    loadComponent: () => import('./report-form/report-form').then((m) => m.ReportForm),
  },
  {
    path: ':id',
    canActivate: [can('findings.read')],
    loadComponent: () => import('./finding-page/finding-page').then((m) => m.FindingPage),
  },
];

export default routes;
