import { inject } from '@angular/core';
import type { CanActivateFn } from '@angular/router';
import { Session } from '../session/session';

/**
 * Reads the session anew before a page for strangers: the answer brings the anti-forgery token that
 * the page's own writes need, and the one at hand may belong to a session that has just ended.
 */
export const freshToken: CanActivateFn = async () => {
  // Without an answer the page still shows; what it sends then says what is wrong.
  await inject(Session)
    .refresh()
    .catch(() => null);
  return true;
};
