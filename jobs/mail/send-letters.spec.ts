import { fork } from 'node:child_process';
import { insert, makeOrganisation, makePerson } from '@test/factories/organisation-factory';
import { type SmtpSink, smtpSink } from '@test/support/smtp-sink';
import { type TestApp, testApp } from '@test/support/test-app';
import { sendLetters } from './send-letters';

describe('sending letters', () => {
  let app: TestApp;
  let sink: SmtpSink;
  let organisationId: string;
  let person: { id: string; email: string };
  let letters = 0;

  beforeAll(async () => {
    app = await testApp();
    organisationId = await makeOrganisation(app.db);
    person = await makePerson(app.db, organisationId, 'technician');
  });
  afterAll(() => app.close());

  beforeEach(async () => {
    await app.db.owner.query('DELETE FROM letters');
    sink = await smtpSink();
  });
  afterEach(() => sink.close());

  const makeLetter = (row: object = {}) =>
    insert(app.db, 'letters', {
      organisation_id: organisationId,
      person_id: person.id,
      kind: 'reminders',
      dedupe_key: `letter ${(letters += 1)}`,
      to_address: person.email,
      locale: 'es',
      subject: 'Vatwright: 2 vencen pronto',
      html: '<p>Hola</p>',
      plain: 'Hola',
      ...row,
    });
  const makeLetters = (count: number) =>
    Promise.all(Array.from({ length: count }, () => makeLetter()));
  const services = (url = sink.url) => ({
    ...app.services,
    config: { ...app.services.config, SMTP_URL: url, BASE_URL: 'https://vatwright.example' },
  });
  const state = async (id: string) => {
    const [rows] = await app.db.owner.query(
      `SELECT state, attempts, last_error, leased_until, sent_at, html,
         round(extract(epoch FROM next_attempt_at - now()))::int AS wait
       FROM letters WHERE id = $1`,
      { bind: [id] },
    );
    return rows[0] as {
      state: string;
      attempts: number;
      last_error: string | null;
      leased_until: Date | null;
      sent_at: Date | null;
      html: string;
      wait: number;
    };
  };
  const dueNow = () =>
    app.db.owner.query('UPDATE letters SET next_attempt_at = now(), leased_until = NULL');

  it('sends both parts, says that a machine wrote it, and names the letter', async () => {
    const id = await makeLetter({ created_at: '2026-06-10T12:00:00Z' });
    expect(await sendLetters(services())).toEqual({ sent: 1, refused: 0, later: 0 });
    const [mail] = sink.mails;
    expect(mail).toMatchObject({
      messageId: `<${id}@vatwright.example>`,
      subject: 'Vatwright: 2 vencen pronto',
      date: new Date('2026-06-10T12:00:00Z'),
    });
    expect(mail?.text?.trim()).toBe('Hola');
    expect(mail?.html).toContain('<p>Hola</p>');
    // RFC 3834, 5: a scheduled notice declares itself auto-generated.
    expect(mail?.headers.get('auto-submitted')).toBe('auto-generated');
    expect(mail?.headers.get('content-language')).toBe('es');
    expect(await state(id)).toMatchObject({ state: 'sent', attempts: 1, last_error: null });
  });

  it('sends each letter once, run twice and from three workers at once', async () => {
    const ids = await makeLetters(40);
    const runs = await Promise.all([1, 2, 3].map(() => sendLetters(services())));
    expect(runs.reduce((sum, { sent }) => sum + sent, 0)).toBe(40);
    expect((await sendLetters(services())).sent).toBe(0);
    expect(new Set(sink.mails.map(({ messageId }) => messageId)).size).toBe(40);
    expect(sink.mails).toHaveLength(ids.length);
  });

  it('forgets the sign-in link of a letter that has arrived', async () => {
    const link = `https://vatwright.example/invitation/${'aB3-'.repeat(11)}`;
    const id = await makeLetter({
      kind: 'invitation',
      html: `<a href="${link}">x</a>`,
      plain: link,
    });
    await sendLetters(services());
    expect(sink.mails[0]?.text?.trim()).toBe(link);
    expect((await state(id)).html).toBe('<a href="https://vatwright.example/invitation/•••">x</a>');
  });

  it('waits longer after each 450 and keeps the reason, then sends', async () => {
    sink.answer = 450;
    const id = await makeLetter();
    await sendLetters(services());
    expect(await state(id)).toMatchObject({ state: 'queued', attempts: 1, leased_until: null });
    expect((await state(id)).wait).toBeGreaterThan(50);
    expect((await state(id)).last_error).toContain('450');
    // Not its turn yet.
    expect(await sendLetters(services())).toEqual({ sent: 0, refused: 0, later: 0 });
    await dueNow();
    await sendLetters(services());
    expect((await state(id)).wait).toBeGreaterThan(110);
    sink.answer = 'take';
    await dueNow();
    await sendLetters(services());
    expect(await state(id)).toMatchObject({ state: 'sent', attempts: 3, last_error: null });
    expect(sink.mails).toHaveLength(1);
  });

  it('gives a letter up at once when it is refused for good', async () => {
    sink.answer = 550;
    const ids = await makeLetters(3);
    expect(await sendLetters(services())).toEqual({ sent: 0, refused: 3, later: 0 });
    for (const id of ids) {
      expect(await state(id)).toMatchObject({ state: 'dead', attempts: 1 });
      expect((await state(id)).last_error).toContain('550');
    }
    await dueNow();
    sink.answer = 'take';
    expect((await sendLetters(services())).sent).toBe(0);
  });

  it('loses nothing over an outage of days, and tries one letter where the server is away', async () => {
    const { url } = sink;
    await sink.close();
    const ids = await makeLetters(25);
    // Two days of attempts, half an hour apart.
    for (let attempt = 0; attempt < 96; attempt += 1) {
      await dueNow();
      expect(await sendLetters(services(url))).toEqual({ sent: 0, refused: 0, later: 1 });
    }
    const states = await Promise.all(ids.map(state));
    expect(states.every((it) => it.state === 'queued' && it.leased_until === null)).toBe(true);
    expect(states.reduce((sum, { attempts }) => sum + attempts, 0)).toBe(96);
    sink = await smtpSink(Number(new URL(url).port));
    await dueNow();
    expect((await sendLetters(services(url))).sent).toBe(25);
    expect(new Set(sink.mails.map(({ messageId }) => messageId)).size).toBe(25);
    expect(sink.mails).toHaveLength(25);
  });

  it('gives a letter that hangs back to the queue', async () => {
    const id = await makeLetter();
    const never = { send: () => new Promise<void>(() => undefined), close: () => undefined };
    await sendLetters(services(), { open: () => never, timeoutMs: 50 });
    expect(await state(id)).toMatchObject({ state: 'queued', last_error: 'No answer in 50 ms' });
  });

  it('sends at most one copy too many when the answer to the text is lost, under one name', async () => {
    const id = await makeLetter();
    sink.answer = 'hang up after text';
    await sendLetters(services());
    expect(await state(id)).toMatchObject({ state: 'queued', attempts: 1 });
    sink.answer = 'take';
    await dueNow();
    await sendLetters(services());
    expect(sink.mails.map(({ messageId }) => messageId)).toEqual(
      Array(2).fill(`<${id}@vatwright.example>`),
    );
  });

  it('stops between letters when told to, and leaves the rest as they were', async () => {
    await makeLetters(8);
    const stop = new AbortController();
    sink.onTaken = () => {
      if (sink.mails.length === 3) stop.abort();
    };
    expect((await sendLetters(services(), { signal: stop.signal })).sent).toBe(3);
    const [rows] = await app.db.owner.query(
      `SELECT count(*)::int AS n FROM letters WHERE attempts = 0 AND leased_until IS NULL`,
    );
    expect(rows[0]).toEqual({ n: 5 });
  });

  it('loses nothing when workers are killed right after the server took a letter', async () => {
    const count = 12;
    await makeLetters(count);
    let kills = 0;
    while ((await waiting()) > 0) {
      const worker = fork(`${__dirname}/../../test/support/sending-worker.ts`, [], {
        execArgv: ['--import', 'tsx'],
        env: { ...process.env, DATABASE_URL: app.db.appUrl, SMTP_URL: sink.url },
      });
      let taken = 0;
      const victim = kills < 3;
      sink.onTaken = () => {
        taken += 1;
        // The second letter of this worker: taken, and its sender dies before it can know.
        if (victim && taken === 2) {
          kills += 1;
          worker.kill('SIGKILL');
        }
      };
      await new Promise((done) => worker.once('exit', done));
      await app.db.owner.query('UPDATE letters SET leased_until = NULL');
    }
    const ids = sink.mails.map(({ messageId }) => messageId);
    expect(kills).toBe(3);
    expect(new Set(ids).size).toBe(count);
    expect(ids.length - count).toBeLessThanOrEqual(kills);
  });

  const waiting = async () => {
    const [rows] = await app.db.owner.query(
      `SELECT count(*)::int AS n FROM letters WHERE state = 'queued'`,
    );
    return (rows[0] as { n: number }).n;
  };
});
