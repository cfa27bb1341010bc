import { randomBytes } from 'node:crypto';
import type { RequestHandler } from 'express';
import helmet from 'helmet';
import type { Config } from '../config';

declare module 'http' {
  interface ServerResponse {
    /** Allows the scripts and styles of this one page. */
    cspNonce?: string;
  }
}

/** Content security with Trusted Types, and the usual headers; a new nonce for each page. */
export function securityHeaders(config: Config): RequestHandler[] {
  return [
    (_req, res, next) => {
      res.cspNonce = randomBytes(16).toString('base64');
      next();
    },
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          defaultSrc: ["'self'"],
          baseUri: ["'self'"],
          formAction: ["'self'"],
          frameAncestors: ["'none'"],
          objectSrc: ["'none'"],
          imgSrc: ["'self'", 'data:', 'blob:'],
          scriptSrc: ["'self'", (_req, res) => `'nonce-${res.cspNonce}'`],
          styleSrc: ["'self'", (_req, res) => `'nonce-${res.cspNonce}'`],
          // Style attributes carry positions and widths that are computed; they cannot load anything.
          styleSrcAttr: ["'unsafe-inline'"],
          requireTrustedTypesFor: ["'script'"],
          trustedTypes: ['angular', 'angular#bundler', 'default'],
          ...(config.secure ? { upgradeInsecureRequests: [] } : {}),
        },
      },
      strictTransportSecurity: config.secure ? { maxAge: 31_536_000 } : false,
      referrerPolicy: { policy: 'no-referrer' },
      crossOriginResourcePolicy: { policy: 'same-origin' },
    }),
  ];
}
