import { type Fleet, makeFleet } from '@test/factories/organisation-factory';
import { makeWork } from '@test/factories/task-factory';
import { type TestDatabase, testDatabase } from '@test/support/test-database';

describe('weeks and months of compliance', () => {
  let db: TestDatabase;
  let fleet: Fleet;
  let ruleId: string;

  beforeAll(async () => {
    db = await testDatabase();
    fleet = await makeFleet(db);
    ({ ruleId } = await makeWork(db, fleet));
  });
  afterAll(() => db.close());

  const put = (day: string, onTime: number, notDone: number) =>
    db.owner.query(
      `INSERT INTO compliance_days (organisation_id, store_id, rule_id, day, on_time, late, not_done,
         excused, covered) VALUES ($1, $2, $3, $4, $5, 0, $6, 0, 0)`,
      { bind: [fleet.organisationId, fleet.storeId, ruleId, day, onTime, notDone] },
    );
  const rowsOf = async (table: string, span: string) => {
    const [rows] = await db.owner.query(
      `SELECT ${span}::text AS span, on_time, not_done FROM ${table} ORDER BY 1`,
    );
    return (rows as { span: string; on_time: number; not_done: number }[]).map(
      ({ span: of, on_time, not_done }) => `${of}: ${on_time}, ${not_done}`,
    );
  };

  it('follow the days that are put in and taken out, and go when nothing is left', async () => {
    // A Sunday and the Monday after it; the last day of a month and the first of the next.
    await put('2026-05-31', 2, 1);
    await put('2026-06-01', 3, 0);
    await put('2026-06-07', 4, 1);
    expect(await rowsOf('compliance_weeks', 'week')).toEqual([
      '2026-05-25: 2, 1',
      '2026-06-01: 7, 1',
    ]);
    expect(await rowsOf('compliance_months', 'month')).toEqual([
      '2026-05-01: 2, 1',
      '2026-06-01: 7, 1',
    ]);
    await db.owner.query(`DELETE FROM compliance_days WHERE day <= '2026-06-01'`);
    await put('2026-06-01', 5, 0);
    expect(await rowsOf('compliance_weeks', 'week')).toEqual(['2026-06-01: 9, 1']);
    expect(await rowsOf('compliance_months', 'month')).toEqual(['2026-06-01: 9, 1']);
  });
});
