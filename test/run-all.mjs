// `npm test`: every check, counted, ending with one line that a machine can read. `--check` leaves
// out what runs the product: the specs, the builds and the journeys.
import { mkdirSync } from 'node:fs';
import { resolve } from 'node:path';
import { startTestCluster } from '../db/cluster.mjs';
import { chromiumPath } from '../deploy/prepare/chromium.mjs';
import { endSteps, runStep } from './run/run-step.mjs';
import { checks, journeys, tests } from './run/steps.mjs';

process.chdir(resolve(import.meta.dirname, '..'));
mkdirSync('.local/logs', { recursive: true });
const onlyChecks = process.argv.includes('--check');
const began = Date.now();
let interrupted = false;

/** Runs steps in order, so many at a time; goes on when one fails. */
async function runAll(steps, atATime, env) {
  const left = [...steps];
  const results = [];
  const lane = async () => {
    while (left.length > 0 && !interrupted) results.push(await runStep(left.shift(), env));
  };
  await Promise.all(Array.from({ length: atATime }, lane));
  return results;
}

const cluster = await startTestCluster().catch((error) => {
  process.stderr.write(`${error.message}\n`);
  process.stdout.write('0 passed, 1 failed\n');
  process.exit(1);
});
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
  process.on(signal, () => {
    interrupted = true;
    endSteps();
    void cluster.stop().finally(() => process.exit(130));
  });
}

const env = {
  ...process.env,
  VATWRIGHT_TEST_PG: cluster.adminUrl,
  CHROMIUM_PATH: chromiumPath() ?? '',
  AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true',
};
let results;
try {
  // One lane works through the specs while the other goes through the checks.
  results = onlyChecks
    ? await runAll(checks, 2, env)
    : [
        ...(await runAll([tests[0], ...checks, ...tests.slice(1)], 2, env)),
        ...(await runAll(journeys, 1, env)),
      ];
} finally {
  await cluster.stop();
}

const sum = (key) => results.reduce((total, it) => total + it[key], 0);
const width = Math.max(...results.map(({ name }) => name.length));
const rows = results.map(({ name, passed, failed, skipped, seconds }) =>
  [
    failed ? 'FAILED' : 'passed',
    name.padEnd(width),
    `${passed} passed`.padStart(12),
    `${failed} failed`.padStart(10),
    skipped ? `${skipped} skipped` : '',
    `${seconds} s`.padStart(7),
  ].join('  '),
);
process.stdout.write(`\n${rows.join('\n')}\nin ${Math.round((Date.now() - began) / 1000)} s\n`);
process.stdout.write(`${sum('passed')} passed, ${sum('failed')} failed\n`);
process.exit(sum('failed') === 0 ? 0 : 1);
