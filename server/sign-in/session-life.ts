import type { Request } from 'express';
import type { SignedInUser } from '../http/signed-in-user';

/** Signs in under a new session id, as passport does it, so that an old cookie is worth nothing. */
export function startSession(req: Request, user: SignedInUser): Promise<void> {
  return new Promise((resolve, reject) => {
    req.logIn(user, (error: unknown) => (error ? reject(error) : resolve()));
  });
}

/** Ends the session on the server; the cookie that may be left in a browser opens nothing. */
export function endSession(req: Request): Promise<void> {
  return new Promise((resolve, reject) => {
    req.session.destroy((error: unknown) => (error ? reject(error) : resolve()));
  });
}
