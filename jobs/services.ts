import { S3Client } from '@aws-sdk/client-s3';
import { pino } from 'pino';
import type { Sequelize } from 'sequelize';
import { connect } from '@db/connect';
import { type Config, readConfig } from '@server/config';
import type { Services } from '@server/http/services';

/** What a job may reach for: as a request, without the sessions. */
export type WorkerServices = Omit<Services, 'sessionPool'>;

/** The worker's own services from the environment; bulk statements get more time than a request. */
export function workerServices(env: NodeJS.ProcessEnv): WorkerServices {
  const config = readConfig(env);
  const sequelize: Sequelize = connect(config.DATABASE_URL, {
    poolSize: 6,
    statementTimeout: 120_000,
  });
  return {
    config,
    sequelize,
    log: pino({ level: config.LOG_LEVEL, base: { process: 'worker' } }),
    files: filesOf(config),
    now: () => new Date(),
  };
}

function filesOf(config: Config): S3Client {
  return new S3Client({
    region: config.S3_REGION,
    endpoint: config.S3_ENDPOINT,
    forcePathStyle: config.S3_ENDPOINT !== undefined,
    requestChecksumCalculation: 'WHEN_REQUIRED',
    credentials: {
      accessKeyId: config.S3_ACCESS_KEY_ID,
      secretAccessKey: config.S3_SECRET_ACCESS_KEY,
    },
  });
}
