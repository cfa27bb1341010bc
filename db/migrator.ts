import type { Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import { migrations } from './migrations/all';

/** The migrations of a database, to be run by the role that owns its tables. */
export function migrator(sequelize: Sequelize): Umzug<object> {
  const on = sequelize.getQueryInterface();
  return new Umzug({
    migrations: migrations.map(({ name, up, down }) => ({
      name,
      up: () => up(on),
      down: () => down(on),
    })),
    storage: new SequelizeStorage({ sequelize, tableName: 'migrations' }),
    logger: undefined,
  });
}
