import { createReadStream, createWriteStream, statSync } from 'node:fs';
import { rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import { Client } from 'pg';
import { from as copyFrom, to as copyTo } from 'pg-copy-streams';
import { connect } from '@db/connect';
import { generateTasks } from '@server/tasks/generate-tasks';
import { benchDatabase } from './bench-database';
import { wholeNumber } from './bench-options';
import type { BenchReport } from './bench-report';
import { HORIZON_DAYS, makeGenerationFleet } from './generation-fleet';

const BAR = 3;

/**
 * Writes the first 120 days of tasks of a fleet, then the same rows by a bare COPY into the same
 * indexed tables, emptied for it; then the one more day that each night adds.
 *
 * `--stores N` (5,000 stores are 30,000 units and 240,000 schedules).
 */
export async function benchGeneration(args: readonly string[]): Promise<BenchReport> {
  const stores = wholeNumber(args, 'stores', 5_000);
  const database = await benchDatabase('bench_generation', true);
  const long = { poolSize: 2, statementTimeout: 1_800_000 };
  const owner = connect(database.ownerUrl, long);
  const app = connect(database.appUrl, long);
  const copy = new Client({ connectionString: database.ownerUrl });
  await copy.connect();
  const file = join(tmpdir(), `bench-generation-${process.pid}.copy`);
  try {
    const now = new Date();
    const today = now.toISOString().slice(0, 10);
    const { organisationId, schedules } = await makeGenerationFleet(owner, stores, today);
    await owner.query(`SELECT ensure_task_months($1::date - 31, $1::date + 200)`, {
      bind: [today],
    });
    const memory = watchMemory();
    const first = await timed(() => generateTasks(app, organisationId, now));
    const peak = memory.stop();

    await pipeline(
      copy.query(copyTo('COPY (SELECT * FROM tasks ORDER BY rule_id, schedule_id) TO STDOUT')),
      createWriteStream(file),
    );
    await owner.query('TRUNCATE tasks');
    await owner.query('CHECKPOINT').catch(() => undefined);
    const bare = await timed(() =>
      pipeline(createReadStream(file), copy.query(copyFrom('COPY tasks FROM STDIN'))),
    );
    await owner.query('ANALYZE tasks');

    const tomorrow = new Date(now.getTime() + 86_400_000);
    const night = await timed(() => generateTasks(app, organisationId, tomorrow));
    const idle = await timed(() => generateTasks(app, organisationId, tomorrow));
    const ratio = first.seconds / bare.seconds;
    return {
      bench: 'generation',
      bar: `the first ${HORIZON_DAYS} days in at most ${BAR} times a bare COPY of the same rows`,
      met: ratio <= BAR,
      figures: [
        { name: 'stores', value: stores },
        { name: 'schedules', value: schedules },
        { name: 'tasks written', value: first.result.added },
        { name: 'size of the rows', value: Math.round(statSync(file).size / 1e6), unit: 'MB' },
        { name: 'generation', value: round(first.seconds), unit: 's' },
        { name: 'bare COPY', value: round(bare.seconds), unit: 's' },
        { name: 'ratio', value: round(ratio) },
        { name: 'tasks a second', value: Math.round(first.result.added / first.seconds) },
        { name: 'highest memory of the worker', value: peak, unit: 'MB' },
        { name: 'one night more', value: round(night.seconds), unit: 's' },
        { name: 'tasks of that night', value: night.result.added },
        { name: 'a run with nothing to do', value: round(idle.seconds), unit: 's' },
      ],
    };
  } finally {
    await rm(file, { force: true });
    await copy.end();
    await Promise.all([owner.close(), app.close()]);
    await database.close();
  }
}

async function timed<T>(work: () => Promise<T>): Promise<{ result: T; seconds: number }> {
  const begun = performance.now();
  const result = await work();
  return { result, seconds: (performance.now() - begun) / 1000 };
}

/** Looks at the process's resident memory five times a second. */
function watchMemory(): { stop(): number } {
  let peak = 0;
  const look = () => {
    peak = Math.max(peak, process.memoryUsage.rss());
  };
  const watch = setInterval(look, 200);
  return {
    stop: () => {
      clearInterval(watch);
      look();
      return Math.round(peak / 1e6);
    },
  };
}

const round = (value: number) => Math.round(value * 100) / 100;
