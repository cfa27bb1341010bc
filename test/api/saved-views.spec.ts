import { randomUUID } from 'node:crypto';
import { type Fleet, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

describe('saved views', () => {
  let app: TestApp;
  let fleet: Fleet;
  let manager: Browser;
  let technician: Browser;

  beforeAll(async () => {
    app = await testApp();
    fleet = await makeFleet(app.db);
    const signIn = async (...role: [Parameters<typeof makePerson>[2]]) =>
      app.browser().signIn((await makePerson(app.db, fleet.organisationId, ...role)).email);
    manager = await signIn('regional-facility-manager');
    technician = await signIn('technician');
  });
  afterAll(() => app.close());

  const view = (more: object = {}) => ({
    id: randomUUID(),
    page: 'tasks',
    name: `View ${randomUUID().slice(0, 8)}`,
    query: 'state=overdue&sort=closes',
    shared: false,
    ...more,
  });
  const namesSeenBy = async (browser: Browser, page: string) => {
    const { body } = await browser.get(`/saved-views?page=${page}`).expect(200);
    return body.rows.map(({ name }: { name: string }) => name);
  };

  it('keeps one’s own views of a page, by name, and shows shared ones to all', async () => {
    const page = 'board';
    await manager.post('/saved-views', view({ page, name: 'Mine' })).expect(200);
    await manager.post('/saved-views', view({ page, name: 'everybody', shared: true })).expect(200);
    await technician.post('/saved-views', view({ page, name: 'Hands' })).expect(200);
    await manager.post('/saved-views', view({ page: 'tasks' })).expect(200);
    expect(await namesSeenBy(manager, page)).toEqual(['everybody', 'Mine']);
    expect(await namesSeenBy(technician, page)).toEqual(['everybody', 'Hands']);
  });

  it('saves once what is sent twice, and refuses a second view of a name', async () => {
    const sent = view({ page: 'findings' });
    await manager.post('/saved-views', sent).expect(200);
    await manager.post('/saved-views', sent).expect(200);
    expect(await namesSeenBy(manager, 'findings')).toEqual([sent.name]);
    const twin = await manager.post('/saved-views', { ...sent, id: randomUUID() }).expect(422);
    expect(twin.body.errors[0]).toMatchObject({ field: 'name', reason: 'taken' });
    await technician.post('/saved-views', { ...sent, id: randomUUID() }).expect(200);
  });

  it('changes and forgets a view, unless it was changed meanwhile or is another’s', async () => {
    const sent = view({ shared: true });
    await manager.post('/saved-views', sent).expect(200);
    const edit = { name: 'New name', query: 'state=open', shared: true, version: 0 };
    const { body } = await manager.patch(`/saved-views/${sent.id}`, edit).expect(200);
    expect(body).toMatchObject({ name: 'New name', query: 'state=open', version: 1 });
    await manager.patch(`/saved-views/${sent.id}`, edit).expect(409);
    await technician.patch(`/saved-views/${sent.id}`, { ...edit, version: 1 }).expect(403);
    await technician.delete(`/saved-views/${sent.id}`, { version: 1 }).expect(403);
    await manager.delete(`/saved-views/${sent.id}`, { version: 1 }).expect(204);
    await manager.delete(`/saved-views/${sent.id}`, { version: 1 }).expect(404);
  });

  it('lets only planners and administrators share, and hides what is not shared', async () => {
    await technician.post('/saved-views', view({ shared: true })).expect(403);
    const own = view();
    await technician.post('/saved-views', own).expect(200);
    const share = { name: own.name, query: '', shared: true, version: 0 };
    await technician.patch(`/saved-views/${own.id}`, share).expect(403);
    await manager.patch(`/saved-views/${own.id}`, share).expect(404);
    const { body } = await technician.get('/saved-views?page=tasks').expect(200);
    expect(body.mayShare).toBe(false);
  });
});
