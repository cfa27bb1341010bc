import type { CanMatchFn, Routes } from '@angular/router';
import { inject } from '@angular/core';
import { can } from '../session/session-guard';
import { Session } from '../session/session';

/** Who plans begins at the desk; the others at what comes to their stores. */
const plans: CanMatchFn = async () => {
  const session = inject(Session);
  await session.load();
  return session.can('visits.plan');
};

const coming = () => import('./coming-page/coming-page').then((m) => m.ComingPage);

const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: $localize`:@@visits.plan:Plan visits`,
    canMatch: [plans],
    canActivate: [can('visits.plan')],
    loadComponent: () => import('./plan-page/plan-page').then((m) => m.PlanPage),
  },
  { path: '', pathMatch: 'full', redirectTo: 'coming' },
  {
    path: 'coming',
    title: $localize`:@@visits.coming:Who comes when`,
    canActivate: [can('visits.read')],
    loadComponent: coming,
  },
];

export default routes;
