import { randomUUID } from 'node:crypto';
import { inTenant } from '@db/tenant-transaction';
import { visitsOfDay } from '@server/visits/visits-of-day';
import { type Fleet, insert, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { makeWork } from '@test/factories/task-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

const day = '2026-06-11';

/** What these tests read of a route's reply. */
interface RouteReply {
  id: string;
  version: number;
  state: string;
  metres: number;
  elsewhere: number;
  visits: {
    id: string;
    version: number;
    note: string;
    legMetres: number | null;
    store: { id: string };
    tasks: { id: string }[];
  }[];
}

describe('visits', () => {
  let app: TestApp;
  let fleet: Fleet;
  let planner: Browser;
  let technician: { id: string; email: string };

  beforeAll(async () => {
    app = await testApp();
    app.setNow('2026-06-10T15:00:00Z');
    fleet = await makeFleet(app.db);
    const region = { kind: 'region', id: fleet.regionId } as const;
    const manager = await makePerson(
      app.db,
      fleet.organisationId,
      'regional-facility-manager',
      region,
    );
    planner = await app.browser().signIn(manager.email);
  });
  afterAll(() => app.close());

  // Each test has a technician of its own, and so days of their own.
  beforeEach(async () => {
    const region = { kind: 'region', id: fleet.regionId } as const;
    technician = await makePerson(app.db, fleet.organisationId, 'technician', region, {
      home_latitude: 41.0,
      home_longitude: -87.0,
    });
  });

  /** A store of the region at a longitude, with one open task. */
  async function storeAt(longitude: number, row: object = {}) {
    const storeId = await insert(app.db, 'stores', {
      organisation_id: fleet.organisationId,
      chain_id: fleet.chainId,
      region_id: fleet.regionId,
      number: randomUUID().slice(0, 8),
      name: 'Store',
      latitude: 41,
      longitude,
      position_from: 'coordinates',
      time_zone: 'America/Chicago',
      ...row,
    });
    const { unitId } = await makeFleet(app.db, { ...fleet, storeId, unitId: undefined });
    const { makeTask } = await makeWork(app.db, { ...fleet, storeId, unitId });
    return { storeId, unitId, makeTask, taskId: await makeTask() };
  }

  const wanted = (store: { storeId: string; taskId: string }, more: object = {}) => ({
    id: randomUUID(),
    storeId: store.storeId,
    technicianId: technician.id,
    onDate: day,
    taskIds: [store.taskId],
    ...more,
  });
  const add = async (store: { storeId: string; taskId: string }, more: object = {}) =>
    (await planner.post('/visits', wanted(store, more)).expect(200)).body as RouteReply;

  const taskRow = async (id: string) => {
    const [rows] = await app.db.owner.query(
      'SELECT visit_id AS "visitId", assigned_to AS "assignedTo" FROM tasks WHERE id = $1',
      { bind: [id] },
    );
    return rows[0] as { visitId: string | null; assignedTo: string | null };
  };

  it('bundles a store’s open tasks into a visit and takes them out of unplanned work', async () => {
    const store = await storeAt(-87.1);
    const list = async () =>
      (await planner.get(`/visits/unplanned?by=${day}&pageSize=200`).expect(200)).body.rows.map(
        (row: { store: { id: string } }) => row.store.id,
      );
    expect(await list()).toContain(store.storeId);
    const route = await add(store);
    expect(route).toMatchObject({ state: 'draft', onDate: day, minutes: 10 });
    expect(route.visits[0]?.tasks.map(({ id }) => id)).toEqual([store.taskId]);
    expect(await list()).not.toContain(store.storeId);
    expect(await taskRow(store.taskId)).toMatchObject({ assignedTo: technician.id });
  });

  it('measures the legs from home on', async () => {
    const route = await add(await storeAt(-87.1));
    // One tenth of a degree along 41° N: the parallel’s radius on WGS 84 is 4,820.6 km (a·cos φ ∕
    // √(1 − e² sin² φ)), so 8,414 m; the geodesic differs by less than a millimetre here.
    expect(Math.round(route.visits[0]?.legMetres ?? 0)).toBe(8414);
    expect(route.metres).toBe(route.visits[0]?.legMetres);
  });

  it('keeps the order that the planner gives, and knows when somebody else changed it', async () => {
    const [a, b, c] = [await storeAt(-87.1), await storeAt(-87.2), await storeAt(-87.3)];
    await add(a);
    await add(b);
    const before = await add(c);
    const ids = before.visits.map(({ id }) => id);
    const order = [ids[2], ids[0], ids[1]];
    const { body } = await planner
      .put(`/routes/${before.id}/order`, { version: before.version, visitIds: order })
      .expect(200);
    expect(body.visits.map((visit: { id: string }) => visit.id)).toEqual(order);
    await planner
      .put(`/routes/${before.id}/order`, { version: before.version, visitIds: ids })
      .expect(409);
    const { body: refused } = await planner
      .put(`/routes/${before.id}/order`, { version: body.version, visitIds: ids.slice(1) })
      .expect(422);
    expect(refused.errors[0].field).toBe('visitIds');
  });

  it('orders nearest-next from the technician’s home', async () => {
    const stores = [await storeAt(-87.3), await storeAt(-86.9), await storeAt(-87.05)];
    for (const store of stores) await add(store);
    const { body } = await planner.get(`/routes?from=${day}&technician=${technician.id}`);
    const [route] = body.routes as RouteReply[];
    const reply = await planner
      .post(`/routes/${route?.id}/nearest-next`, { version: route?.version })
      .expect(200);
    const order = (reply.body as RouteReply).visits.map(({ store }) => store.id);
    // 0.05° from home, then 0.15° back east, then 0.4° west.
    expect(order).toEqual([stores[2], stores[1], stores[0]].map((store) => store?.storeId));
  });

  it('publishes, shows what changed after it, and tells technician and store', async () => {
    const store = await storeAt(-87.1);
    const manager = await makePerson(app.db, fleet.organisationId, 'store-manager', {
      kind: 'store',
      id: store.storeId,
    });
    const atStore = await app.browser().signIn(manager.email);
    const coming = async () =>
      (await atStore.get(`/visits/coming?from=${day}&days=7`).expect(200)).body.visits;
    const ofDay = () =>
      inTenant(app.db.app, fleet.organisationId, (tenant) =>
        visitsOfDay(tenant, technician.id, day, new Date('2026-06-10T15:00:00Z')),
      );
    const draft = await add(store);
    expect(await coming()).toEqual([]);
    expect(await ofDay()).toBeNull();

    const published = await planner
      .post(`/routes/${draft.id}/publish`, { version: draft.version })
      .expect(200);
    expect(published.body.state).toBe('published');
    expect(await coming()).toMatchObject([
      { onDate: day, place: 1, stops: 1, changed: false, done: 0 },
    ]);
    expect((await ofDay())?.visits.map(({ store: { id } }) => id)).toEqual([store.storeId]);

    const changed = await add(await storeAt(-87.2), { position: 0 });
    expect(changed.state).toBe('changed');
    expect(await coming()).toMatchObject([{ place: 2, stops: 2, changed: true }]);
    expect(await ofDay()).toMatchObject({ state: 'changed' });
    const again = await planner
      .post(`/routes/${draft.id}/publish`, { version: changed.version })
      .expect(200);
    expect(again.body.state).toBe('published');
    await planner.post(`/routes/${draft.id}/publish`, { version: draft.version }).expect(409);
  });

  it('moves a visit to another day and person, and merges it with one that is there', async () => {
    const region = { kind: 'region', id: fleet.regionId } as const;
    const other = await makePerson(app.db, fleet.organisationId, 'technician', region);
    const store = await storeAt(-87.1);
    const second = await store.makeTask({ occurs_local: '2026-06-10T10:00:00' });
    const first = await add(store);
    const visit = first.visits[0];
    const to = { technicianId: other.id, onDate: '2026-06-12' };
    await planner.post('/visits', { ...wanted({ ...store, taskId: second }), ...to }).expect(200);
    const { body } = await planner
      .post(`/visits/${visit?.id}/move`, { version: visit?.version, ...to })
      .expect(200);
    expect(body.visits).toHaveLength(1);
    expect(body.visits[0].tasks).toHaveLength(2);
    expect(await taskRow(store.taskId)).toMatchObject({ assignedTo: other.id });
    const left = await planner.get(`/routes/${first.id}`).expect(200);
    expect(left.body.visits).toEqual([]);
  });

  it('changes tasks and note, and gives back what is taken off', async () => {
    const store = await storeAt(-87.1);
    const second = await store.makeTask({ occurs_local: '2026-06-10T10:00:00' });
    const [visit] = (await add(store)).visits;
    const { body } = await planner
      .patch(`/visits/${visit?.id}`, { version: 0, note: 'Side door', taskIds: [second] })
      .expect(200);
    expect(body.visits[0]).toMatchObject({ note: 'Side door', version: 1 });
    expect(await taskRow(store.taskId)).toEqual({ visitId: null, assignedTo: null });
    await planner.delete(`/visits/${visit?.id}`, { version: 0 }).expect(409);
    const empty = await planner.delete(`/visits/${visit?.id}`, { version: 1 }).expect(200);
    expect(empty.body.visits).toEqual([]);
    expect(await taskRow(second)).toEqual({ visitId: null, assignedTo: null });
  });

  it('plans away nothing that was done', async () => {
    const store = await storeAt(-87.1);
    const [visit] = (await add(store)).visits;
    await app.db.owner.query(
      `UPDATE tasks SET outcome = 'done', outcome_at = '2026-06-10T15:00:00Z' WHERE id = $1`,
      { bind: [store.taskId] },
    );
    await planner.delete(`/visits/${visit?.id}`, { version: 0 }).expect(409);
  });

  it('plans again what a past visit left undone', async () => {
    const store = await storeAt(-87.1);
    await add(store);
    app.setNow('2026-06-12T15:00:00Z');
    const again = await add(store, { onDate: '2026-06-12' });
    expect(again.visits[0]?.tasks.map(({ id }) => id)).toEqual([store.taskId]);
    app.setNow('2026-06-10T15:00:00Z');
  });

  it('names the task, the person or the day that does not fit', async () => {
    const [store, other] = [await storeAt(-87.1), await storeAt(-87.2)];
    const stranger = await makePerson(app.db, fleet.organisationId, 'technician', {
      kind: 'store',
      id: other.storeId,
    });
    const refused = async (more: object) =>
      (await planner.post('/visits', wanted(store, more)).expect(422)).body.errors[0];
    expect(await refused({ technicianId: stranger.id })).toMatchObject({
      field: 'technicianId',
      reason: 'not-here',
    });
    expect(await refused({ onDate: '2026-06-09' })).toMatchObject({ field: 'onDate' });
    expect(await refused({ taskIds: [store.taskId, other.taskId] })).toMatchObject({
      field: 'taskIds.1',
      reason: 'unknown',
    });
    await add(store);
    expect(await refused({ onDate: '2026-06-12' })).toMatchObject({
      field: 'taskIds.0',
      reason: 'in-visit',
    });
  });

  it('changes nothing when sent again', async () => {
    const store = await storeAt(-87.1);
    const body = wanted(store);
    const first = await planner.post('/visits', body).expect(200);
    const second = await planner.post('/visits', body).expect(200);
    expect(second.body).toEqual(first.body);
  });

  it('gives a task to one of two planners who want it at once', async () => {
    const store = await storeAt(-87.1);
    const replies = await Promise.all([
      planner.post('/visits', wanted(store)),
      planner.post('/visits', wanted(store, { onDate: '2026-06-12' })),
    ]);
    expect(replies.map(({ status }) => status).sort()).toEqual([200, 422]);
  });

  it('lets nobody plan out of their region, and only counts what stands there', async () => {
    const store = await storeAt(-87.1);
    const elsewhere = await makeFleet(app.db, { organisationId: fleet.organisationId });
    const theirs = await makePerson(app.db, fleet.organisationId, 'regional-facility-manager', {
      kind: 'region',
      id: elsewhere.regionId,
    });
    const stranger = await app.browser().signIn(theirs.email);
    await stranger.post('/visits', wanted(store)).expect(403);
    const route = await add(store);
    await stranger.get(`/routes/${route.id}`).expect(404);
    await stranger.post(`/routes/${route.id}/publish`, { version: route.version }).expect(404);
    await (await app.browser().signIn(technician.email)).get(`/routes?from=${day}`).expect(403);

    await insert(app.db, 'role_grants', {
      organisation_id: fleet.organisationId,
      person_id: technician.id,
      role: 'technician',
      scope_kind: 'region',
      scope_id: elsewhere.regionId,
    });
    const { body } = await stranger.get(`/routes?from=${day}`).expect(200);
    expect(body.routes).toMatchObject([{ visits: [], elsewhere: 1, metres: 0 }]);
  });
});
