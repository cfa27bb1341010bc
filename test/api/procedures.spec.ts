import { randomUUID } from 'node:crypto';
import type { ProcedureContent } from '@shared/procedures/procedure-content';
import type { Role } from '@shared/access/role';
import { makeFleet, makePerson, type Fleet } from '@test/factories/organisation-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

const text = (it: string) => ({ en: it, es: `${it} (es)` });
const content = (more: Partial<ProcedureContent> = {}): ProcedureContent => ({
  title: text('Look at the pan'),
  purpose: text('So that it seats'),
  minutes: 5,
  tools: [],
  parts: [],
  cautions: [text('Hot oil')],
  steps: [{ kind: 'check', key: 'flat', text: text('Flat'), required: true }],
  ...more,
});

describe('procedures', () => {
  let it_: TestApp;
  let fleet: Fleet;
  let trainer: Browser;

  const as = async (role: Role, organisationId = fleet.organisationId) => {
    const { email } = await makePerson(it_.db, organisationId, role);
    return it_.browser().signIn(email);
  };
  const create = async (browser: Browser, given: Partial<ProcedureContent> = {}) => {
    const id = randomUUID();
    const body = { id, versionId: randomUUID(), code: `pan-${id}`, content: content(given) };
    await browser.post('/procedures', body).expect(200);
    return id;
  };

  beforeAll(async () => {
    it_ = await testApp();
    it_.setNow('2026-12-01T10:00:00Z');
    fleet = await makeFleet(it_.db);
    trainer = await as('trainer');
  });
  afterAll(() => it_.close());

  it('goes from draft to published to a next draft', async () => {
    const id = await create(trainer);
    await trainer
      .put(`/procedures/${id}/draft`, { version: 0, content: content({ minutes: 6 }) })
      .expect(200);
    const published = await trainer.post(`/procedures/${id}/publish`, { version: 1 }).expect(200);
    expect(published.body.versions).toMatchObject([
      { number: 1, publishedAt: '2026-12-01T10:00:00.000Z', content: { minutes: 6 } },
    ]);
    const next = await trainer
      .post(`/procedures/${id}/draft`, { versionId: randomUUID() })
      .expect(200);
    expect(next.body.versions.map((it: { number: number }) => it.number)).toEqual([2, 1]);
    expect(next.body.versions[0]).toMatchObject({ publishedAt: null, content: { minutes: 6 } });
    const twice = await trainer
      .post(`/procedures/${id}/draft`, { versionId: randomUUID() })
      .expect(409);
    expect(twice.body.code).toBe('draft-exists');
    const back = await trainer.delete(`/procedures/${id}/draft`, { version: 0 }).expect(200);
    expect(back.body.versions).toHaveLength(1);
    await trainer.put(`/procedures/${id}/draft`, { version: 0, content: content() }).expect(409);
  });

  it('keeps what is published even from the database’s owner', async () => {
    const id = await create(trainer);
    await trainer.post(`/procedures/${id}/publish`, { version: 0 }).expect(200);
    const bind = [id];
    for (const statement of [
      `UPDATE procedure_versions SET content = '{}' WHERE procedure_id = $1`,
      'DELETE FROM procedure_versions WHERE procedure_id = $1',
    ]) {
      await expect(it_.db.owner.query(statement, { bind })).rejects.toThrow(/never changes/);
    }
  });

  it('publishes nothing half-written, and says all that is missing', async () => {
    const id = await create(trainer, { title: { en: 'Only English', es: '' }, steps: [] });
    const { body } = await trainer.post(`/procedures/${id}/publish`, { version: 0 }).expect(422);
    expect(body.errors.map(({ field }: { field: string }) => field)).toEqual([
      'content.title.es',
      'content.steps',
    ]);
  });

  it('shows a conflict instead of overwriting', async () => {
    const id = await create(trainer);
    const save = () => trainer.put(`/procedures/${id}/draft`, { version: 0, content: content() });
    await save().expect(200);
    const { body } = await save().expect(409);
    expect(body.code).toBe('changed-meanwhile');
    await trainer.post(`/procedures/${id}/publish`, { version: 0 }).expect(409);
  });

  it('names the field of what it cannot use', async () => {
    const bad = {
      ...content(),
      minutes: 0,
      steps: [{ kind: 'number', key: 'A B', text: text('x'), required: true }],
    };
    const { body } = await trainer
      .post('/procedures', { id: randomUUID(), versionId: randomUUID(), code: 'ok', content: bad })
      .expect(422);
    const fields = body.errors.map(({ field }: { field: string }) => field);
    expect(fields).toEqual(
      expect.arrayContaining(['content.minutes', 'content.steps.0.key', 'content.steps.0.number']),
    );
    const taken = { id: randomUUID(), versionId: randomUUID(), code: 'once', content: content() };
    await trainer.post('/procedures', taken).expect(200);
    const again = await trainer
      .post('/procedures', { ...taken, id: randomUUID(), versionId: randomUUID() })
      .expect(422);
    expect(again.body.errors).toMatchObject([{ field: 'code', reason: 'taken' }]);
  });

  it('retires what no rule uses, and takes it back', async () => {
    const id = await create(trainer);
    await trainer.post(`/procedures/${id}/retire`, { version: 0 }).expect(200);
    const listed = await trainer.get('/procedures?pageSize=200').expect(200);
    expect(listed.body.rows.map((row: { id: string }) => row.id)).not.toContain(id);
    await trainer.post(`/procedures/${id}/restore`, { version: 1 }).expect(200);
  });

  it.each<[Role, number, number]>([
    ['trainer', 200, 200],
    ['administrator', 200, 403],
    ['regional-facility-manager', 200, 403],
    ['technician', 200, 403],
    ['store-manager', 200, 403],
    ['account-owner', 403, 403],
    ['shift-lead', 403, 403],
  ])('answers a %s reading with %d and writing with %d', async (role, reading, writing) => {
    const browser = await as(role);
    await browser.get('/procedures').expect(reading);
    const id = randomUUID();
    const body = { id, versionId: randomUUID(), code: `by-${role}`, content: content() };
    await browser.post('/procedures', body).expect(writing);
  });

  it('shows drafts only to those who write', async () => {
    const id = await create(trainer);
    const technician = await as('technician');
    const { body } = await technician.get(`/procedures/${id}`).expect(200);
    const listed = await technician.get('/procedures?state=all&pageSize=200').expect(200);
    expect(listed.body.rows.map((row: { id: string }) => row.id)).not.toContain(id);
    expect(body).toMatchObject({ versions: [], mayEdit: false });
  });

  it('is not there for another organisation', async () => {
    const id = await create(trainer);
    const other = await makeFleet(it_.db);
    const stranger = await as('trainer', other.organisationId);
    await stranger.get(`/procedures/${id}`).expect(404);
    await stranger.post(`/procedures/${id}/publish`, { version: 0 }).expect(404);
    const listed = await stranger.get('/procedures?state=all').expect(200);
    expect(listed.body.total).toBe(0);
  });

  it('adds the starters once, and finds and sorts them in either language', async () => {
    const other = await makeFleet(it_.db);
    const newcomer = await as('trainer', other.organisationId);
    const first = await newcomer.post('/procedures/starters').expect(200);
    expect(first.body.added).toBeGreaterThanOrEqual(8);
    const second = await newcomer.post('/procedures/starters').expect(200);
    expect(second.body.added).toBe(0);
    const found = await newcomer.get('/procedures?q=bandeja&locale=es&sort=-title').expect(200);
    expect(found.body.rows.length).toBeGreaterThan(0);
    const titles = found.body.rows.map((row: { title: { es: string } }) => row.title.es);
    expect(titles.every((title: string) => /bandeja/i.test(title))).toBe(true);
  });
});
