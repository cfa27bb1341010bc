import { digestSample } from '@shared/digests/digest-sample';
import {
  type Fleet,
  insert,
  makeFleet,
  makeOrganisation,
  makePerson,
} from '@test/factories/organisation-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

describe('digests', () => {
  let app: TestApp;
  let organisationId: string;
  let fleet: Fleet;
  let other: Fleet;
  let owner: Browser;
  let november: string;
  let october: string;
  let foreign: string;

  const makeDigest = (of: Fleet, month: string, row: object = {}) =>
    insert(app.db, 'digests', {
      organisation_id: of.organisationId,
      chain_id: of.chainId,
      month: `${month}-01`,
      content: { ...digestSample, month, ...row },
      made_at: '2026-12-01T12:00:00Z',
    });

  beforeAll(async () => {
    app = await testApp();
    organisationId = await makeOrganisation(app.db);
    fleet = await makeFleet(app.db, { organisationId });
    other = await makeFleet(app.db, { organisationId });
    october = await makeDigest(fleet, '2026-10', { rate: null, change: null });
    november = await makeDigest(fleet, '2026-11');
    foreign = await makeDigest(other, '2026-11');
    const scope = { kind: 'chain', id: fleet.chainId } as const;
    const person = await makePerson(app.db, organisationId, 'account-owner', scope);
    owner = await app.browser().signIn(person.email);
  });
  afterAll(() => app.close());

  it('lists the chains that a person answers for, newest month first', async () => {
    const { body } = await owner.get('/digests').expect(200);
    expect(body.total).toBe(2);
    expect(body.rows[0]).toMatchObject({
      id: november,
      month: '2026-11',
      rate: digestSample.rate,
      change: -2.5,
      overdue: 3,
      findings: 5,
      madeAt: '2026-12-01T12:00:00.000Z',
    });
    expect(body.rows[1]).toMatchObject({ id: october, rate: null, change: null });
    expect(body.chains).toHaveLength(1);
    const one = await owner.get('/digests?month=2026-10&page=1&pageSize=1').expect(200);
    expect(one.body).toMatchObject({ total: 1, rows: [{ id: october }] });
    const none = await owner.get(`/digests?chain=${other.chainId}`).expect(200);
    expect(none.body.total).toBe(0);
  });

  it('reads a digest as it was made, with the way to the months beside it', async () => {
    await app.db.owner.query('UPDATE chains SET name = $1 WHERE id = $2', {
      bind: ['Renamed since', fleet.chainId],
    });
    const { body } = await owner.get(`/digests/${november}`).expect(200);
    expect(body.content).toEqual({ ...digestSample, month: '2026-11' });
    expect(body).toMatchObject({ earlierId: october, laterId: null });
    const before = await owner.get(`/digests/${october}`).expect(200);
    expect(before.body).toMatchObject({ earlierId: null, laterId: november });
  });

  it('hides the digests of chains that a person does not hold as a whole', async () => {
    await owner.get(`/digests/${foreign}`).expect(404);
    const scope = { kind: 'region', id: fleet.regionId } as const;
    const person = await makePerson(app.db, organisationId, 'regional-facility-manager', scope);
    const regional = await app.browser().signIn(person.email);
    const { body } = await regional.get('/digests').expect(200);
    expect(body).toMatchObject({ total: 0, chains: [] });
    await regional.get(`/digests/${november}`).expect(404);
  });

  it.each(['technician', 'store-manager', 'trainer'] as const)(
    'is closed to a %s',
    async (role) => {
      const person = await makePerson(app.db, organisationId, role);
      const browser = await app.browser().signIn(person.email);
      await browser.get('/digests').expect(403);
      await browser.get(`/digests/${november}`).expect(403);
    },
  );

  it('is empty to another organisation, and names what it cannot use', async () => {
    const stranger = await makePerson(app.db, await makeOrganisation(app.db), 'account-owner');
    const browser = await app.browser().signIn(stranger.email);
    expect((await browser.get('/digests').expect(200)).body.total).toBe(0);
    await browser.get(`/digests/${november}`).expect(404);
    const { body } = await owner.get('/digests?month=2026-13&page=0').expect(422);
    expect(body.errors.map((it: { field: string }) => it.field).sort()).toEqual(['month', 'page']);
  });

  it('cannot be changed, not even by the application itself', async () => {
    await expect(
      app.db.app.query(`UPDATE digests SET made_at = now() WHERE id = $1`, { bind: [november] }),
    ).rejects.toThrow(/permission denied/);
  });
});
