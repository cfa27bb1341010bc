import type { S3Client } from '@aws-sdk/client-s3';
import type { Pool } from 'pg';
import type { Logger } from 'pino';
import type { Sequelize } from 'sequelize';
import type { Config } from '../config';

/** What a request may reach for. Passed in, so that a test can put its own clock or database there. */
export interface Services {
  readonly config: Config;
  readonly sequelize: Sequelize;
  /** Sessions read and write outside any organisation's transaction. */
  readonly sessionPool: Pool;
  readonly log: Logger;
  readonly files: S3Client;
  /** The present instant. */
  readonly now: () => Date;
}
