import { once } from 'node:events';
import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createTransport } from 'nodemailer';
import supertest from 'supertest';
import { inboxServer } from './inbox-server';
import { MailStore } from './mail-store';
import { smtpInbox } from './smtp-inbox';

describe('the local inbox', () => {
  let folder: string;
  let store: MailStore;
  let smtp: ReturnType<typeof smtpInbox>;
  const browse = () => supertest(inboxServer(store));

  beforeEach(async () => {
    folder = mkdtempSync(join(tmpdir(), 'inbox-'));
    store = new MailStore(folder);
    smtp = smtpInbox(store);
    smtp.listen(0, '127.0.0.1');
    await once(smtp.server, 'listening');
  });

  afterEach(async () => {
    await new Promise<void>((done) => smtp.close(done));
    rmSync(folder, { recursive: true });
  });

  async function send(to: string, subject = 'Contraseña <b>', html?: string): Promise<void> {
    const { port } = smtp.server.address() as AddressInfo;
    const transport = createTransport({ host: '127.0.0.1', port });
    const text = 'Open https://maintenance.example/en/reset?t=1&u=2 today.';
    await transport.sendMail({ from: 'no-reply@vatwright.example', to, subject, text, html });
    transport.close();
  }

  it('lists what came in, newest first, for one recipient or by words', async () => {
    await send('ana@one.example');
    await send('ben@two.example', 'Tasks due soon');
    const list = async (query: string) => {
      const { body } = await browse().get(`/api/messages${query}`).expect(200);
      return (body.messages as { to: string[] }[]).map(({ to }) => to[0]);
    };
    expect(await list('')).toEqual(['ben@two.example', 'ana@one.example']);
    expect(await list('?to=ANA@one.example')).toEqual(['ana@one.example']);
    expect(await list('?q=due+SOON')).toEqual(['ben@two.example']);
    expect(await list('?to=ana')).toEqual([]);
  });

  it('still has everything after a restart, and drops what was cut off', async () => {
    await send('ana@one.example');
    const again = new MailStore(folder);
    expect(again.list()).toEqual(store.list());
    const id = store.list()[0]?.id ?? '';
    expect(again.source(id)?.toString()).toContain('To: ana@one.example');
    again.clear();
    expect(readdirSync(folder)).toEqual([]);
  });

  it('shows texts as texts', async () => {
    await send('ana@one.example');
    const id = store.list()[0]?.id;
    const page = await browse().get(`/messages/${id}`).expect(200);
    expect(page.text).toContain('<h1>Contraseña &lt;b&gt;</h1>');
    expect(page.text).toContain('href="https://maintenance.example/en/reset?t=1&amp;u=2"');
    expect((await browse().get('/?q=%3Cscript%3E')).text).not.toContain('<script>');
  });

  it('lets the formatted part neither run nor fetch anything', async () => {
    await send('ana@one.example', 'x', '<html><head></head><body><script>1</script></body></html>');
    const id = store.list()[0]?.id;
    const part = await browse().get(`/messages/${id}/formatted`).expect(200);
    expect(part.text).toContain('<head><base target="_blank">');
    const policy = part.headers['content-security-policy'];
    expect(policy).toContain("default-src 'none'");
    expect(policy).toContain('img-src data:;');
    expect(policy).toMatch(/sandbox(?!.*allow-scripts)/);
    expect((await browse().get(`/messages/${id}`)).text).not.toContain('<script>');
  });

  it('answers to this machine only, and hands out no other files', async () => {
    await browse().get('/').set('Host', 'rebound.example').expect(421);
    await browse().get('/messages/..%2f..%2fetc%2fpasswd/source').expect(404);
    await browse().delete('/api/messages').set('Origin', 'https://evil.example').expect(405);
    await browse().post('/').expect(405);
  });
});
