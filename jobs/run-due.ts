import { QueryTypes } from 'sequelize';
import type { WorkerServices } from './services';
import type { Job } from './timetable';

/**
 * Runs every job whose present slot nobody has worked yet. Which slot is present is decided by the
 * database's clock and the row in `timetable_firings`, so any number of workers run each slot once, a
 * rewound clock fires nothing again, and after an outage one run makes up for all missed slots.
 *
 * The row stays locked while the job runs: a worker that dies gives the slot back with its connection.
 * Jobs select what still needs doing, so a slot given back loses and doubles nothing.
 */
export async function runDue(services: WorkerServices, jobs: readonly Job[]): Promise<string[]> {
  const ran: string[] = [];
  for (const job of jobs) {
    try {
      if (await runOnce(services, job)) ran.push(job.name);
    } catch (error) {
      services.log.error({ err: error, job: job.name }, 'job failed');
    }
  }
  return ran;
}

async function runOnce(services: WorkerServices, job: Job): Promise<boolean> {
  const { sequelize } = services;
  await sequelize.query(
    `INSERT INTO timetable_firings (job, last_slot) VALUES ($1, '-infinity') ON CONFLICT DO NOTHING`,
    { bind: [job.name] },
  );
  return sequelize.transaction(async (transaction) => {
    // The transaction only holds the row; the job works in transactions of its own, for minutes.
    await sequelize.query(`SELECT set_config('idle_in_transaction_session_timeout', '0', true)`, {
      transaction,
    });
    const [claimed] = await sequelize.query<{ slot: Date }>(
      `WITH present AS (
         SELECT to_timestamp(floor(extract(epoch FROM now()) / $2) * $2) AS slot),
       free AS (
         SELECT f.job, present.slot FROM timetable_firings f, present
         WHERE f.job = $1 AND f.last_slot < present.slot FOR UPDATE OF f SKIP LOCKED)
       UPDATE timetable_firings f SET last_slot = free.slot FROM free WHERE f.job = free.job
       RETURNING free.slot`,
      { bind: [job.name, job.everySeconds], transaction, type: QueryTypes.SELECT },
    );
    if (!claimed) return false;
    await job.run(services, claimed.slot);
    return true;
  });
}
