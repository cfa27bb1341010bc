import { types } from 'pg';
import { Sequelize } from 'sequelize';

// A wall-clock `timestamp` stays text: the driver's default reads it in the server's own zone.
const TIMESTAMP_WITHOUT_ZONE = 1114;
types.setTypeParser(TIMESTAMP_WITHOUT_ZONE, (text) => text.replace(' ', 'T'));

/**
 * A pool on one PostgreSQL database. A request waits one second for a connection and no statement
 * runs past ten, so that a stuck query becomes a clear error long before the browser gives up.
 * The worker's bulk statements ask for more time.
 */
export function connect(
  url: string,
  {
    poolSize = 10,
    statementTimeout = 10_000,
  }: { poolSize?: number; statementTimeout?: number } = {},
): Sequelize {
  return new Sequelize(url, {
    dialect: 'postgres',
    logging: false,
    pool: { max: poolSize, min: 0, acquire: 1000, idle: 10_000 },
    dialectOptions: {
      statement_timeout: statementTimeout,
      lock_timeout: 2_000,
      idle_in_transaction_session_timeout: Math.max(15_000, statementTimeout),
    },
  });
}
