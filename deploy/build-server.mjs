// Bundles what runs on Node: `dist/server/*.cjs`. Packages stay outside the bundles.
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { Failure, failureOf } from '../db/cluster-failure.mjs';
import { buildIfChanged } from './build/tree-hash.mjs';
import { root } from './prepare/ground.mjs';

const entries = {
  server: 'server/main.ts',
  worker: 'jobs/main.ts',
  services: 'deploy/local/services.ts',
  migrate: 'db/migrate.ts',
  demo: 'db/seeds/demo.ts',
};
const sources = [
  'server',
  'shared',
  'db',
  'jobs',
  'deploy/local',
  'tsconfig.json',
  'package-lock.json',
];

/** The full path of one bundle. */
export const bundle = (name) => join(root, 'dist/server', `${name}.cjs`);

/** Builds unless nothing changed since the last time. */
export function buildServer() {
  const results = Object.keys(entries).map((name) => `dist/server/${name}.cjs`);
  return buildIfChanged('server.sha256', sources, results, async () => {
    const missing = Object.values(entries).find((it) => !existsSync(join(root, it)));
    if (missing) throw new Failure(`${missing} is missing: the clone is not complete.`);
    const { build } = await import('esbuild');
    try {
      await build({
        absWorkingDir: root,
        entryPoints: entries,
        outdir: 'dist/server',
        outExtension: { '.js': '.cjs' },
        bundle: true,
        packages: 'external',
        platform: 'node',
        target: 'node20',
        format: 'cjs',
        sourcemap: 'linked',
        tsconfig: 'tsconfig.json',
        logLevel: 'silent',
      });
    } catch (error) {
      throw failureOf('The server cannot be built', firstFault(error));
    }
  });
}

function firstFault(error) {
  const fault = error.errors?.[0];
  if (!fault) return error;
  const { file, line } = fault.location ?? {};
  return `${fault.text}${file ? ` (${file}:${line})` : ''}`;
}

if (process.argv[1] === import.meta.filename) {
  try {
    const built = await buildServer();
    process.stdout.write(built ? 'The server is built.\n' : 'Nothing changed in the server.\n');
  } catch (error) {
    process.stderr.write(`${error instanceof Failure ? error.message : error.stack}\n`);
    process.exit(1);
  }
}
