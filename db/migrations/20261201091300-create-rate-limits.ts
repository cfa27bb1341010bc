import { sqlMigration } from './migration';

/** Counters of the rate limiter, shared by all servers; the limiter's own form. */
export const createRateLimits = sqlMigration(
  '20261201091300-create-rate-limits',
  `
    CREATE TABLE rate_limits (
      key varchar(255) PRIMARY KEY,
      points integer NOT NULL DEFAULT 0,
      expire bigint
    );
    GRANT SELECT, INSERT, UPDATE, DELETE ON rate_limits TO vatwright_app;
  `,
  `DROP TABLE rate_limits;`,
);
