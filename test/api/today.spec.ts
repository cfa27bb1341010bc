import { type Fleet, insert, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { makeWork } from '@test/factories/task-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

interface Stop {
  visitId: string | null;
  minutes: number;
  store: { number: string; rush: object[] };
  tools: { en: string }[];
  tasks: { id: string; state: string; cautions: number; minutes: number }[];
}

describe('a technician’s day', () => {
  let app: TestApp;
  let home: Fleet;
  let away: Fleet;
  let technician: Browser;
  let technicianId: string;
  let colleagueId: string;
  let homeWork: Awaited<ReturnType<typeof makeWork>>;
  let awayWork: Awaited<ReturnType<typeof makeWork>>;
  let occurrence = 10;

  beforeAll(async () => {
    app = await testApp();
    home = await makeFleet(app.db);
    away = await makeFleet(app.db, {
      organisationId: home.organisationId,
      chainId: home.chainId,
      regionId: home.regionId,
    });
    await app.db.owner.query(
      `UPDATE stores SET hours = '{"open": "06:00", "close": "23:00",
         "rush": [{"from": "11:00", "to": "13:30"}], "byDay": {"SU": null}}'
       WHERE id = '${home.storeId}'`,
    );
    homeWork = await makeWork(app.db, home);
    awayWork = await makeWork(app.db, away);
    const region = { kind: 'region', id: home.regionId } as const;
    const person = await makePerson(app.db, home.organisationId, 'technician', region);
    technicianId = person.id;
    technician = await app.browser().signIn(person.email);
    colleagueId = (await makePerson(app.db, home.organisationId, 'technician', region)).id;
  });
  afterAll(() => app.close());

  beforeEach(async () => {
    // Wednesday 10:00 in Chicago.
    app.setNow('2026-06-10T15:00:00Z');
    await app.db.owner.query('DELETE FROM tasks');
    await app.db.owner.query('DELETE FROM visits');
    await app.db.owner.query('DELETE FROM routes');
  });

  const task = (work: typeof homeWork, row: object = {}) => {
    occurrence += 1;
    return work.makeTask({ occurs_local: `2026-06-10T09:${occurrence}:00`, ...row });
  };
  const route = async (onDate: string, stores: readonly string[], published = true) => {
    const own = { organisation_id: home.organisationId };
    const routeId = await insert(app.db, 'routes', {
      ...own,
      technician_id: technicianId,
      on_date: onDate,
      published_at: published ? '2026-06-01T00:00:00Z' : null,
    });
    const visitIds: string[] = [];
    for (const [position, storeId] of stores.entries()) {
      visitIds.push(
        await insert(app.db, 'visits', {
          ...own,
          route_id: routeId,
          store_id: storeId,
          position,
          note: `Stop ${position + 1}`,
        }),
      );
    }
    return visitIds;
  };
  const today = async () =>
    (await technician.get('/today').expect(200)).body as {
      date: string;
      published: boolean;
      visits: Stop[];
      unplanned: Stop[];
      more: number;
    };
  const ids = (stop: Stop | undefined) => stop?.tasks.map(({ id }) => id);

  it('lists the published visits in their order with tasks, minutes and tools', async () => {
    const [first, second] = await route('2026-06-10', [away.storeId, home.storeId]);
    const there = await task(awayWork, { visit_id: first });
    const done = await task(homeWork, {
      visit_id: second,
      outcome: 'done',
      outcome_at: '2026-06-10T14:00:00Z',
    });
    const open = await task(homeWork, { visit_id: second });
    const day = await today();
    expect(day).toMatchObject({ date: '2026-06-10', published: true, unplanned: [], more: 0 });
    expect(day.visits.map(({ visitId }) => visitId)).toEqual([first, second]);
    expect(ids(day.visits[0])).toEqual([there]);
    expect(ids(day.visits[1])?.sort()).toEqual([done, open].sort());
    // The done one takes no more minutes and no tools.
    expect(day.visits[1]?.minutes).toBe(10);
    expect(day.visits[1]?.tools.map(({ en }) => en)).toEqual(['Clamp meter']);
    expect(day.visits[1]?.tasks[0]?.cautions).toBe(1);
  });

  it('shows the rush of that weekday, and none on a day the store stays closed', async () => {
    await route('2026-06-10', [home.storeId]);
    await route('2026-06-14', [home.storeId]);
    expect((await today()).visits[0]?.store.rush).toEqual([{ from: '11:00', to: '13:30' }]);
    app.setNow('2026-06-14T15:00:00Z');
    expect((await today()).visits[0]?.store.rush).toEqual([]);
  });

  it('keeps the technician’s own date when UTC is a day ahead', async () => {
    await route('2026-06-10', [home.storeId]);
    app.setNow('2026-06-11T03:00:00Z');
    expect(await today()).toMatchObject({ date: '2026-06-10', published: true });
    app.setNow('2026-06-11T05:00:00Z');
    expect(await today()).toMatchObject({ date: '2026-06-11', published: false });
  });

  it('says nothing of a route before it is published', async () => {
    const [visitId] = await route('2026-06-10', [home.storeId], false);
    await task(homeWork, { visit_id: visitId });
    expect((await today()).visits).toEqual([]);
  });

  it('lists by store what is due and on no visit, the most urgent first', async () => {
    const later = await task(homeWork);
    const overdue = await task(awayWork, {
      closes_at: '2026-06-10T14:30:00Z',
      due_soon_at: '2026-06-09T05:00:00Z',
    });
    const day = await today();
    expect(day.unplanned.map(ids)).toEqual([[overdue], [later]]);
    expect(day.unplanned[0]?.tasks[0]?.state).toBe('overdue');
    expect(day.unplanned[0]?.visitId).toBeNull();
  });

  it('leaves out a colleague’s tasks, later visits’, lapsed ones and those not due yet', async () => {
    const [tomorrow] = await route('2026-06-11', [home.storeId]);
    const [yesterday] = await route('2026-06-09', [home.storeId]);
    const mine = await task(homeWork, { assigned_to: technicianId });
    const leftOver = await task(homeWork, { visit_id: yesterday });
    await task(homeWork, { assigned_to: colleagueId });
    await task(homeWork, { visit_id: tomorrow });
    await task(homeWork, {
      due_soon_at: '2026-06-11T05:00:00Z',
      due_at: '2026-06-12T14:00:00Z',
    });
    await task(homeWork, {
      closes_at: '2026-06-10T14:30:00Z',
      lapses_at: '2026-06-10T14:45:00Z',
    });
    expect(ids((await today()).unplanned[0])?.sort()).toEqual([mine, leftOver].sort());
  });

  it('is nobody else’s page, and shows nothing of another organisation', async () => {
    await task(homeWork);
    const owner = await makePerson(app.db, home.organisationId, 'account-owner');
    await (await app.browser().signIn(owner.email)).get('/today').expect(403);
    const other = await makeFleet(app.db);
    const stranger = await makePerson(app.db, other.organisationId, 'technician');
    const { body } = await (await app.browser().signIn(stranger.email)).get('/today').expect(200);
    expect(body).toMatchObject({ visits: [], unplanned: [] });
  });
});
