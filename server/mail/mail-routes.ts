import { listLetters, readLetter, retryLetters, showLetter } from '@shared/mail/mail-contract';
import { authoriseEverywhere } from '../access/authorise';
import type { Routes } from '../http/routes';
import { letterById, letterHtml, letterRows } from './letter-queries';
import { retryLetters as retry } from './retry-letters';

/** The letter's own styles and nothing else: no script, no picture, no address, no form. */
const letterPolicy =
  "default-src 'none'; style-src 'unsafe-inline'; frame-ancestors 'self'; base-uri 'none'; form-action 'none'; sandbox";

export function mailRoutes(routes: Routes): void {
  routes.on(listLetters, ({ tenant, actor, query }) => {
    authoriseEverywhere(actor, 'mail.read');
    return letterRows(tenant, query);
  });

  routes.on(readLetter, ({ tenant, actor, params }) => {
    authoriseEverywhere(actor, 'mail.read');
    return letterById(tenant, params.id);
  });

  routes.download(showLetter, async ({ tenant, actor, params }) => {
    authoriseEverywhere(actor, 'mail.read');
    const html = await letterHtml(tenant, params.id);
    return (res) => {
      res.set('Content-Security-Policy', letterPolicy).type('html').send(html);
    };
  });

  routes.on(retryLetters, async ({ tenant, actor, body }) => ({
    queued: await retry(tenant, actor, body.ids),
  }));
}
