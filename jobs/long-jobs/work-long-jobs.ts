import { QueryTypes } from 'sequelize';
import { Problem } from '@shared/problem';
import { LeaseLost, type LongJobHandler, type LongJobServices } from '@server/long-jobs/long-job';
import { type ClaimedJob, LeasedRun } from './leased-run';

export interface LongJobSettings {
  readonly handlers: Readonly<Record<string, LongJobHandler>>;
  /** A worker silent for so long is taken for dead. */
  readonly leaseSeconds: number;
  /** A job that ends its worker so many times is given up. */
  readonly tries: number;
}

/**
 * Works waiting long jobs, and those whose worker was lost, one after the other until none is left.
 * @returns how many it took up
 */
export async function workLongJobs(
  services: LongJobServices,
  settings: LongJobSettings,
): Promise<number> {
  for (let count = 0; ; count += 1) {
    const [job] = await services.sequelize.query<ClaimedJob>(
      'SELECT * FROM claim_long_job(make_interval(secs => $1))',
      { bind: [settings.leaseSeconds], type: QueryTypes.SELECT },
    );
    if (!job) return count;
    await workOne(services, settings, job);
  }
}

async function workOne(
  services: LongJobServices,
  settings: LongJobSettings,
  job: ClaimedJob,
): Promise<void> {
  const { log } = services;
  const run = new LeasedRun(services, job, settings.leaseSeconds);
  const about = { longJob: job.id, kind: job.kind, attempt: job.attempts };
  const handler = settings.handlers[job.kind];
  if (!handler) {
    log.error(about, 'nobody knows how to do this long job');
    await run.fail('Nobody knows how to do this.');
    return;
  }
  if (job.attempts > settings.tries) {
    log.error(about, 'long job given up');
    await run.fail('It did not come through, several times. Please tell us.');
    return;
  }
  const beating = setInterval(
    () => {
      // A beat that is missed is made up by the next; a lease that is lost shows at the next write.
      run
        .renew()
        .catch((error: unknown) => log.debug({ err: error, ...about }, 'lease not renewed'));
    },
    (settings.leaseSeconds * 1000) / 4,
  );
  try {
    log.info(about, 'long job taken up');
    await handler(services, run);
    if (!run.isFinished) await run.inTenant((tenant) => run.finish(tenant, run.reached, {}));
    log.info(about, 'long job done');
  } catch (error) {
    await settle(services, run, error, about);
  } finally {
    clearInterval(beating);
  }
}

async function settle(
  { log }: LongJobServices,
  run: LeasedRun,
  error: unknown,
  about: { attempt: number },
): Promise<void> {
  if (error instanceof LeaseLost) {
    log.warn(about, 'long job cancelled or taken over');
    return;
  }
  if (error instanceof Problem && error.status < 500) {
    log.warn({ err: error, ...about }, 'long job cannot be done');
    await run.fail(error.more.errors?.[0]?.message ?? error.more.detail ?? error.title);
    return;
  }
  log.error({ err: error, ...about }, 'long job failed, to be tried again');
  await run.putBack(about.attempt * 10);
}
