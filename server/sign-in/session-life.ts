import type { Request } from 'express';
import type { SignedInUser } from '../http/signed-in-user';

/** Signs in under a new session id, as passport does it, so that an old cookie is worth nothing. */
export function startSession(req: Request, user: SignedInUser): Promise<void> {
  return new Promise((resolve, reject) => {
    req.logIn(user, (error: unknown) => {
      if (error) {
        reject(error as Error);
        return;
      }
      req.session.startedAt = new Date().toISOString();
      req.session.userAgent = req.get('User-Agent')?.slice(0, 300) ?? '';
      resolve();
    });
  });
}

/** Ends the session on the server; the cookie that may be left in a browser opens nothing. */
export function endSession(req: Request): Promise<void> {
  return new Promise((resolve, reject) => {
    req.session.destroy((error: unknown) => (error ? reject(error as Error) : resolve()));
  });
}
