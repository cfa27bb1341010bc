import { randomUUID } from 'node:crypto';
import type { Role, ScopeKind } from '@shared/access/role';
import { type Fleet, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { storeBody } from '@test/factories/fleet-bodies';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

describe('chains, regions and stores', () => {
  let it_: TestApp;
  let fleet: Fleet;
  /** Same organisation, another chain and region. */
  let other: Fleet;
  let administrator: Browser;
  let stranger: Browser;

  const as = async (
    role: Role,
    scope?: { kind: ScopeKind; id: string },
    organisationId?: string,
  ) => {
    const of = organisationId ?? fleet.organisationId;
    const { email } = await makePerson(it_.db, of, role, scope ?? { kind: 'organisation', id: of });
    return it_.browser().signIn(email);
  };
  const events = async (subjectId: string) => {
    const [rows] = await it_.db.owner.query(
      'SELECT action, detail FROM audit_events WHERE subject_id = $1 ORDER BY id',
      { bind: [subjectId] },
    );
    return rows as { action: string; detail: { changes?: object } }[];
  };
  const addStore = async (more: object = {}) => {
    const { body } = await administrator.post('/stores', storeBody(fleet, more)).expect(200);
    return body;
  };
  const asInput = (store: Record<string, unknown>, more: object = {}) => {
    const keys = Object.keys(storeBody(fleet)).filter((key) => key !== 'id');
    const kept = Object.fromEntries(keys.map((key) => [key, store[key]]));
    return { ...kept, position: null, timeZone: null, version: store['version'], ...more };
  };

  beforeAll(async () => {
    it_ = await testApp();
    it_.setNow('2026-06-10T12:00:00Z');
    fleet = await makeFleet(it_.db);
    other = await makeFleet(it_.db, { organisationId: fleet.organisationId });
    administrator = await as('administrator');
    const elsewhere = await makeFleet(it_.db);
    stranger = await as('administrator', undefined, elsewhere.organisationId);
  });
  afterAll(() => it_.close());

  describe('a chain or region', () => {
    it.each(['chains', 'regions'])('is added, renamed, retired and restored: %s', async (group) => {
      const id = randomUUID();
      const name = `New ${group}`;
      const made = await administrator.post(`/${group}`, { id, name }).expect(200);
      expect(made.body).toMatchObject({ name, stores: 0, retiredAt: null, mayEdit: true });
      const named = await administrator
        .patch(`/${group}/${id}`, { name: `${name} 2`, version: 0 })
        .expect(200);
      const retired = await administrator
        .post(`/${group}/${id}/retire`, { version: named.body.version })
        .expect(200);
      expect(retired.body.retiredAt).toBe('2026-06-10T12:00:00.000Z');
      const live = await administrator.get(`/${group}?q=${encodeURIComponent(name)}`).expect(200);
      expect(live.body.total).toBe(0);
      const { version } = retired.body;
      await administrator.post(`/${group}/${id}/restore`, { version }).expect(200);
      expect((await events(id)).map(({ action }) => action.replace(/^\w+-/, ''))).toEqual([
        'created',
        'edited',
        'retired',
        'restored',
      ]);
    });

    it('refuses a name that is taken, an old version, and retiring with live stores', async () => {
      const id = randomUUID();
      await administrator.post('/chains', { id, name: 'Taken once' }).expect(200);
      const { body } = await administrator
        .post('/chains', { id: randomUUID(), name: 'Taken once' })
        .expect(422);
      expect(body.errors).toMatchObject([{ field: 'name', reason: 'taken' }]);
      const old = { name: 'Again', version: 7 };
      const refused = await administrator.patch(`/chains/${id}`, old).expect(409);
      expect(refused.body.code).toBe('changed-meanwhile');
      const inUse = await administrator
        .post(`/chains/${fleet.chainId}/retire`, { version: 0 })
        .expect(409);
      expect(inUse.body.code).toBe('in-use');
    });

    it('is seen by those who see a store of it', async () => {
      const owner = await as('account-owner', { kind: 'chain', id: fleet.chainId });
      const names = (await owner.get('/regions').expect(200)).body.rows.map(
        ({ id }: { id: string }) => id,
      );
      expect(names).toContain(fleet.regionId);
      expect(names).not.toContain(other.regionId);
      expect((await owner.get('/chains').expect(200)).body.total).toBe(1);
    });
  });

  describe('a store', () => {
    it('takes position, town and zone from its ZIP code', async () => {
      const store = await addStore();
      expect(store).toMatchObject({
        positionFrom: 'postal-code',
        timeZone: 'America/Phoenix',
        city: 'Phoenix',
        usState: 'AZ',
        units: 0,
        mayEdit: true,
      });
      expect(store.latitude).toBeCloseTo(33.45, 1);
    });

    it('takes its zone from coordinates, or from whoever says it outright', async () => {
      const position = { latitude: 36.68, longitude: -110.54 };
      const kayenta = await addStore({ postalCode: '', position });
      expect(kayenta).toMatchObject({ positionFrom: 'coordinates', ...position });
      const said = await addStore({ timeZone: 'America/Denver' });
      expect(said).toMatchObject({
        timeZone: 'America/Denver',
        timeZoneOfPosition: 'America/Phoenix',
      });
    });

    it('is refused with every field at fault', async () => {
      const { body } = await administrator
        .post(
          '/stores',
          storeBody(fleet, {
            postalCode: '00000',
            timeZone: 'America/Nowhere',
            chainId: randomUUID(),
          }),
        )
        .expect(422);
      expect(body.errors.map(({ field }: { field: string }) => field).sort()).toEqual([
        'chainId',
        'postalCode',
        'timeZone',
      ]);
      const shape = await administrator
        .post(
          '/stores',
          storeBody(fleet, { name: ' ', hours: { open: '6', close: null, rush: [] } }),
        )
        .expect(422);
      expect(shape.body.errors.map(({ field }: { field: string }) => field)).toEqual([
        'name',
        'hours.open',
      ]);
    });

    it('has a number of its own in its chain', async () => {
      const { number, id } = await addStore();
      const { body } = await administrator
        .post('/stores', storeBody(fleet, { number }))
        .expect(422);
      expect(body.errors).toMatchObject([{ field: 'number', reason: 'store-number-taken' }]);
      await administrator.post('/stores', storeBody(other, { number })).expect(200);
      await administrator.post('/stores', storeBody(fleet, { id })).expect(409);
    });

    it('is changed once per version, and the change is kept', async () => {
      const store = await addStore();
      const input = asInput(store, { name: 'Mill Pond North', postalCode: '60601', city: '' });
      const { body } = await administrator.patch(`/stores/${store.id}`, input).expect(200);
      expect(body).toMatchObject({ name: 'Mill Pond North', timeZone: 'America/Chicago' });
      await administrator.patch(`/stores/${store.id}`, input).expect(409);
      const [, edited] = await events(store.id);
      expect(edited).toMatchObject({
        action: 'store-edited',
        detail: {
          changes: { name: ['Mill Pond', 'Mill Pond North'], city: ['Phoenix', 'Chicago'] },
        },
      });
      expect(Object.keys(edited?.detail.changes ?? {})).not.toContain('phone');
    });

    it('is retired and restored', async () => {
      const { id } = await addStore();
      const { body } = await administrator.post(`/stores/${id}/retire`, { version: 0 }).expect(200);
      expect(body.retiredAt).not.toBeNull();
      const listed = async (state: string) =>
        (await administrator.get(`/stores?state=${state}&pageSize=200`)).body.rows.some(
          (row: { id: string }) => row.id === id,
        );
      expect([await listed('live'), await listed('retired'), await listed('all')]).toEqual([
        false,
        true,
        true,
      ]);
      await administrator.post(`/stores/${id}/restore`, { version: 1 }).expect(200);
      expect(await listed('live')).toBe(true);
    });

    it('is the same when sent again with its idempotency key', async () => {
      const body = storeBody(fleet);
      const key = randomUUID();
      for (let nth = 0; nth < 2; nth += 1) {
        await administrator.post('/stores', body).set('Idempotency-Key', key).expect(200);
      }
      expect(await events(body.id)).toHaveLength(1);
    });
  });

  describe('the list of stores', () => {
    it('searches every word, filters, sorts and pages', async () => {
      const chain = await administrator.post('/chains', { id: randomUUID(), name: 'Listed' });
      const of = { ...fleet, chainId: chain.body.id };
      for (const [number, name] of [
        ['10', 'Alpha Mill'],
        ['9', 'Beta Mill'],
        ['100', 'Gamma 50%'],
      ]) {
        await administrator.post('/stores', storeBody(of, { number, name })).expect(200);
      }
      const numbers = async (query: string) =>
        (await administrator.get(`/stores?chain=${of.chainId}&${query}`).expect(200)).body.rows.map(
          (row: { number: string }) => row.number,
        );
      expect(await numbers('')).toEqual(['9', '10', '100']);
      expect(await numbers('sort=-number')).toEqual(['100', '10', '9']);
      expect(await numbers('sort=-name&pageSize=2&page=2')).toEqual(['10']);
      expect(await numbers('q=mill%20alpha')).toEqual(['10']);
      expect(await numbers('q=50%25')).toEqual(['100']);
      expect(await numbers('usState=az&sort=city')).toHaveLength(3);
      await administrator.get('/stores?sort=secret').expect(422);
      await administrator.get('/stores?pageSize=5000').expect(422);
    });

    it('finds a place for a form', async () => {
      const { body } = await administrator.get('/stores/locate?postalCode=60601').expect(200);
      expect(body.place).toMatchObject({ city: 'Chicago', timeZone: 'America/Chicago' });
      const none = await administrator.get('/stores/locate?postalCode=00000').expect(200);
      expect(none.body.place).toBeNull();
    });
  });

  describe('who may', () => {
    it('see a store: those whose scope it lies in', async () => {
      const inRegion = await as('technician', { kind: 'region', id: fleet.regionId });
      await inRegion.get(`/stores/${fleet.storeId}`).expect(200);
      await inRegion.get(`/stores/${other.storeId}`).expect(404);
      const atStore = await as('store-manager', { kind: 'store', id: fleet.storeId });
      expect((await atStore.get('/stores')).body.total).toBe(1);
      await stranger.get(`/stores/${fleet.storeId}`).expect(404);
      expect((await stranger.get(`/stores?chain=${fleet.chainId}`)).body.total).toBe(0);
      const lead = await as('shift-lead', { kind: 'store', id: fleet.storeId });
      await lead.get('/stores').expect(403);
      await it_.browser().get('/stores').expect(401);
    });

    it.each([
      ['technician', 'region', 403],
      ['store-manager', 'store', 403],
      ['account-owner', 'chain', 403],
      ['trainer', 'organisation', 403],
      ['regional-facility-manager', 'region', 200],
    ] as const)('change a store: %s with a %s, %d', async (role, kind, status) => {
      const store = await addStore();
      const ids = {
        region: fleet.regionId,
        chain: fleet.chainId,
        store: store.id,
        organisation: fleet.organisationId,
      };
      const browser = await as(role, { kind, id: ids[kind] });
      await browser.patch(`/stores/${store.id}`, asInput(store)).expect(status);
      await browser.post(`/chains`, { id: randomUUID(), name: randomUUID() }).expect(403);
    });

    it('move a store: only who may change it at both ends', async () => {
      const store = await addStore();
      const manager = await as('regional-facility-manager', {
        kind: 'region',
        id: fleet.regionId,
      });
      const away = asInput(store, { regionId: other.regionId });
      await manager.patch(`/stores/${store.id}`, away).expect(403);
      await manager.post('/stores', storeBody(other)).expect(403);
      await stranger.patch(`/stores/${store.id}`, asInput(store)).expect(404);
      await administrator.patch(`/stores/${store.id}`, away).expect(200);
      await manager.get(`/stores/${store.id}`).expect(404);
    });
  });
});
