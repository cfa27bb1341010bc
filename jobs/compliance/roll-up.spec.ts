import { type Fleet, makeFleet } from '@test/factories/organisation-factory';
import { makeWork } from '@test/factories/task-factory';
import { type TestApp, testApp } from '@test/support/test-app';
import { rollUpCompliance } from './roll-up';

describe('rolling up compliance', () => {
  let app: TestApp;
  let fleet: Fleet;
  let work: Awaited<ReturnType<typeof makeWork>>;

  beforeAll(async () => {
    app = await testApp();
    fleet = await makeFleet(app.db);
    work = await makeWork(app.db, fleet);
  });
  afterAll(() => app.close());
  beforeEach(async () => {
    for (const table of ['compliance_days', 'stale_days', 'tasks']) {
      await app.db.owner.query(`DELETE FROM ${table}`);
    }
  });

  const run = (at: string) => rollUpCompliance(app.services, new Date(at));
  const days = async () => {
    const [rows] = await app.db.owner.query(
      `SELECT day::text, on_time + late + not_done + excused + covered AS windows, not_done AS "notDone"
       FROM compliance_days ORDER BY day`,
    );
    return rows as { day: string; windows: number; notDone: number }[];
  };
  const markStale = (day: string) =>
    app.db.owner.query(
      `INSERT INTO stale_days (organisation_id, store_id, day) VALUES ($1, $2, $3)`,
      { bind: [fleet.organisationId, fleet.storeId, day] },
    );
  const marks = async () => {
    const [rows] = await app.db.owner.query('SELECT day::text FROM stale_days');
    return rows.length;
  };

  it('counts a window at the instant it closes, not before', async () => {
    await work.makeTask();
    await run('2026-06-13T04:59:59.999Z');
    expect(await days()).toEqual([]);
    await run('2026-06-13T05:00:00Z');
    expect(await days()).toEqual([{ day: '2026-06-12', windows: 1, notDone: 1 }]);
  });

  it('changes nothing when it runs again, nor when four run at once', async () => {
    await work.makeTask();
    await work.makeTask({ occurs_local: '2026-06-10T10:00:00' });
    await run('2026-06-20T00:00:00Z');
    const first = await days();
    expect(first).toEqual([{ day: '2026-06-12', windows: 2, notDone: 2 }]);
    await markStale('2026-06-12');
    await Promise.all([1, 2, 3, 4].map(() => run('2026-06-20T00:00:00Z')));
    expect(await days()).toEqual(first);
    expect(await marks()).toBe(0);
  });

  it('catches up after weeks without a worker', async () => {
    await work.makeTask();
    await run('2026-06-14T00:00:00Z');
    const later = (day: string, closesAt: string) =>
      work.makeTask({
        occurs_local: `${day}T09:00:00`,
        closes_at: closesAt,
        lapses_at: closesAt,
        closes_on: day,
      });
    await later('2026-06-25', '2026-06-26T05:00:00Z');
    await later('2026-07-10', '2026-07-11T05:00:00Z');
    await run('2026-07-20T00:00:00Z');
    expect((await days()).map(({ day }) => day)).toEqual([
      '2026-06-12',
      '2026-06-25',
      '2026-07-10',
    ]);
  });

  it('leaves a mark that a transaction still holds for the next run', async () => {
    await work.makeTask();
    await run('2026-07-20T00:00:00Z');
    await markStale('2026-06-12');
    const writer = await app.db.owner.transaction();
    try {
      // As a request does: finds the day marked already, holds on to the mark, changes the task.
      await app.db.owner.query(
        `INSERT INTO stale_days (organisation_id, store_id, day) VALUES ($1, $2, '2026-06-12')
         ON CONFLICT DO NOTHING`,
        { bind: [fleet.organisationId, fleet.storeId], transaction: writer },
      );
      await app.db.owner.query(
        `UPDATE tasks SET outcome = 'done', outcome_at = '2026-06-11T12:00:00Z'`,
        { transaction: writer },
      );
      await run('2026-07-20T00:00:00Z');
      expect(await marks()).toBe(1);
      await writer.commit();
    } catch (error) {
      await writer.rollback();
      throw error;
    }
    await run('2026-07-20T00:00:00Z');
    expect(await marks()).toBe(0);
    expect(await days()).toEqual([{ day: '2026-06-12', windows: 1, notDone: 0 }]);
  });
});
