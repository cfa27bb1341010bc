import { randomUUID } from 'node:crypto';
import { type Fleet, insert, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

describe('findings', () => {
  let app: TestApp;
  let fleet: Fleet;
  let technician: Browser;
  let manager: Browser;

  beforeAll(async () => {
    app = await testApp();
    // Still 9 June in Chicago, already 10 June in UTC.
    app.setNow('2026-06-10T03:00:00Z');
    fleet = await makeFleet(app.db);
    const { organisationId, regionId, storeId } = fleet;
    const signIn = async (...who: Parameters<typeof makePerson>) =>
      app.browser().signIn((await makePerson(...who)).email);
    const region = { kind: 'region', id: regionId } as const;
    technician = await signIn(app.db, organisationId, 'technician', region);
    const store = { kind: 'store', id: storeId } as const;
    manager = await signIn(app.db, organisationId, 'store-manager', store);
    for (const kind of ['pump', 'motor']) {
      await insert(app.db, 'components', {
        organisation_id: organisationId,
        unit_id: fleet.unitId,
        kind,
        model: `${kind} 1`,
        installed_on: '2025-01-01',
      });
    }
  });
  afterAll(() => app.close());

  const report = (more: object = {}) => ({
    id: randomUUID(),
    storeId: fleet.storeId,
    unitId: fleet.unitId,
    componentKind: 'pump',
    cause: 'worn-seal',
    severity: 'plan',
    note: 'Oil below the drain slot',
    photoIds: [],
    ...more,
  });

  it('lets a store report trouble that its technician then sees and filters', async () => {
    const sent = report();
    await manager.post('/findings', sent).expect(200);
    const { body } = await technician.get('/findings?cause=worn-seal&settled=no').expect(200);
    expect(body.rows.map((it: { id: string }) => it.id)).toEqual([sent.id]);
    const none = await technician.get('/findings?cause=winding').expect(200);
    expect(none.body.total).toBe(0);
    const found = await technician.get('/findings?q=drain%20slot&from=2026-06-09&to=2026-06-09');
    expect(found.body.total).toBe(1);
  });

  it('ends the old part and installs a new one when a repair replaced it', async () => {
    const sent = report();
    await manager.post('/findings', sent).expect(200);
    const repair = {
      id: randomUUID(),
      cause: 'worn-seal',
      replaced: ['pump'],
      minutes: 50,
      partsCents: 31_000,
      labourCents: 9_000,
    };
    const settlement = { version: 0, note: 'New pump', repair };
    await manager.post(`/findings/${sent.id}/settlement`, settlement).expect(403);
    await technician.post(`/findings/${sent.id}/settlement`, settlement).expect(200);
    await technician.post(`/findings/${sent.id}/settlement`, settlement).expect(409);
    await technician.delete(`/findings/${sent.id}/settlement`, { version: 1 }).expect(409);
    const [parts] = await app.db.owner.query(
      `SELECT kind, model, installed_on AS "from", removed_on AS "to" FROM components
       ORDER BY kind, installed_on`,
    );
    expect(parts).toEqual([
      { kind: 'motor', model: 'motor 1', from: '2025-01-01', to: null },
      { kind: 'pump', model: 'pump 1', from: '2025-01-01', to: '2026-06-09' },
      { kind: 'pump', model: 'pump 1', from: '2026-06-09', to: null },
    ]);
  });

  it('opens a finding again that was settled by a word alone', async () => {
    const sent = report();
    await manager.post('/findings', sent).expect(200);
    const settlement = { version: 0, note: 'Paper was torn', repair: null };
    await technician.post(`/findings/${sent.id}/settlement`, settlement).expect(200);
    const { body } = await technician
      .delete(`/findings/${sent.id}/settlement`, { version: 1 })
      .expect(200);
    expect(body.settledAt).toBeNull();
  });

  it('gives a list away as a file, with words instead of codes', async () => {
    await manager.post('/findings', report({ note: '=1+1' })).expect(200);
    const { text } = await manager.get('/findings/export?format=csv&q=1%2B1').expect(200);
    const [headings = '', line = '', ...more] = text.trim().split('\r\n');
    expect(headings).toContain('What was found');
    // OWASP, CSV injection: a leading apostrophe keeps a sheet from working it out.
    expect(line).toContain("'=1+1");
    expect(line).not.toContain('worn-seal');
    expect(more).toEqual([]);
  });

  it('names what is missing and keeps other stores out', async () => {
    const { body } = await manager.post('/findings', report({ note: ' ' })).expect(422);
    expect(body.errors[0].field).toBe('note');
    const elsewhere = await makeFleet(app.db, { organisationId: fleet.organisationId });
    await manager.post('/findings', report({ storeId: elsewhere.storeId })).expect(403);
    const wrongUnit = await manager.post('/findings', report({ unitId: elsewhere.unitId }));
    expect(wrongUnit.body.errors[0].field).toBe('unitId');
  });
});
