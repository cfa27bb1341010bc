import { randomUUID } from 'node:crypto';
import { type Fleet, insert, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { makeWork } from '@test/factories/task-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

interface Sheet {
  task: { id: string };
}

describe('the checks of a shift', () => {
  let app: TestApp;
  let fleet: Fleet;
  let work: Awaited<ReturnType<typeof makeWork>>;
  let manager: Browser;
  let occurrence = 10;

  beforeAll(async () => {
    app = await testApp();
    fleet = await makeFleet(app.db);
    work = await makeWork(app.db, fleet, 'store');
    const store = { kind: 'store', id: fleet.storeId } as const;
    const person = await makePerson(app.db, fleet.organisationId, 'store-manager', store);
    manager = await app.browser().signIn(person.email);
  });
  afterAll(() => app.close());

  beforeEach(async () => {
    app.setNow('2026-06-10T15:00:00Z');
    await app.db.owner.query('DELETE FROM readings');
    await app.db.owner.query('DELETE FROM findings');
    await app.db.owner.query('DELETE FROM inspections');
    await app.db.owner.query('DELETE FROM tasks');
  });

  const makeCheck = (row: object = {}) => {
    occurrence += 1;
    return work.makeTask({ occurs_local: `2026-06-10T09:${occurrence}:00`, ...row });
  };
  const check = (taskId: string, ok = true, amps = 5) => ({
    taskId,
    inspection: {
      id: randomUUID(),
      procedureVersionId: work.procedureVersionId,
      startedAt: null,
      note: '',
      readings: [
        { step: 'vents', kind: 'check', ok },
        { step: 'amps', kind: 'number', value: amps },
      ],
    },
  });
  const shift = async () => (await manager.get('/shift').expect(200)).body;

  it('shows what is open now, soonest closing first, and nothing that is not', async () => {
    const later = await makeCheck();
    const sooner = await makeCheck({ closes_at: '2026-06-10T20:00:00Z' });
    await makeCheck({ opens_at: '2026-06-10T15:00:01Z', due_soon_at: '2026-06-10T16:00:00Z' });
    await makeCheck({
      due_at: '2026-06-10T13:00:00Z',
      closes_at: '2026-06-10T14:00:00Z',
      lapses_at: '2026-06-10T15:00:00Z',
    });
    const { waiting } = await shift();
    expect(waiting.map(({ task }: Sheet) => task.id)).toEqual([sooner, later]);
  });

  it('acknowledges several at once in the name of who is signed in', async () => {
    const ids = [await makeCheck(), await makeCheck()];
    const checks = ids.map((id) => check(id));
    const { body } = await manager.post('/shift/acknowledgements', { checks }).expect(200);
    expect(body).toEqual({ acknowledged: 2, findings: 0 });
    const { waiting, done } = await shift();
    expect(waiting).toEqual([]);
    expect(done.map(({ taskId }: { taskId: string }) => taskId).sort()).toEqual([...ids].sort());
    expect(done[0]).toMatchObject({ onTime: true, by: expect.stringMatching(/^Person/) });
  });

  it('acknowledges all or none', async () => {
    const good = check(await makeCheck());
    const bad = check(await makeCheck());
    bad.inspection.readings.pop();
    await manager.post('/shift/acknowledgements', { checks: [good, bad] }).expect(422);
    expect((await shift()).waiting).toHaveLength(2);
  });

  it('forgets yesterday’s at the store’s own midnight', async () => {
    const id = await makeCheck();
    await manager.post('/shift/acknowledgements', { checks: [check(id)] }).expect(200);
    app.setNow('2026-06-11T04:59:59Z');
    expect((await shift()).done).toHaveLength(1);
    app.setNow('2026-06-11T05:00:00Z');
    expect((await shift()).done).toHaveLength(0);
  });

  it('can be taken back by who acknowledged', async () => {
    const id = await makeCheck();
    await manager.post('/shift/acknowledgements', { checks: [check(id)] }).expect(200);
    await manager.delete(`/tasks/${id}/inspection`).expect(200);
    expect((await shift()).waiting).toHaveLength(1);
  });

  it('never takes a technician’s task as the store’s own', async () => {
    const theirs = await makeWork(app.db, fleet);
    const taskId = await theirs.makeTask();
    await manager.post('/shift/acknowledgements', { checks: [check(taskId)] }).expect(403);
  });

  it('tells who comes when, once that is published', async () => {
    const own = { organisation_id: fleet.organisationId };
    const region = { kind: 'region', id: fleet.regionId } as const;
    const technician = await makePerson(app.db, fleet.organisationId, 'technician', region, {
      name: 'Ines Vale',
    });
    const makeVisit = async (onDate: string, published: boolean) => {
      const routeId = await insert(app.db, 'routes', {
        ...own,
        technician_id: technician.id,
        on_date: onDate,
        published_at: published ? '2026-06-01T00:00:00Z' : null,
      });
      return insert(app.db, 'visits', {
        ...own,
        route_id: routeId,
        store_id: fleet.storeId,
        position: 0,
      });
    };
    await makeVisit('2026-06-09', true);
    await makeVisit('2026-06-12', false);
    await makeVisit('2026-06-24', true);
    const id = await makeVisit('2026-06-11', true);
    const theirs = await makeWork(app.db, fleet);
    await theirs.makeTask({ visit_id: id });
    expect((await shift()).visits).toEqual([
      { id, onDate: '2026-06-11', technician: 'Ines Vale', note: '', tasks: 1, minutes: 10 },
    ]);
  });

  it('is of no other store', async () => {
    await makeCheck();
    const neighbour = await makeFleet(app.db, {
      organisationId: fleet.organisationId,
      chainId: fleet.chainId,
      regionId: fleet.regionId,
    });
    const store = { kind: 'store', id: neighbour.storeId } as const;
    const person = await makePerson(app.db, fleet.organisationId, 'shift-lead', store);
    const lead = await app.browser().signIn(person.email);
    const own = await lead.get('/shift').expect(200);
    expect(own.body.waiting).toEqual([]);
    const asked = await lead.get(`/shift?store=${fleet.storeId}`).expect(200);
    expect(asked.body.storeId).toBe(neighbour.storeId);
  });
});
