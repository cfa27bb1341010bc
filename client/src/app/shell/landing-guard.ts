import { inject } from '@angular/core';
import type { CanActivateFn } from '@angular/router';
import { Router } from '@angular/router';
import { Session } from '../session/session';
import { landingPath } from './navigation';

/** Sends `/` on to the first page of the person's role. */
export const landing: CanActivateFn = async () => {
  const router = inject(Router);
  const session = inject(Session);
  await session.load();
  const roles = session.roles().map((held) => held.role);
  return router.parseUrl(landingPath(roles, (ability) => session.can(ability)));
};
