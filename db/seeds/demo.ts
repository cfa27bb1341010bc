import { connect } from '@db/connect';
import { makeDemoWorld } from './demo/make-demo-world';

/** `npm run seed`: fills an empty database with the demo world. */
async function seed(): Promise<void> {
  const { BASE_URL, DATABASE_URL, DATABASE_OWNER_URL, PORT } = process.env;
  if (!DATABASE_URL || !DATABASE_OWNER_URL) {
    throw new Error('DATABASE_URL and DATABASE_OWNER_URL are not both set.');
  }
  const long = { poolSize: 2, statementTimeout: 600_000 };
  const owner = connect(DATABASE_OWNER_URL, long);
  const app = connect(DATABASE_URL, long);
  try {
    await makeDemoWorld(owner, app, BASE_URL ?? `http://localhost:${PORT ?? 4310}`, new Date());
  } finally {
    await Promise.all([owner.close(), app.close()]);
  }
}

seed().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? (error.stack ?? '') : String(error)}\n`);
  process.exit(1);
});
