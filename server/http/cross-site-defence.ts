import { doubleCsrf } from 'csrf-csrf';
import type { Request, RequestHandler, Response } from 'express';
import { Problem } from '@shared/problem';
import type { Config } from '../config';

const foreign = () =>
  new Problem(403, 'cross-site', 'This request did not come from our own pages.');

function protection(config: Config) {
  return doubleCsrf({
    getSecret: () => config.SESSION_SECRET,
    getSessionIdentifier: (req) => (req.user ? req.sessionID : 'nobody'),
    cookieName: 'XSRF-TOKEN',
    // The page's own script reads it and sends it back as a header; other sites can do neither.
    cookieOptions: { httpOnly: false, sameSite: 'lax', secure: config.secure, path: '/' },
    getCsrfTokenFromRequest: (req) => req.get('X-XSRF-TOKEN'),
  });
}

/**
 * Refuses writes that another site's page made in the person's name: by the browser's own word on
 * where the request comes from, and by a token bound to the session.
 */
export function crossSiteDefence(config: Config): RequestHandler[] {
  const { doubleCsrfProtection } = protection(config);
  const allowedOrigin = new URL(config.BASE_URL).origin;
  return [
    (req, _res, next) => {
      const safe = req.method === 'GET' || req.method === 'HEAD';
      const site = req.get('Sec-Fetch-Site');
      const origin = req.get('Origin');
      const own = site === undefined || site === 'same-origin' || site === 'none';
      if (!safe && (!own || (origin !== undefined && origin !== allowedOrigin))) throw foreign();
      next();
    },
    (req, res, next) =>
      doubleCsrfProtection(req, res, (error?: unknown) => next(error ? foreign() : undefined)),
    // Every page begins by asking who is signed in: there it gets its token.
    (req, res, next) => {
      if (req.method === 'GET' && req.path === '/session') issueToken(config, req, res);
      next();
    },
  ];
}

/** Gives the page a token for its session; asked for whenever the session is read or changes. */
export function issueToken(config: Config, req: Request, res: Response): void {
  protection(config).generateCsrfToken(req, res, { overwrite: true });
}
