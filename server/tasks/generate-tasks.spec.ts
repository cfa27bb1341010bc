import { inTenant } from '@db/tenant-transaction';
import { syncSchedules } from '@server/programmes/sync-schedules';
import { insert } from '@test/factories/organisation-factory';
import { GenerationBench, generationDay } from '@test/factories/schedule-factory';
import { type TestDatabase, testDatabase } from '@test/support/test-database';

describe('generate tasks', () => {
  let db: TestDatabase;
  let bench: GenerationBench;

  beforeEach(async () => {
    bench = await GenerationBench.make(db);
  });
  beforeAll(async () => {
    db = await testDatabase();
  });
  afterAll(() => db.close());

  it('writes the occurrences from the first day to the horizon, once', async () => {
    const ruleId = await bench.makeRule('FREQ=WEEKLY;BYDAY=MO');
    await bench.makeSchedule(ruleId);
    expect(await bench.generate()).toEqual({ added: 5, moved: 0, withdrawn: 0 });
    expect(await bench.days(ruleId)).toEqual([
      '2026-06-01',
      '2026-06-08',
      '2026-06-15',
      '2026-06-22',
      '2026-06-29',
    ]);
    const before = await bench.tasks(ruleId);
    expect(await bench.generate()).toEqual({ added: 0, moved: 0, withdrawn: 0 });
    expect(await bench.tasks(ruleId)).toEqual(before);
  });

  it('goes on from its bookmark day by day, and an outage loses nothing', async () => {
    const ruleId = await bench.makeRule('FREQ=DAILY');
    await bench.makeSchedule(ruleId);
    expect((await bench.generate()).added).toBe(31);
    expect((await bench.generate(new Date('2026-06-02T15:00:00Z'))).added).toBe(1);
    expect((await bench.generate(new Date('2026-06-20T15:00:00Z'))).added).toBe(18);
    const days = await bench.days(ruleId);
    expect(days).toHaveLength(50);
    expect(new Set(days).size).toBe(50);
  });

  it('opens and closes by the calendar of the store, and lapses when the next one opens', async () => {
    const ruleId = await bench.makeRule('FREQ=WEEKLY;BYDAY=MO');
    await bench.makeSchedule(ruleId);
    await bench.generate();
    const [, second, third] = await bench.tasks(ruleId);
    // Chicago is at UTC-5 in June: Saturday 00:00 to Wednesday 24:00.
    expect(second?.opensAt.toISOString()).toBe('2026-06-06T05:00:00.000Z');
    expect(second?.closesAt.toISOString()).toBe('2026-06-11T05:00:00.000Z');
    expect(second?.lapsesAt).toEqual(third?.opensAt);
  });

  it('knows of the last task at its horizon when the next one would open', async () => {
    const ruleId = await bench.makeRule('FREQ=MONTHLY;BYMONTHDAY=15');
    await bench.makeSchedule(ruleId);
    await bench.generate();
    expect((await bench.tasks(ruleId)).at(-1)?.lapsesAt.toISOString()).toBe(
      '2026-07-13T05:00:00.000Z',
    );
  });

  it('keeps to the days of the enrolment', async () => {
    const ruleId = await bench.makeRule('FREQ=DAILY');
    await bench.makeSchedule(ruleId, { from_on: '2026-06-03', until_on: '2026-06-05' });
    await bench.generate();
    expect(await bench.days(ruleId)).toEqual(['2026-06-03', '2026-06-04', '2026-06-05']);
  });

  it('follows enrolment through the schedules made for it', async () => {
    const ruleId = await bench.makeRule('FREQ=WEEKLY;BYDAY=MO');
    await insert(db, 'enrolments', {
      organisation_id: bench.fleet.organisationId,
      programme_id: bench.programmeId,
      scope_kind: 'store',
      scope_id: bench.fleet.storeId,
      from_on: '2026-01-01',
    });
    await inTenant(db.app, bench.fleet.organisationId, (tenant) =>
      syncSchedules(tenant, generationDay),
    );
    await bench.generate();
    expect((await bench.days(ruleId))[0]).toBe('2026-06-01');
  });
});
