import { Client } from 'pg';
import { connect } from './connect';
import { migrator } from './migrator';

const oneAtATime = `SELECT pg_advisory_lock(hashtext('vatwright migrations'))`;

/**
 * `migrate up` brings the database of `DATABASE_OWNER_URL` to the newest schema, `migrate down` takes
 * the last migration back. Of several at once, all but one wait and then find nothing left to do.
 */
async function migrate(direction: string): Promise<void> {
  const url = process.env['DATABASE_OWNER_URL'];
  if (!url) throw new Error('DATABASE_OWNER_URL is not set.');
  if (direction !== 'up' && direction !== 'down') throw new Error('Say up or down.');
  const lock = new Client({ connectionString: url });
  await lock.connect();
  const owner = connect(url, { statementTimeout: 0 });
  try {
    await lock.query(oneAtATime);
    const done = await migrator(owner)[direction]();
    for (const { name } of done) process.stdout.write(`${direction} ${name}\n`);
  } finally {
    await owner.close();
    await lock.end();
  }
}

migrate(process.argv[2] ?? 'up').catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});
