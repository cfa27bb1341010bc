import type { Routes } from '@angular/router';
import { can } from '../session/session-guard';

const routes: Routes = [
  {
    path: '',
    title: $localize`:@@compliance.title:Compliance`,
    canActivate: [can('compliance.read')],
    loadComponent: () =>
      import('./compliance-table/compliance-table').then((m) => m.ComplianceTable),
  },
  {
    path: 'picture',
    title: $localize`:@@compliance.picture.title:Compliance, stores by month`,
    canActivate: [can('compliance.read')],
    loadComponent: () =>
      import('./compliance-picture/compliance-picture').then((m) => m.CompliancePicture),
  },
];

export default routes;
