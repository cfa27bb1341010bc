import { type Fleet, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { makeWork } from '@test/factories/task-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

/** Moves the times of the factory's task, due on Wednesday 10 June 2026, by whole days. */
function daysLater(days: number, more: object = {}): object {
  const at = (text: string) => new Date(Date.parse(text) + days * 86_400_000).toISOString();
  const on = (text: string) => at(`${text}T00:00:00Z`).slice(0, 10);
  return {
    occurs_local: `${on('2026-06-10')}T09:00:00`,
    due_on: on('2026-06-10'),
    opens_at: at('2026-06-08T05:00:00Z'),
    due_soon_at: at('2026-06-09T05:00:00Z'),
    due_at: at('2026-06-10T14:00:00Z'),
    closes_at: at('2026-06-13T05:00:00Z'),
    lapses_at: at('2026-06-16T05:00:00Z'),
    closes_on: on('2026-06-12'),
    ...more,
  };
}

describe('lists of tasks', () => {
  let app: TestApp;
  let fleet: Fleet;
  let other: Fleet;
  let manager: Browser;
  let technician: { id: string; email: string };
  const ids: Record<string, string> = {};

  // Two stores of one region, and one store of another region that the manager does not see.
  beforeAll(async () => {
    app = await testApp();
    app.setNow('2026-06-09T15:00:00Z');
    fleet = await makeFleet(app.db);
    const { organisationId, regionId, chainId } = fleet;
    other = await makeFleet(app.db, { organisationId, regionId, chainId });
    const elsewhere = await makeFleet(app.db, { organisationId, chainId });
    const region = { kind: 'region', id: regionId } as const;
    const person = await makePerson(app.db, organisationId, 'regional-facility-manager', region);
    manager = await app.browser().signIn(person.email);
    technician = await makePerson(app.db, organisationId, 'technician', region);
    const own = await makeWork(app.db, fleet);
    const others = await makeWork(app.db, other, 'store');
    const hidden = await makeWork(app.db, elsewhere);
    const done = { outcome: 'done', outcome_by: technician.id };
    ids['late'] = await own.makeTask(
      daysLater(-35, { ...done, outcome_at: '2026-05-10T12:00:00Z' }),
    );
    ids['inTime'] = await own.makeTask(
      daysLater(-28, { ...done, outcome_at: '2026-05-13T12:00:00Z' }),
    );
    ids['missed'] = await own.makeTask(daysLater(-14));
    ids['excused'] = await own.makeTask(
      daysLater(-7, { outcome: 'excused', outcome_at: '2026-06-01T12:00:00Z' }),
    );
    ids['overdue'] = await others.makeTask(daysLater(-5));
    ids['dueSoon'] = await own.makeTask(daysLater(0, { assigned_to: technician.id }));
    ids['open'] = await own.makeTask(daysLater(1));
    ids['planned'] = await others.makeTask(daysLater(14));
    ids['hidden'] = await hidden.makeTask(daysLater(0));
    ids['ownRule'] = own.ruleId;
    ids['othersRule'] = others.ruleId;
  });
  afterAll(() => app.close());

  const namesOf = (rows: readonly { id: string }[]) =>
    rows.map(({ id }) => Object.keys(ids).find((name) => ids[name] === id));
  const list = async (query: string) => {
    const { body } = await manager.get(`/tasks?${query}`).expect(200);
    return namesOf(body.rows);
  };

  it('shows the tasks in sight, the first due first, each in its state', async () => {
    const { body } = await manager.get('/tasks').expect(200);
    expect(namesOf(body.rows)).toEqual([
      'late',
      'inTime',
      'missed',
      'excused',
      'overdue',
      'dueSoon',
      'open',
      'planned',
    ]);
    expect(body.rows.map((it: { state: string }) => it.state)).toEqual([
      'done-late',
      'done',
      'missed',
      'excused',
      'overdue',
      'due-soon',
      'open',
      'planned',
    ]);
    expect(body).toMatchObject({ total: 8, more: false });
    expect(body.rows[5]).toMatchObject({
      dueLocal: '2026-06-10T09:00:00',
      timeZone: 'America/Chicago',
      procedureTitle: { en: 'Motor current' },
      unitTag: 'F-1',
      assignee: { id: technician.id },
      end: null,
      mayPlan: true,
    });
  });

  it.each([
    ['state=due-soon,overdue', ['overdue', 'dueSoon']],
    ['end=late,notDone', ['late', 'missed', 'overdue']],
    ['end=onTime&closesFrom=2026-05-15&closesTo=2026-05-15', ['inTime']],
    ['end=onTime&closesFrom=2026-05-16', []],
    ['from=2026-06-10&to=2026-06-11', ['dueSoon', 'open']],
    ['unassigned=yes&state=open,due-soon', ['open']],
    ['audience=store&sort=-due', ['planned', 'overdue']],
    ['q=f-1%20motor', []],
    ['state=', []],
  ])('finds by %s', async (query, expected) => {
    expect(await list(query)).toEqual(expected);
  });

  it('finds by places, people, rules and words', async () => {
    expect(await list(`store=${other.storeId}`)).toEqual(['overdue', 'planned']);
    expect(await list(`technician=${technician.id}`)).toEqual(['dueSoon']);
    expect(await list(`rule=${ids['othersRule']}&sort=-closes`)).toEqual(['planned', 'overdue']);
    expect(await list(`unit=${fleet.unitId}&state=open`)).toEqual(['open']);
    const { body } = await manager.get('/tasks?state=open').expect(200);
    const words = `${body.rows[0].storeNumber} f-1`;
    expect(await list(`state=open&q=${encodeURIComponent(words)}`)).toEqual(['open']);
  });

  it('pages, and refuses to page for ever', async () => {
    expect(await list('page=2&pageSize=3')).toEqual(['excused', 'overdue', 'dueSoon']);
    const { body } = await manager.get('/tasks?page=9000&pageSize=50').expect(422);
    expect(body.errors[0].field).toBe('page');
  });

  it('hides single tasks of other regions', async () => {
    const { body } = await manager.get(`/tasks/${ids['overdue']}`).expect(200);
    expect(body.state).toBe('overdue');
    await manager.get(`/tasks/${ids['hidden']}`).expect(404);
  });

  it('counts a month day by day and gives the tasks of one', async () => {
    const { body } = await manager.get('/tasks/calendar?month=2026-06&day=2026-06-10').expect(200);
    expect(body.days).toHaveLength(30);
    expect(body.today).toBe('2026-06-09');
    expect(body.days.filter((it: { total: number }) => it.total > 0)).toEqual([
      { date: '2026-06-03', total: 1, counts: { excused: 1 } },
      { date: '2026-06-05', total: 1, counts: { overdue: 1 } },
      { date: '2026-06-10', total: 1, counts: { 'due-soon': 1 } },
      { date: '2026-06-11', total: 1, counts: { open: 1 } },
      { date: '2026-06-24', total: 1, counts: { planned: 1 } },
    ]);
    expect(namesOf(body.tasks)).toEqual(['dueSoon']);
    const filtered = await manager.get(`/tasks/calendar?month=2026-06&technician=${technician.id}`);
    expect(filtered.body.days.filter((it: { total: number }) => it.total > 0)).toHaveLength(1);
    const { body: problem } = await manager.get('/tasks/calendar?month=2026-13').expect(422);
    expect(problem.errors[0].field).toBe('month');
  });

  describe('board', () => {
    beforeAll(async () => {
      const count = (storeId: string, day: string, row: object) =>
        app.db.owner.query(
          `INSERT INTO compliance_days (organisation_id, store_id, rule_id, day, on_time, late,
             not_done, excused, covered)
           SELECT $1, $2, $3, $4, on_time, late, not_done, 5, 5
           FROM jsonb_to_record($5) AS it (on_time int, late int, not_done int)`,
          {
            bind: [
              fleet.organisationId,
              storeId,
              ids[storeId === fleet.storeId ? 'ownRule' : 'othersRule'],
              day,
              JSON.stringify(row),
            ],
          },
        );
      await count(fleet.storeId, '2026-05-04', { on_time: 1, late: 0, not_done: 0 });
      await count(fleet.storeId, '2026-06-07', { on_time: 1, late: 1, not_done: 2 });
      await count(other.storeId, '2026-06-08', { on_time: 3, late: 0, not_done: 1 });
    });

    it('shows each store over five weeks, with thirteen weeks of its rate', async () => {
      const { body } = await manager.get('/tasks/board').expect(200);
      expect(body).toMatchObject({ from: '2026-05-25', to: '2026-06-28', today: '2026-06-09' });
      const [first, second] = body.rows;
      expect(first).toMatchObject({ storeId: fleet.storeId, rate: 2 / 5, overdue: 0 });
      expect(first.weeks).toHaveLength(13);
      // Of this week (the thirteenth) nothing is counted yet; Sunday ended the week before.
      expect(first.weeks.slice(7)).toEqual([1, null, null, null, 0.25, null]);
      expect(first.cells).toEqual([
        { date: '2026-05-27', counts: { missed: 1 } },
        { date: '2026-06-03', counts: { excused: 1 } },
        { date: '2026-06-10', counts: { 'due-soon': 1 } },
        { date: '2026-06-11', counts: { open: 1 } },
      ]);
      expect(second).toMatchObject({ storeId: other.storeId, rate: 0.75, overdue: 1 });
      expect(body.total).toBe(2);
      expect(body.figures).toEqual({
        rate: 0.5,
        onTime: 4,
        counted: 8,
        overdue: 1,
        oldestOverdueOn: '2026-06-07',
        dueThisWeek: 2,
      });
    });

    it('sorts by what needs attention, pages by store and follows its filters', async () => {
      const stores = async (query: string) => {
        const { body } = await manager.get(`/tasks/board?${query}`).expect(200);
        return body.rows.map((it: { storeId: string }) => it.storeId);
      };
      expect(await stores('sort=overdue')).toEqual([other.storeId, fleet.storeId]);
      expect(await stores('sort=rate')).toEqual([fleet.storeId, other.storeId]);
      expect(await stores('page=2&pageSize=1')).toEqual([other.storeId]);
      expect(await stores(`rule=${ids['othersRule']}`)).toEqual([other.storeId]);
      expect(await stores(`technician=${technician.id}`)).toEqual([fleet.storeId]);
      const { body } = await manager.get('/tasks/board?audience=store');
      expect(body.rows[0].cells).toEqual([]);
      expect(body.figures).toMatchObject({ rate: 0.75, overdue: 1, dueThisWeek: 0 });
    });

    it('is not for technicians', async () => {
      const browser = await app.browser().signIn(technician.email);
      await browser.get('/tasks/board').expect(403);
    });
  });

  it('never shows another organisation’s tasks', async () => {
    const foreign = await makeFleet(app.db);
    const person = await makePerson(app.db, foreign.organisationId, 'administrator');
    const browser = await app.browser().signIn(person.email);
    const { body } = await browser.get('/tasks').expect(200);
    expect(body.total).toBe(0);
    await browser.get(`/tasks/${ids['open']}`).expect(404);
  });
});
