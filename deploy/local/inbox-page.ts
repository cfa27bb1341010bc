import type { Message, MessageSummary } from './mail-store';
import { markup, type Markup } from './markup';

const page = (title: string, content: Markup) => markup`<!doctype html>
<html lang="en">
  <head>
    <meta charset="utf-8" />
    <meta name="viewport" content="width=device-width, initial-scale=1" />
    <title>${title} – Vatwright mail</title>
    <link rel="stylesheet" href="/inbox.css" />
    <link rel="icon" href="data:," />
  </head>
  <body>
    <header>
      <a href="/">Vatwright mail</a>
      <p>Every message that this installation sends ends here. Nothing leaves the machine.</p>
    </header>
    <main>${content}</main>
  </body>
</html>`;

const when = new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeStyle: 'long' });
const time = (instant: string) =>
  markup`<time datetime="${instant}">${when.format(new Date(instant))}</time>`;
const subjectOf = ({ subject }: MessageSummary) => subject || '(no subject)';

/** The list, newest first. */
export function listPage(messages: readonly MessageSummary[], search: string): Markup {
  const rows = messages.map(
    (it) => markup`<tr>
      <td><a href="/messages/${it.id}">${subjectOf(it)}</a></td>
      <td>${it.to.join(', ')}</td>
      <td>${time(it.receivedAt)}</td>
    </tr>`,
  );
  const table = markup`<table>
    <caption>${messages.length === 1 ? '1 message' : `${messages.length} messages`}</caption>
    <thead>
      <tr><th scope="col">Subject</th><th scope="col">To</th><th scope="col">Time</th></tr>
    </thead>
    <tbody>${rows}</tbody>
  </table>`;
  const none = search
    ? markup`<p>No message has “${search}” in its addresses or subject. <a href="/">Show all</a></p>`
    : markup`<p>No message yet. Ask for a new password on the sign-in page, and it will come here.</p>`;
  return page(
    'Messages',
    markup`<h1>Messages</h1>
    <form role="search">
      <label for="q">Address or subject</label>
      <input id="q" name="q" type="search" value="${search}" />
      <button>Search</button>
    </form>
    ${messages.length > 0 ? table : none}`,
  );
}

/** One message: its HTML part in a frame that can run and fetch nothing, its text, its headers. */
export function messagePage(message: Message): Markup {
  const links = [...new Set(message.text.match(/https?:\/\/[^\s<>"')\]]+/g) ?? [])];
  return page(
    subjectOf(message),
    markup`<h1>${subjectOf(message)}</h1>
    <dl>
      <dt>To</dt><dd>${message.to.join(', ')}</dd>
      <dt>From</dt><dd>${message.from}</dd>
      <dt>Time</dt><dd>${time(message.receivedAt)}</dd>
    </dl>
    ${message.html ? formatted(message) : markup``}
    ${links.length > 0 ? linkList(links) : markup``}
    <section aria-labelledby="text">
      <h2 id="text">Text part</h2>
      ${message.text ? markup`<pre>${message.text}</pre>` : markup`<p>This message has none.</p>`}
    </section>
    <details>
      <summary>Headers</summary>
      <dl>${message.headers.map(({ name, value }) => markup`<dt>${name}</dt><dd>${value}</dd>`)}</dl>
    </details>
    <p><a href="/messages/${message.id}/source">Source</a> · <a href="/">All messages</a></p>`,
  );
}

const formatted = ({ id }: Message) => markup`<section aria-labelledby="formatted">
  <h2 id="formatted">Formatted part</h2>
  <iframe
    title="Formatted part"
    src="/messages/${id}/formatted"
    sandbox="allow-popups allow-popups-to-escape-sandbox"
  ></iframe>
</section>`;

const linkList = (links: readonly string[]) => markup`<section aria-labelledby="links">
  <h2 id="links">Links</h2>
  <ul>${links.map((link) => markup`<li><a href="${link}">${link}</a></li>`)}</ul>
</section>`;

export const missingPage = () =>
  page(
    'Not here',
    markup`<h1>Not here</h1><p>There is no such message; only the newest 1,000 are kept. <a href="/">All messages</a></p>`,
  );
