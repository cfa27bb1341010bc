import type { Fleet } from '@test/factories/organisation-factory';
import { type TaskWorld, makeTaskWorld } from '@test/factories/task-world';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

describe('calendar and board of tasks', () => {
  let app: TestApp;
  let fleet: Fleet;
  let other: Fleet;
  let manager: Browser;
  let technician: TaskWorld['technician'];
  let ids: TaskWorld['ids'];
  let namesOf: TaskWorld['namesOf'];

  beforeAll(async () => {
    app = await testApp();
    ({ fleet, other, manager, technician, ids, namesOf } = await makeTaskWorld(app));
  });
  afterAll(() => app.close());

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
