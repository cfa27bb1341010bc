import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { Client } from 'pg';
import { connect } from '@db/connect';
import type * as ClusterModule from '@db/cluster.mjs';
import { migrator } from '@db/migrator';

export interface BenchDatabase {
  readonly appUrl: string;
  readonly ownerUrl: string;
  /** Whether it stood already, from a bench before. */
  readonly kept: boolean;
  close(): Promise<void>;
}

/**
 * A migrated database by a name of its own: in the PostgreSQL of `VATWRIGHT_TEST_PG`, where it stays
 * for the next bench, or in one that is started now and thrown away afterwards.
 * @param fresh makes it anew even where it stands
 */
export async function benchDatabase(name: string, fresh: boolean): Promise<BenchDatabase> {
  const cluster = process.env['VATWRIGHT_TEST_PG'] ? undefined : await ownCluster();
  const adminUrl = process.env['VATWRIGHT_TEST_PG'] ?? (cluster?.adminUrl as string);
  const urlOf = (role: string) => {
    const url = new URL(adminUrl);
    url.username = role;
    url.pathname = `/${name}`;
    return url.href;
  };
  const admin = new Client({ connectionString: adminUrl });
  await admin.connect();
  for (const role of ['vatwright_owner', 'vatwright_app']) {
    const { rowCount } = await admin.query('SELECT FROM pg_roles WHERE rolname = $1', [role]);
    if (!rowCount) await admin.query(`CREATE ROLE ${role} LOGIN`);
  }
  if (fresh) await admin.query(`DROP DATABASE IF EXISTS ${name} WITH (FORCE)`);
  const { rowCount } = await admin.query('SELECT FROM pg_database WHERE datname = $1', [name]);
  if (!rowCount) await admin.query(`CREATE DATABASE ${name} OWNER vatwright_owner`);
  await admin.end();
  const owner = connect(urlOf('vatwright_owner'), { poolSize: 1 });
  await migrator(owner).up();
  await owner.close();
  return {
    appUrl: urlOf('vatwright_app'),
    ownerUrl: urlOf('vatwright_owner'),
    kept: rowCount === 1,
    close: async () => {
      await cluster?.stop();
    },
  };
}

/** Loaded only when needed: it waits at its top level, which a static import from here cannot. */
async function ownCluster() {
  const { startTestCluster } = (await import(
    pathToFileURL(join(process.cwd(), 'db/cluster.mjs')).href
  )) as typeof ClusterModule;
  return startTestCluster();
}
