import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import express, { type Request, Router } from 'express';

const locales = ['en', 'es'] as const;
type Locale = (typeof locales)[number];
/** What the builder named after its content never changes under that name. */
const hashed = /-[A-Z0-9]{8}\.[a-z0-9]+$/;
const root = join(process.cwd(), 'dist/client/browser');

/**
 * The built application, once per language under `/en/` and `/es/`. A page asked for in another
 * language than the reader's own is sent on to theirs, so that a shared link opens for everybody.
 */
export function serveClient(): Router {
  const router = Router();
  const pages = new Map<Locale, string>();
  for (const locale of locales) {
    const index = join(root, locale, 'index.html');
    if (existsSync(index)) pages.set(locale, readFileSync(index, 'utf8'));
    router.use(
      `/${locale}`,
      express.static(join(root, locale), {
        index: false,
        setHeaders: (res, path) => {
          const forever = hashed.test(path);
          res.set('Cache-Control', forever ? 'public, max-age=31536000, immutable' : 'no-cache');
        },
      }),
    );
  }
  router.get('/{*path}', (req, res, next) => {
    if (req.path.startsWith('/api/') || /\.[a-z0-9]+$/.test(req.path)) return next();
    const asked = locales.find((it) => req.path === `/${it}` || req.path.startsWith(`/${it}/`));
    const wanted = chosenLocale(req) ?? asked ?? acceptedLocale(req);
    if (asked !== wanted) {
      const rest = asked ? req.originalUrl.slice(asked.length + 1) : req.originalUrl;
      res.redirect(302, `/${wanted}/${rest.replace(/^[/\\]+/, '')}`);
      return;
    }
    const page = pages.get(wanted);
    if (!page) return next();
    res.set('Cache-Control', 'no-store').type('html');
    res.send(page.replaceAll('__CSP_NONCE__', res.cspNonce ?? ''));
  });
  return router;
}

function chosenLocale(req: Request): Locale | undefined {
  const cookie = /(?:^|;\s*)lang=(en|es)(?:;|$)/.exec(req.headers.cookie ?? '');
  return cookie?.[1] as Locale | undefined;
}

function acceptedLocale(req: Request): Locale {
  return (req.acceptsLanguages(...locales) || 'en') as Locale;
}
