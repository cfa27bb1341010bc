import { insert, makeFleet } from '@test/factories/organisation-factory';
import { GenerationBench, generationDay } from '@test/factories/schedule-factory';
import { type TestDatabase, testDatabase } from '@test/support/test-database';

const rrules = (rrule: string) =>
  `recurrence = jsonb_set(recurrence, '{rrules}', '["${rrule}"]'::jsonb)`;

describe('bring tasks in line', () => {
  let db: TestDatabase;
  let bench: GenerationBench;

  beforeEach(async () => {
    bench = await GenerationBench.make(db);
  });
  beforeAll(async () => {
    db = await testDatabase();
  });
  afterAll(() => db.close());

  it('replaces untouched tasks of an edited rule and leaves what was begun or decided', async () => {
    const ruleId = await bench.makeRule('FREQ=WEEKLY;BYDAY=MO');
    await bench.makeSchedule(ruleId);
    await bench.generate();
    const before = await bench.tasks(ruleId);
    await db.owner.query(
      `UPDATE tasks SET outcome = 'excused', outcome_at = now(), outcome_reason = 'Closed'
       WHERE id = $1`,
      { bind: [before[4]?.id] },
    );
    await bench.revise(ruleId, generationDay, rrules('FREQ=WEEKLY;BYDAY=MO,TH'));
    await bench.revise(ruleId, generationDay, rrules('FREQ=WEEKLY;BYDAY=TH'));
    expect(await bench.generate()).toEqual({ added: 4, moved: 0, withdrawn: 3 });
    const after = await bench.tasks(ruleId);
    expect(after.map((it) => `${it.occursLocal.slice(5, 10)} r${it.revision}`)).toEqual([
      '06-01 r1',
      '06-04 r3',
      '06-11 r3',
      '06-18 r3',
      '06-25 r3',
      '06-29 r1',
    ]);
    expect(await bench.generate()).toEqual({ added: 0, moved: 0, withdrawn: 0 });
  });

  it('moves the window of an untouched task and keeps its identity and its technician', async () => {
    const ruleId = await bench.makeRule('FREQ=WEEKLY;BYDAY=MO');
    await bench.makeSchedule(ruleId);
    await bench.generate();
    const before = await bench.tasks(ruleId);
    await db.owner.query(`UPDATE tasks SET assigned_to = id WHERE rule_id = $1`, {
      bind: [ruleId],
    });
    await bench.revise(
      ruleId,
      generationDay,
      `time_window = '{"kind":"days","before":1,"after":0,"late":0,"dueSoon":1}'`,
    );
    expect(await bench.generate()).toEqual({ added: 0, moved: 4, withdrawn: 0 });
    const after = await bench.tasks(ruleId);
    expect(after.map(({ id }) => id)).toEqual(before.map(({ id }) => id));
    expect(after[0]?.closesAt).toEqual(before[0]?.closesAt);
    expect(after[1]?.opensAt.toISOString()).toBe('2026-06-07T05:00:00.000Z');
    const [assigned] = await db.owner.query(
      `SELECT FROM tasks WHERE rule_id = $1 AND assigned_to = id`,
      { bind: [ruleId] },
    );
    expect(assigned).toHaveLength(5);
  });

  it('leaves a task that stands on a published route, and only that', async () => {
    const ruleId = await bench.makeRule('FREQ=WEEKLY;BYDAY=MO');
    await bench.makeSchedule(ruleId);
    await bench.generate();
    const own = { organisation_id: bench.fleet.organisationId };
    const technician_id = await insert(db, 'people', { ...own, name: 'T', time_zone: 'UTC' });
    for (const [index, published] of [
      [2, true],
      [3, false],
    ] as const) {
      const route_id = await insert(db, 'routes', {
        ...own,
        technician_id,
        on_date: `2026-06-${index}`,
        published_at: published ? generationDay : null,
      });
      const visit = { ...own, route_id, store_id: bench.fleet.storeId, position: 0 };
      await db.owner.query('UPDATE tasks SET visit_id = $2 WHERE id = $1', {
        bind: [(await bench.tasks(ruleId))[index]?.id, await insert(db, 'visits', visit)],
      });
    }
    await db.owner.query('UPDATE schedules SET ended_at = now() WHERE rule_id = $1', {
      bind: [ruleId],
    });
    await bench.generate();
    expect(await bench.days(ruleId)).toEqual(['2026-06-01', '2026-06-15']);
  });

  it('takes back the untouched tasks of an ended schedule and writes them again on its return', async () => {
    const ruleId = await bench.makeRule('FREQ=WEEKLY;BYDAY=MO');
    await bench.makeSchedule(ruleId);
    await bench.generate();
    await db.owner.query('UPDATE schedules SET ended_at = now() WHERE rule_id = $1', {
      bind: [ruleId],
    });
    expect((await bench.generate()).withdrawn).toBe(4);
    expect(await bench.days(ruleId)).toEqual(['2026-06-01']);
    expect(await bench.generate()).toEqual({ added: 0, moved: 0, withdrawn: 0 });
    await db.owner.query(
      `UPDATE schedules SET ended_at = NULL, generated_to = NULL, from_on = '2026-06-10'
       WHERE rule_id = $1`,
      { bind: [ruleId] },
    );
    await bench.generate();
    expect(await bench.days(ruleId)).toEqual([
      '2026-06-01',
      '2026-06-15',
      '2026-06-22',
      '2026-06-29',
    ]);
  });

  it('moves untouched tasks with their unit to another store and zone', async () => {
    const ruleId = await bench.makeRule('FREQ=WEEKLY;BYDAY=MO');
    await bench.makeSchedule(ruleId);
    await bench.generate();
    const far = await makeFleet(db, { organisationId: bench.fleet.organisationId });
    await db.owner.query(`UPDATE stores SET time_zone = 'America/Phoenix' WHERE id = $1`, {
      bind: [far.storeId],
    });
    await db.owner.query(
      'UPDATE schedules SET store_id = $2, generated_to = NULL WHERE rule_id = $1',
      { bind: [ruleId, far.storeId] },
    );
    expect((await bench.generate()).moved).toBe(4);
    const [, next] = await bench.tasks(ruleId);
    expect(next?.opensAt.toISOString()).toBe('2026-06-06T07:00:00.000Z');
  });
});
