import { pino } from 'pino';
import { insert } from '@test/factories/organisation-factory';
import { GenerationBench, generationDay } from '@test/factories/schedule-factory';
import { type TestDatabase, testDatabase } from '@test/support/test-database';
import { type WriteAheadServices, writeTasksAhead } from './write-tasks-ahead';

describe('write tasks ahead', () => {
  let db: TestDatabase;
  let services: WriteAheadServices;

  beforeAll(async () => {
    db = await testDatabase();
    services = { sequelize: db.app, log: pino({ level: 'silent' }) };
  });
  afterAll(() => db.close());

  it('writes every organisation’s tasks, and one that fails keeps no other waiting', async () => {
    const [broken, sound] = [await GenerationBench.make(db), await GenerationBench.make(db)];
    const wrong = await broken.makeRule('FREQ=NEVER');
    await broken.makeSchedule(wrong);
    const right = await sound.makeRule('FREQ=WEEKLY;BYDAY=MO');
    await sound.makeSchedule(right);
    await expect(writeTasksAhead(services, generationDay)).rejects.toThrow(AggregateError);
    expect(await sound.tasks(right)).toHaveLength(5);

    await broken.revise(
      wrong,
      generationDay,
      `recurrence = jsonb_set(recurrence, '{rrules}', '["FREQ=DAILY"]')`,
    );
    await writeTasksAhead(services, generationDay);
    await writeTasksAhead(services, generationDay);
    expect(await broken.tasks(wrong)).toHaveLength(31);
    expect(await sound.tasks(right)).toHaveLength(5);
  });

  it('has a table ready for every month to come and moves early tasks into theirs', async () => {
    const bench = await GenerationBench.make(db);
    const ruleId = await bench.makeRule('FREQ=DAILY;COUNT=1');
    const early = await insert(db, 'tasks', {
      organisation_id: bench.fleet.organisationId,
      schedule_id: await bench.makeSchedule(ruleId),
      rule_id: ruleId,
      rule_revision: 1,
      procedure_id: ruleId,
      store_id: bench.fleet.storeId,
      audience: 'technician',
      occurs_local: '2028-03-31T09:00:00',
      time_zone: 'America/Chicago',
      due_on: '2028-03-31',
      opens_at: '2028-03-31T00:00:00Z',
      due_soon_at: '2028-03-31T00:00:00Z',
      due_at: '2028-03-31T14:00:00Z',
      closes_at: '2028-04-01T05:00:00Z',
      lapses_at: '2028-04-01T05:00:00Z',
      closes_on: '2028-03-31',
      outcome: 'excused',
      outcome_at: '2027-02-01T00:00:00Z',
    });
    const home = async () => {
      const [rows] = await db.owner.query(
        'SELECT tableoid::regclass::text AS "table" FROM tasks WHERE id = $1',
        { bind: [early] },
      );
      return (rows as { table: string }[])[0]?.table;
    };
    expect(await home()).toBe('tasks_beyond');
    await writeTasksAhead(services, new Date('2027-12-15T12:00:00Z'));
    expect(await home()).toBe('tasks_2028_03');
  });
});
