import type { Routes } from '@angular/router';
import { leaveUnsaved } from '../procedures/editor/leave-unsaved-guard';
import { can } from '../session/session-guard';

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
