import { Sequelize } from 'sequelize';

/**
 * A pool on one PostgreSQL database. A request waits one second for a connection and no statement
 * runs past ten, so that a stuck query becomes a clear error long before the browser gives up.
 */
export function connect(url: string, poolSize = 10): Sequelize {
  return new Sequelize(url, {
    dialect: 'postgres',
    logging: false,
    pool: { max: poolSize, min: 0, acquire: 1000, idle: 10_000 },
    dialectOptions: {
      statement_timeout: 10_000,
      lock_timeout: 2_000,
      idle_in_transaction_session_timeout: 15_000,
    },
  });
}
