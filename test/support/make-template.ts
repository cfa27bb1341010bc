import { Client } from 'pg';
import { connect } from '@db/connect';
import { migrator } from '@db/migrator';

/** Makes `vatwright_template` anew, migrated, with the task months that specs use. */
async function makeTemplate(): Promise<void> {
  const adminUrl = process.env['VATWRIGHT_TEST_PG'] as string;
  const admin = new Client({ connectionString: adminUrl });
  await admin.connect();
  for (const role of ['vatwright_owner', 'vatwright_app']) {
    const { rowCount } = await admin.query('SELECT 1 FROM pg_roles WHERE rolname = $1', [role]);
    if (!rowCount) await admin.query(`CREATE ROLE ${role} LOGIN`);
  }
  await admin.query('DROP DATABASE IF EXISTS vatwright_template WITH (FORCE)');
  await admin.query('CREATE DATABASE vatwright_template OWNER vatwright_owner');
  await admin.end();
  const url = new URL(adminUrl);
  url.username = 'vatwright_owner';
  url.pathname = '/vatwright_template';
  const owner = connect(url.toString());
  await migrator(owner).up();
  await owner.query(`SELECT ensure_task_months('2026-01-01', '2027-12-31')`);
  await owner.close();
}

makeTemplate().catch((error: unknown) => {
  process.stderr.write(`${String(error)}\n`);
  process.exit(1);
});
