import { createHash } from 'node:crypto';
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { Failure } from '../../db/cluster-failure.mjs';
import { root, say } from './ground.mjs';
import { runLogged } from './run-logged.mjs';

/** `npm ci` when the lock file differs from the one that was installed last. */
export function preparePackages() {
  const stamp = join(root, '.local/packages.sha256');
  const lock = join(root, 'package-lock.json');
  if (!existsSync(lock)) throw new Failure(`${lock} is missing: the clone is not complete.`);
  const wanted = createHash('sha256').update(readFileSync(lock)).digest('hex');
  const there = existsSync(join(root, 'node_modules')) && existsSync(stamp);
  if (there && readFileSync(stamp, 'utf8') === wanted) return;
  rmSync(stamp, { force: true });
  say('Installing the npm packages (one to three minutes) …');
  // npm's own settings of the run around us (--silent and the like) are not meant for this one.
  const env = Object.fromEntries(
    Object.entries(process.env).filter(([name]) => !/^npm_(lifecycle|package|command)/.test(name)),
  );
  runLogged('Installing the npm packages', 'npm', ['ci', '--loglevel=error'], {
    log: 'npm-ci.log',
    env,
    tell: firstReason,
  });
  writeFileSync(stamp, wanted);
}

/** npm puts its error code first and the place of a debug log last; the reason stands between. */
function firstReason(output) {
  const lines = output.split('\n').filter((line) => line.startsWith('npm error'));
  const reason = lines.find((line) => !/npm error (code|errno|syscall|A complete log)/.test(line));
  // A failing network or disk is told by its code.
  const code = /npm error code (\w+)/.exec(output)?.[1] ?? '';
  return reason ? `${code}: ${reason.replace('npm error ', '')}` : output;
}
