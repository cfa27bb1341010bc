import { S3Client } from '@aws-sdk/client-s3';
import type { Logger } from 'pino';
import type { Sequelize } from 'sequelize';
import type { Config } from './config';

/** What a command may reach for, in a request or a job. Passed in, so that a test can put its own. */
export interface CoreServices {
  readonly config: Config;
  readonly sequelize: Sequelize;
  readonly log: Logger;
  readonly files: S3Client;
  /** The present instant. */
  readonly now: () => Date;
}

/** The object store of the settings; without an endpoint that is AWS itself. */
export function openFiles(config: Config): S3Client {
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
