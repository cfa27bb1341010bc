import { insert } from '@test/factories/organisation-factory';
import { GenerationBench, generationDay } from '@test/factories/schedule-factory';
import { type TestDatabase, testDatabase } from '@test/support/test-database';

describe('generate tasks with many workers', () => {
  let db: TestDatabase;
  let bench: GenerationBench;

  beforeEach(async () => {
    bench = await GenerationBench.make(db);
  });
  beforeAll(async () => {
    db = await testDatabase();
  });
  afterAll(() => db.close());

  const many = async (rule: string, count: number) => {
    const ruleId = await bench.makeRule(rule);
    const own = { organisation_id: bench.fleet.organisationId };
    for (let i = 0; i < count; i += 1) {
      const unit_id = await insert(db, 'units', {
        ...own,
        store_id: bench.fleet.storeId,
        tag: `M-${i}`,
        kind: 'built-in',
        vats: 1,
      });
      await bench.makeSchedule(ruleId, { unit_id });
    }
    return ruleId;
  };
  const perSchedule = async (ruleId: string) => {
    const counts = new Map<string, number>();
    for (const { scheduleId } of await bench.tasks(ruleId)) {
      counts.set(scheduleId, (counts.get(scheduleId) ?? 0) + 1);
    }
    return [...counts.values()];
  };

  it('doubles nothing and leaves nothing out when several generate at once', async () => {
    const ruleId = await many('FREQ=DAILY', 24);
    const counts = await Promise.all(
      [3, 5, 7].map((batchSize) => bench.generate(generationDay, { batchSize })),
    );
    // What one worker passed over, another held; it is done when both are.
    expect(counts.reduce((sum, { added }) => sum + added, 0)).toBe(24 * 31);
    expect(await perSchedule(ruleId)).toEqual(Array(24).fill(31));
  });

  it('goes on where one was ended in the middle of a batch', async () => {
    const ruleId = await many('FREQ=DAILY', 12);
    let batches = 0;
    const dying = bench.generate(generationDay, {
      batchSize: 4,
      onBatch: () => {
        batches += 1;
        if (batches === 2) throw new Error('power cut');
      },
    });
    await expect(dying).rejects.toThrow('power cut');
    expect(await perSchedule(ruleId)).toEqual(Array(4).fill(31));
    await bench.generate();
    expect(await perSchedule(ruleId)).toEqual(Array(12).fill(31));
  });

  it('survives an edit of the rule between two batches of another worker', async () => {
    const ruleId = await many('FREQ=DAILY', 8);
    await bench.generate(generationDay, {
      batchSize: 4,
      onBatch: async () => {
        await bench.revise(ruleId, generationDay, 'horizon_days = 10');
      },
    });
    await bench.generate();
    expect(await perSchedule(ruleId)).toEqual(Array(8).fill(11));
  });

  it('stops between two batches when told to', async () => {
    const ruleId = await many('FREQ=DAILY', 6);
    const stopping = new AbortController();
    await bench.generate(generationDay, {
      batchSize: 2,
      signal: stopping.signal,
      onBatch: () => stopping.abort(),
    });
    expect(await perSchedule(ruleId)).toEqual([31, 31]);
  });
});
