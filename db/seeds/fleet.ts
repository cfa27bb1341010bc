import { connect } from '@db/connect';
import { migrator } from '@db/migrator';
import { fleetPassword } from './fleet/fleet-people';
import { makeFleet } from './fleet/make-fleet';

const MOST_STORES = 20_000;

/** `npm run fleet -- --stores N`: adds an organisation of N stores with a year of tasks behind it. */
async function fleet(args: readonly string[]): Promise<void> {
  const stores = Number(args[args.indexOf('--stores') + 1]);
  if (
    !args.includes('--stores') ||
    !Number.isInteger(stores) ||
    stores < 1 ||
    stores > MOST_STORES
  ) {
    throw new Error(`Usage: npm run fleet -- --stores N, a whole number from 1 to ${MOST_STORES}.`);
  }
  const { DATABASE_URL, DATABASE_OWNER_URL } = process.env;
  if (!DATABASE_URL || !DATABASE_OWNER_URL) {
    throw new Error('DATABASE_URL and DATABASE_OWNER_URL are not both set.');
  }
  const long = { poolSize: 2, statementTimeout: 1_800_000 };
  const owner = connect(DATABASE_OWNER_URL, long);
  const app = connect(DATABASE_URL, long);
  try {
    await migrator(owner).up();
    const begun = Date.now();
    const made = await makeFleet(owner, app, stores, new Date(), (step) =>
      process.stderr.write(`${((Date.now() - begun) / 1000).toFixed(0).padStart(5)} s  ${step}\n`),
    );
    process.stdout.write(
      `${made.stores} stores, ${made.units} units, ${made.schedules} schedules, ${made.tasks} tasks\n` +
        `Sign in as regional-facility-manager.1@${made.domain}, "${fleetPassword}"\n`,
    );
  } finally {
    await Promise.all([owner.close(), app.close()]);
  }
}

fleet(process.argv.slice(2)).catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});
