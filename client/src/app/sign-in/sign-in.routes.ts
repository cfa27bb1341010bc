import type { Routes } from '@angular/router';
import { freshToken } from './fresh-token-guard';

/** The pages for people who are not signed in. */
const routes: Routes = [
  {
    path: '',
    // The bare address belongs to the frame, which sends strangers here.
    canMatch: [(_route, segments) => segments.length > 0],
    canActivateChild: [freshToken],
    loadComponent: () => import('./entrance/entrance').then((m) => m.Entrance),
    children: [
      {
        path: 'sign-in',
        title: $localize`:@@sign-in.title:Sign in`,
        loadComponent: () => import('./sign-in-page/sign-in-page').then((m) => m.SignInPage),
      },
      {
        path: 'forgot-password',
        title: $localize`:@@sign-in.forgot-title:Forgotten password`,
        loadComponent: () =>
          import('./forgot-password/forgot-password').then((m) => m.ForgotPassword),
      },
      {
        path: 'reset-password/:token',
        title: $localize`:@@sign-in.reset-title:New password`,
        loadComponent: () => import('./reset-password/reset-password').then((m) => m.ResetPassword),
      },
      {
        path: 'invitation/:token',
        title: $localize`:@@sign-in.invitation-title:Invitation`,
        loadComponent: () =>
          import('./accept-invitation/accept-invitation').then((m) => m.AcceptInvitation),
      },
    ],
  },
];

export default routes;
