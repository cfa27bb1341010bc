import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import { listPage, messagePage, missingPage } from './inbox-page';
import { inboxStyle } from './inbox-style';
import type { MailStore } from './mail-store';
import type { Markup } from './markup';

const viewerPolicy =
  "default-src 'none'; style-src 'self'; img-src data:; frame-src 'self'; form-action 'self'; base-uri 'none'; frame-ancestors 'none'";
// Mail styles itself inline, but may neither run scripts nor fetch anything. A frame given by
// `srcdoc` would inherit the viewer's policy, which forbids inline styles; so it has an address.
const mailPolicy =
  "default-src 'none'; style-src 'unsafe-inline'; img-src data:; frame-ancestors 'self'; sandbox allow-popups allow-popups-to-escape-sandbox";

/**
 * The viewer of the local inbox. Pages for people; for tests `GET /api/messages?to=&q=`,
 * `GET /api/messages/:id` and `DELETE /api/messages`.
 */
export function inboxServer(store: MailStore): Server {
  return createServer((req, res) => {
    try {
      answer(store, req, new Reply(res));
    } catch (error) {
      res.writeHead(500, { 'content-type': 'text/plain' }).end(`${String(error)}\n`);
    }
  });
}

class Reply {
  constructor(private readonly res: ServerResponse) {}

  send(status: number, type: string, body: string | Buffer, policy = viewerPolicy): void {
    this.res.writeHead(status, {
      'content-type': `${type}; charset=utf-8`,
      'cache-control': 'no-store',
      'content-security-policy': policy,
      'x-content-type-options': 'nosniff',
      'referrer-policy': 'no-referrer',
    });
    this.res.end(body);
  }

  page = (markup: Markup, status = 200) => this.send(status, 'text/html', markup.text);
  json = (value: unknown, status = 200) =>
    this.send(status, 'application/json', JSON.stringify(value));
  missing = () => this.page(missingPage(), 404);
}

function answer(store: MailStore, req: IncomingMessage, reply: Reply): void {
  // Another name for this address would let a page elsewhere read the mail (DNS rebinding).
  if (!/^(localhost|127\.0\.0\.1|\[::1\])(:\d+)?$/.test(req.headers.host ?? '')) {
    return reply.send(421, 'text/plain', 'Open this page as localhost.\n');
  }
  const url = new URL(req.url ?? '/', 'http://localhost');
  if (url.pathname.startsWith('/api/')) return answerProgram(store, req, url, reply);
  if (req.method !== 'GET' && req.method !== 'HEAD') {
    return reply.send(405, 'text/plain', 'Only GET.\n');
  }
  if (url.pathname === '/inbox.css') return reply.send(200, 'text/css', inboxStyle);
  if (url.pathname === '/') {
    const search = url.searchParams.get('q')?.trim() ?? '';
    return reply.page(listPage(store.list({ search }), search));
  }
  const [, id = '', part] =
    /^\/messages\/([\w-]+)(?:\/(formatted|source))?$/.exec(url.pathname) ?? [];
  const message = store.message(id);
  if (!message) return reply.missing();
  if (part === 'source') return reply.send(200, 'text/plain', store.source(id) ?? '');
  if (part === 'formatted') {
    return reply.send(200, 'text/html', linksOutside(message.html), mailPolicy);
  }
  return reply.page(messagePage(message));
}

/** Links open outside the frame. Before a doctype the element would switch on quirks mode. */
function linksOutside(html: string): string {
  const base = '<base target="_blank">';
  return /<head[^>]*>/i.test(html)
    ? html.replace(/<head[^>]*>/i, (head) => head + base)
    : base + html;
}

function answerProgram(store: MailStore, req: IncomingMessage, url: URL, reply: Reply): void {
  const id = /^\/api\/messages\/([\w-]+)$/.exec(url.pathname)?.[1];
  const known = url.pathname === '/api/messages' || id !== undefined;
  if (!known) return reply.json({ error: 'There is no such address.' }, 404);
  if (req.method === 'DELETE' && id === undefined && req.headers.origin === undefined) {
    store.clear();
    return reply.json({ messages: [] });
  }
  if (req.method !== 'GET') return reply.json({ error: 'Only GET, and DELETE of the list.' }, 405);
  if (id === undefined) {
    const to = url.searchParams.get('to') ?? undefined;
    const search = url.searchParams.get('q') ?? undefined;
    return reply.json({ messages: store.list({ to, search }) });
  }
  const message = store.message(id);
  return message ? reply.json(message) : reply.json({ error: 'There is no such message.' }, 404);
}
