import { randomUUID } from 'node:crypto';
import { Pool } from 'pg';
import type { Sequelize } from 'sequelize';
import { connect } from '@db/connect';

/** One spec file's own database, cloned from the migrated template; both roles' pools on it. */
export interface TestDatabase {
  /** As the application sees it: under row-level security. */
  readonly app: Sequelize;
  /** As the owner sees it: for setting up and looking behind the curtain. */
  readonly owner: Sequelize;
  readonly appUrl: string;
  close(): Promise<void>;
}

const urlOf = (role: string, database: string) => {
  const url = new URL(process.env['VATWRIGHT_TEST_PG'] as string);
  url.username = role;
  url.pathname = `/${database}`;
  return url.toString();
};

/** Clones the template that the global set-up migrated. Close it in `afterAll`. */
export async function testDatabase(): Promise<TestDatabase> {
  const name = `spec_${randomUUID().replaceAll('-', '')}`;
  const admin = new Pool({ connectionString: process.env['VATWRIGHT_TEST_PG'], max: 1 });
  await admin.query(`CREATE DATABASE ${name} TEMPLATE vatwright_template OWNER vatwright_owner`);
  const appUrl = urlOf('vatwright_app', name);
  const app = connect(appUrl);
  const owner = connect(urlOf('vatwright_owner', name), { poolSize: 2 });
  return {
    app,
    owner,
    appUrl,
    close: async () => {
      await Promise.all([app.close(), owner.close()]);
      await admin.query(`DROP DATABASE ${name} WITH (FORCE)`);
      await admin.end();
    },
  };
}
