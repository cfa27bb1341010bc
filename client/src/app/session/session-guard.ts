import { inject } from '@angular/core';
import type { CanActivateFn } from '@angular/router';
import { RedirectCommand, Router } from '@angular/router';
import type { Ability } from '@shared/access/ability';
import { Session } from './session';

/** Lets signed-in people through and sends the others to sign in, to come back after. */
export const signedIn: CanActivateFn = async (_route, state) => {
  const router = inject(Router);
  const session = inject(Session);
  if (await session.load()) return true;
  const returnUrl = state.url === '/' ? null : state.url;
  return new RedirectCommand(router.createUrlTree(['/sign-in'], { queryParams: { returnUrl } }));
};

/** Lets through who holds one of the abilities; the others see the page that says so. */
export function can(...abilities: readonly Ability[]): CanActivateFn {
  return async () => {
    const router = inject(Router);
    const session = inject(Session);
    await session.load();
    if (abilities.some((ability) => session.can(ability))) return true;
    return new RedirectCommand(router.parseUrl('/not-yours'), { skipLocationChange: true });
  };
}
