import { pino } from 'pino';
import { type TestDatabase, testDatabase } from '@test/support/test-database';
import { runDue } from './run-due';
import type { WorkerServices } from './services';
import type { Job } from './timetable';

describe('run due', () => {
  let db: TestDatabase;
  let services: WorkerServices;

  beforeAll(async () => {
    db = await testDatabase();
    services = { sequelize: db.app, log: pino({ level: 'silent' }) } as unknown as WorkerServices;
  });
  afterAll(() => db.close());

  // A slot long enough that no test run crosses its end.
  const job = (name: string, run: Job['run']): Job => ({ name, everySeconds: 10_000_000, run });

  it('works a slot once, however many workers tick at once', async () => {
    let runs = 0;
    const slow = job('slow', async () => {
      runs += 1;
      await db.app.query('SELECT pg_sleep(0.2)');
    });
    const all = await Promise.all([1, 2, 3, 4].map(() => runDue(services, [slow])));
    expect(all.flat()).toEqual(['slow']);
    expect(await runDue(services, [slow])).toEqual([]);
    expect(runs).toBe(1);
  });

  it('gives a slot back when the job fails, and goes on with the next job', async () => {
    let tries = 0;
    const failing = job('failing', async () => {
      tries += 1;
      if (tries === 1) throw new Error('no');
    });
    const after = job('after', async () => undefined);
    expect(await runDue(services, [failing, after])).toEqual(['after']);
    expect(await runDue(services, [failing, after])).toEqual(['failing']);
  });

  it('works the next slot when its time has come, once for all that were missed', async () => {
    const daily = job('daily', async () => undefined);
    await runDue(services, [daily]);
    await db.owner.query(
      `UPDATE timetable_firings SET last_slot = last_slot - interval '1 year' WHERE job = 'daily'`,
    );
    expect(await runDue(services, [daily])).toEqual(['daily']);
    expect(await runDue(services, [daily])).toEqual([]);
  });
});
