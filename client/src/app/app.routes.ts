import type { Routes } from '@angular/router';
import { signedIn } from './session/session-guard';
import { landing } from './shell/landing-guard';
import signInRoutes from './sign-in/sign-in.routes';

/**
 * The features inside the frame: one line each, `<feature>/<feature>.routes.ts` exporting its
 * routes by default. What the navigation shows of them stands in `shell/navigation.ts`.
 */
const features: Routes = [
  { path: 'today', loadChildren: () => import('./today/today.routes') },
  { path: 'shift', loadChildren: () => import('./shift-checks/shift.routes') },
  // Before the tasks' own pages, which would take it for a task.
  { path: 'tasks/:id/sheet', loadChildren: () => import('./task-sheet/task-sheet.routes') },
  { path: 'board', loadChildren: () => import('./tasks/board.routes') },
  { path: 'tasks', loadChildren: () => import('./tasks/tasks.routes') },
  { path: 'fleet', loadChildren: () => import('./fleet/fleet.routes') },
  // Short addresses for letters, labels and links from other features.
  { path: 'stores/:id', redirectTo: 'fleet/stores/:id' },
  { path: 'units/:id', redirectTo: 'fleet/units/:id' },
  { path: 'procedures', loadChildren: () => import('./procedures/procedures.routes') },
  { path: 'programmes', loadChildren: () => import('./programmes/programmes.routes') },
  { path: 'findings', loadChildren: () => import('./findings/findings.routes') },
  { path: 'visits', loadChildren: () => import('./visits/visits.routes') },
  { path: 'people', loadChildren: () => import('./people/people.routes') },
  { path: 'compliance', loadChildren: () => import('./compliance/compliance.routes') },
  { path: 'digests', loadChildren: () => import('./digests/digests.routes') },
  { path: 'letters', loadChildren: () => import('./letters/letters.routes') },
  { path: 'account', loadChildren: () => import('./sign-in/account.routes') },
];

export const routes: Routes = [
  ...signInRoutes,
  {
    path: '',
    canActivate: [signedIn],
    loadComponent: () => import('./shell/shell').then((m) => m.Shell),
    children: [
      { path: '', pathMatch: 'full', canActivate: [landing], children: [] },
      ...features,
      {
        path: 'not-yours',
        title: $localize`:@@shell.not-yours:Not yours to see`,
        loadComponent: () => import('./shell/not-yours').then((m) => m.NotYours),
      },
      {
        path: '**',
        title: $localize`:@@shell.not-found:Nothing is here`,
        loadComponent: () => import('./shell/not-found').then((m) => m.NotFound),
      },
    ],
  },
];
