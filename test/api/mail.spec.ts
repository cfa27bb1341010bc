import {
  insert,
  makeFleet,
  makeOrganisation,
  makePerson,
} from '@test/factories/organisation-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

describe('the outbox', () => {
  let app: TestApp;
  let administrator: Browser;
  let person: { id: string; email: string };
  let organisationId: string;
  let letters = 0;

  const makeLetter = (row: object = {}) =>
    insert(app.db, 'letters', {
      organisation_id: organisationId,
      person_id: person.id,
      kind: 'reminders',
      dedupe_key: `letter ${(letters += 1)}`,
      to_address: person.email,
      subject: 'Vatwright: 2 due soon',
      html: '<html><body><p style="color:red">Hello</p></body></html>',
      plain: 'Hello',
      ...row,
    });

  beforeAll(async () => {
    app = await testApp();
    organisationId = await makeOrganisation(app.db);
    person = await makePerson(app.db, organisationId, 'administrator');
    administrator = await app.browser().signIn(person.email);
  });
  afterAll(() => app.close());
  beforeEach(() => app.db.owner.query('DELETE FROM letters'));

  it('lists letters by state and kind, with how many there are in each state', async () => {
    await makeLetter({ created_at: '2026-06-01T00:00:00Z' });
    await makeLetter({ state: 'dead', last_error: '550 no such box', kind: 'digest' });
    await makeLetter({ state: 'sent', sent_at: new Date() });
    const { body } = await administrator.get('/mail/letters').expect(200);
    expect(body.counts).toEqual({ queued: 1, sent: 1, dead: 1 });
    expect(body.oldestQueuedAt).toBe('2026-06-01T00:00:00.000Z');
    const dead = await administrator.get('/mail/letters?state=dead&q=due%20soon').expect(200);
    expect(dead.body).toMatchObject({ total: 1, rows: [{ lastError: '550 no such box' }] });
    const kinds = await administrator.get('/mail/letters?kind=digest').expect(200);
    expect(kinds.body.total).toBe(1);
  });

  it('names the filters that it cannot use', async () => {
    const { body } = await administrator.get('/mail/letters?state=lost&page=0&x=1').expect(422);
    expect(body.errors.map((it: { field: string }) => it.field).sort()).toEqual([
      '',
      'page',
      'state',
    ]);
  });

  it('shows a letter as sent, in a document that can run and load nothing', async () => {
    const id = await makeLetter();
    const { body } = await administrator.get(`/mail/letters/${id}`).expect(200);
    expect(body).toMatchObject({ plain: 'Hello', secretsHidden: false });
    const page = await administrator.get(`/mail/letters/${id}/html`).expect(200);
    expect(page.text).toContain('<p style="color:red">Hello</p>');
    expect(page.headers['content-type']).toContain('text/html');
    const policy = page.headers['content-security-policy'] as string;
    expect(policy).toContain("default-src 'none'");
    expect(policy).toContain('sandbox');
    expect(policy).toContain("frame-ancestors 'self'");
  });

  it('hides the link that would sign its reader in', async () => {
    const token = 'aB3-'.repeat(11);
    const link = `https://vatwright.example/reset-password/${token}`;
    const id = await makeLetter({
      kind: 'password-reset',
      html: `<a href="${link}">`,
      plain: link,
    });
    const { body } = await administrator.get(`/mail/letters/${id}`).expect(200);
    expect(body.secretsHidden).toBe(true);
    expect(JSON.stringify(body)).not.toContain(token);
    const page = await administrator.get(`/mail/letters/${id}/html`).expect(200);
    expect(page.text).not.toContain(token);
  });

  it('tries dead letters again, once, and writes down who asked', async () => {
    const dead = await makeLetter({ state: 'dead', attempts: 3, last_error: '550' });
    const sent = await makeLetter({ state: 'sent', sent_at: new Date() });
    const ids = [dead, sent];
    const first = await administrator.post('/mail/retries', { ids }).expect(200);
    expect(first.body).toEqual({ queued: 1 });
    const second = await administrator.post('/mail/retries', { ids }).expect(200);
    expect(second.body).toEqual({ queued: 0 });
    const { body } = await administrator.get(`/mail/letters/${dead}`).expect(200);
    expect(body).toMatchObject({ state: 'queued', attempts: 0, lastError: '550' });
    const [events] = await app.db.owner.query(
      `SELECT actor_id AS actor FROM audit_events WHERE subject_id = $1 AND action = 'retried'`,
      { bind: [dead] },
    );
    expect(events).toEqual([{ actor: person.id }]);
    await administrator.post('/mail/retries', { ids: [] }).expect(422);
  });

  it.each([
    'regional-facility-manager',
    'technician',
    'store-manager',
    'account-owner',
    'trainer',
  ] as const)('is closed to a %s', async (role) => {
    const other = await app
      .browser()
      .signIn((await makePerson(app.db, organisationId, role)).email);
    const id = await makeLetter({ state: 'dead' });
    await other.get('/mail/letters').expect(403);
    await other.get(`/mail/letters/${id}`).expect(403);
    await other.get(`/mail/letters/${id}/html`).expect(403);
    await other.post('/mail/retries', { ids: [id] }).expect(403);
  });

  it('is closed to an administrator of a part, and empty to another organisation', async () => {
    const id = await makeLetter({ state: 'dead' });
    const fleet = await makeFleet(app.db, { organisationId });
    const region = { kind: 'region', id: fleet.regionId } as const;
    const part = await makePerson(app.db, organisationId, 'administrator', region);
    const ofPart = await app.browser().signIn(part.email);
    await ofPart.get('/mail/letters').expect(403);
    await ofPart.post('/mail/retries', { ids: [id] }).expect(403);
    const foreign = await makePerson(app.db, await makeOrganisation(app.db), 'administrator');
    const stranger = await app.browser().signIn(foreign.email);
    const { body } = await stranger.get('/mail/letters').expect(200);
    expect(body.total).toBe(0);
    await stranger.get(`/mail/letters/${id}`).expect(404);
    await stranger.get(`/mail/letters/${id}/html`).expect(404);
    const retried = await stranger.post('/mail/retries', { ids: [id] }).expect(200);
    expect(retried.body.queued).toBe(0);
  });
});
