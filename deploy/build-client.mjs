// Builds the client in every language: `dist/client/browser/{en,es}`.
import { spawn } from 'node:child_process';
import { closeSync, mkdirSync, openSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { Failure, failureOf } from '../db/cluster-failure.mjs';
import { buildIfChanged } from './build/tree-hash.mjs';
import { local, root } from './prepare/ground.mjs';

const sources = ['client', 'shared', 'angular.json', 'tsconfig.json', 'package-lock.json'];
const results = ['en', 'es'].map((it) => `dist/client/browser/${it}/index.html`);

/**
 * Builds unless nothing changed since the last time.
 * @param {(command: string, args: string[], log: string) => Promise<number>} run gives the exit code
 */
export function buildClient(run = runHere) {
  return buildIfChanged('client.sha256', sources, results, async () => {
    mkdirSync(join(local, 'logs'), { recursive: true });
    const log = join(local, 'logs/build-client.log');
    for (const args of [
      ['client/src/locale/merge.mjs'],
      ['node_modules/@angular/cli/bin/ng.js', 'build'],
    ]) {
      if ((await run(process.execPath, args, log)) !== 0) {
        throw failureOf('The client cannot be built', firstFault(readFileSync(log, 'utf8')), log);
      }
    }
  });
}

const firstFault = (output) => /\[ERROR\] *(.+)/.exec(output)?.[1] ?? output;

function runHere(command, args, log) {
  const out = openSync(log, 'w');
  const child = spawn(command, args, { cwd: root, stdio: ['ignore', out, out] });
  closeSync(out);
  return new Promise((resolve, reject) => {
    child.once('error', reject);
    child.once('exit', (code) => resolve(code ?? 1));
  });
}

if (process.argv[1] === import.meta.filename) {
  try {
    const built = await buildClient();
    process.stdout.write(built ? 'The client is built.\n' : 'Nothing changed in the client.\n');
  } catch (error) {
    process.stderr.write(`${error instanceof Failure ? error.message : error.stack}\n`);
    process.exit(1);
  }
}
