// Runs before `npm start` and `npm test`, in a clone that may have no packages yet, so it uses Node
// alone. Installs what the machine lacks, and does nothing in a tenth of a second when all is there.
import { Failure } from '../db/cluster-failure.mjs';
import { prepareChromium } from './prepare/chromium.mjs';
import { checkGround } from './prepare/ground.mjs';
import { preparePackages } from './prepare/packages.mjs';
import { preparePostgres } from './prepare/postgres.mjs';

const purpose = process.argv[2] ?? 'start';
try {
  checkGround();
  preparePackages();
  preparePostgres();
  if (purpose === 'test') prepareChromium();
} catch (error) {
  process.stderr.write(`${error instanceof Failure ? error.message : error.stack}\n`);
  process.exit(1);
}
