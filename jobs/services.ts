import { pino } from 'pino';
import { connect } from '@db/connect';
import { readConfig } from '@server/config';
import { type CoreServices, openFiles } from '@server/core-services';

/** What a job may reach for: as a request, without the sessions. */
export type WorkerServices = CoreServices;

/** The worker's own services from the environment; bulk statements get more time than a request. */
export function workerServices(env: NodeJS.ProcessEnv): WorkerServices {
  const config = readConfig(env);
  return {
    config,
    sequelize: connect(config.DATABASE_URL, { poolSize: 6, statementTimeout: 120_000 }),
    log: pino({ level: config.LOG_LEVEL, base: { process: 'worker' } }),
    files: openFiles(config),
    now: () => new Date(),
  };
}
