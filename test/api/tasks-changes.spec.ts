import { randomUUID } from 'node:crypto';
import { type Fleet, insert, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { makeWork } from '@test/factories/task-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

type Work = Awaited<ReturnType<typeof makeWork>>;

/** The factory's task is due on Wednesday 2026-06-10 and closes at the end of Friday the 12th. */
describe('changing many tasks', () => {
  let app: TestApp;
  let fleet: Fleet;
  let planner: { id: string; email: string };
  let manager: Browser;
  let technician: { id: string; email: string };
  let work: Work;
  let elsewhere: Fleet;

  beforeAll(async () => {
    app = await testApp();
    fleet = await makeFleet(app.db);
    const { organisationId, regionId } = fleet;
    const region = { kind: 'region', id: regionId } as const;
    planner = await makePerson(app.db, organisationId, 'regional-facility-manager', region);
    technician = await makePerson(app.db, organisationId, 'technician', region);
    manager = await app.browser().signIn(planner.email);
    elsewhere = await makeFleet(app.db, { organisationId });
  });
  beforeEach(async () => {
    app.setNow('2026-06-09T15:00:00Z');
    const unitId = await insert(app.db, 'units', {
      organisation_id: fleet.organisationId,
      store_id: fleet.storeId,
      tag: `F-${randomUUID().slice(0, 8)}`,
      kind: 'built-in',
      vats: 2,
    });
    work = await makeWork(app.db, { ...fleet, unitId });
  });
  afterAll(() => app.close());

  const these = (...ids: string[]) => ({
    kind: 'tasks',
    tasks: ids.map((id) => ({ id, version: 0 })),
  });
  const taskOf = async (id: string) => (await manager.get(`/tasks/${id}`).expect(200)).body;
  const leftOf = (body: { results: { taskId: string; left: string | null }[] }) =>
    Object.fromEntries(body.results.map(({ taskId, left }) => [taskId, left]));
  const staleDays = async () => {
    const [rows] = await app.db.owner.query('DELETE FROM stale_days RETURNING day');
    return (rows as { day: string }[]).map(({ day }) => day).sort();
  };
  const events = async (id: string) => {
    const [rows] = await app.db.owner.query(
      'SELECT action, detail FROM audit_events WHERE subject_id = $1 ORDER BY id',
      { bind: [id] },
    );
    return rows as { action: string; detail: object }[];
  };

  it('assigns what may be assigned, and says of the rest why not', async () => {
    const mine = await work.makeTask();
    const done = await work.makeTask({
      occurs_local: '2026-06-11T09:00:00',
      outcome: 'done',
      outcome_at: '2026-06-09T12:00:00Z',
    });
    const store = await (await makeWork(app.db, fleet, 'store')).makeTask();
    const hidden = await (await makeWork(app.db, elsewhere)).makeTask();
    const id = randomUUID();
    const body = {
      id,
      selection: these(mine, done, store, hidden),
      technicianId: technician.id,
    };
    const first = await manager.post('/tasks/assign', body).expect(200);
    expect(first.body.changed).toBe(1);
    expect(leftOf(first.body)).toEqual({
      [mine]: null,
      [done]: 'decided',
      [store]: 'for-the-store',
      [hidden]: 'not-found',
    });
    expect((await taskOf(mine)).assignee.id).toBe(technician.id);
    expect(await events(mine)).toEqual([
      { action: 'assigned', detail: { technicianId: technician.id, changeId: id } },
    ]);
    // The same change sent again changes nothing.
    const again = await manager.post('/tasks/assign', body).expect(200);
    expect(again.body).toEqual(first.body);
    expect(await taskOf(mine)).toMatchObject({ version: 1 });
  });

  it('does not send somebody where they do not work, nor breaks a published route', async () => {
    const task = await work.makeTask();
    const other = await makePerson(app.db, fleet.organisationId, 'technician', {
      kind: 'region',
      id: elsewhere.regionId,
    });
    const assign = (technicianId: string, version: number) =>
      manager.post('/tasks/assign', {
        id: randomUUID(),
        selection: { kind: 'tasks', tasks: [{ id: task, version }] },
        technicianId,
      });
    expect(leftOf((await assign(other.id, 0)).body)).toEqual({ [task]: 'not-their-store' });
    const unknown = await assign(randomUUID(), 0).expect(422);
    expect(unknown.body.errors[0].field).toBe('technicianId');

    const own = { organisation_id: fleet.organisationId };
    const routeId = await insert(app.db, 'routes', {
      ...own,
      technician_id: technician.id,
      on_date: '2026-06-10',
    });
    const visitId = await insert(app.db, 'visits', {
      ...own,
      route_id: routeId,
      store_id: fleet.storeId,
      position: 0,
    });
    await app.db.owner.query('UPDATE tasks SET visit_id = $1 WHERE id = $2', {
      bind: [visitId, task],
    });
    await app.db.owner.query('UPDATE routes SET published_at = now()');
    expect(leftOf((await assign(technician.id, 0)).body)).toEqual({ [task]: 'on-published-route' });
    // While the route is a draft the task leaves it, and comes back to it when that is undone.
    await app.db.owner.query('UPDATE routes SET published_at = NULL');
    const { body } = await assign(technician.id, 0).expect(200);
    expect(await taskOf(task)).toMatchObject({ visitOn: null, version: 1 });
    await manager.post(`/tasks/changes/${body.id}/undo`).expect(200);
    expect(await taskOf(task)).toMatchObject({ visitOn: '2026-06-10', assignee: null });
  });

  it('excuses all that fit a filter, has closed days counted again, and takes it back', async () => {
    const closed = await work.makeTask({
      occurs_local: '2026-06-01T09:00:00',
      due_on: '2026-06-01',
      opens_at: '2026-05-30T05:00:00Z',
      due_soon_at: '2026-05-31T05:00:00Z',
      due_at: '2026-06-01T14:00:00Z',
      closes_at: '2026-06-04T05:00:00Z',
      closes_on: '2026-06-03',
    });
    const open = await work.makeTask();
    const selection = { kind: 'matching', filters: { rule: work.ruleId }, seen: 2 };
    const noReason = { id: randomUUID(), selection, reason: ' ' };
    const refused = await manager.post('/tasks/excuse', noReason).expect(422);
    expect(refused.body.errors[0].field).toBe('reason');
    const { body } = await manager
      .post('/tasks/excuse', { id: randomUUID(), selection, reason: 'Store closed for a refit' })
      .expect(200);
    expect(body.changed).toBe(2);
    expect(await taskOf(closed)).toMatchObject({
      state: 'excused',
      end: 'excused',
      outcomeReason: 'Store closed for a refit',
      mayPlan: false,
    });
    expect(await staleDays()).toEqual(['2026-06-03']);

    const undone = await manager.post(`/tasks/changes/${body.id}/undo`).expect(200);
    expect(undone.body).toMatchObject({ changed: 2, undoneAt: '2026-06-09T15:00:00.000Z' });
    expect(await taskOf(closed)).toMatchObject({ state: 'overdue', outcomeBy: null });
    expect(await taskOf(open)).toMatchObject({ state: 'due-soon', outcomeReason: null });
    expect(await staleDays()).toEqual(['2026-06-03']);
    await manager.post(`/tasks/changes/${body.id}/undo`).expect(409);
    expect((await events(open)).map(({ action }) => action)).toEqual([
      'excused',
      'change-taken-back',
    ]);
  });

  it('changes nothing when more tasks fit than were seen', async () => {
    const task = await work.makeTask();
    await work.makeTask({ occurs_local: '2026-06-11T09:00:00' });
    const selection = { kind: 'matching', filters: { rule: work.ruleId }, seen: 1 };
    const { body } = await manager
      .post('/tasks/excuse', { id: randomUUID(), selection, reason: 'Closed' })
      .expect(409);
    expect(body.code).toBe('more-than-seen');
    expect((await taskOf(task)).state).toBe('due-soon');
  });

  it('takes back only where nothing happened since, and only by who did it', async () => {
    const [touched, left] = [
      await work.makeTask(),
      await work.makeTask({ occurs_local: '2026-06-11T09:00:00' }),
    ];
    const id = randomUUID();
    const body = { id, selection: these(touched, left), technicianId: technician.id };
    await manager.post('/tasks/assign', body).expect(200);
    await app.db.owner.query('UPDATE tasks SET version = version + 1 WHERE id = $1', {
      bind: [touched],
    });
    const colleague = await makePerson(app.db, fleet.organisationId, 'regional-facility-manager');
    const other = await app.browser().signIn(colleague.email);
    await other.post(`/tasks/changes/${id}/undo`).expect(404);
    const undone = await manager.post(`/tasks/changes/${id}/undo`).expect(200);
    expect(leftOf(undone.body)).toEqual({ [touched]: 'changed-meanwhile', [left]: null });
    expect((await taskOf(left)).assignee).toBeNull();
    expect((await taskOf(touched)).assignee.id).toBe(technician.id);
  });

  it('is not for technicians, and not for regions of others', async () => {
    const task = await work.makeTask();
    const hands = await app.browser().signIn(technician.email);
    const body = { id: randomUUID(), selection: these(task), reason: 'No' };
    await hands.post('/tasks/excuse', body).expect(403);
    // Sees the store through one role and plans only elsewhere through another.
    const both = await makePerson(app.db, fleet.organisationId, 'technician');
    await insert(app.db, 'role_grants', {
      organisation_id: fleet.organisationId,
      person_id: both.id,
      role: 'regional-facility-manager',
      scope_kind: 'region',
      scope_id: elsewhere.regionId,
    });
    const browser = await app.browser().signIn(both.email);
    const reply = await browser.post('/tasks/excuse', body).expect(200);
    expect(leftOf(reply.body)).toEqual({ [task]: 'not-allowed' });
  });
});
