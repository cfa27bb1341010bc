import { spawnSync } from 'node:child_process';
import { closeSync, openSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { failureOf } from '../../db/cluster-failure.mjs';
import { local, root } from './ground.mjs';

/**
 * Runs a program with its output in `.local/logs`, so that the terminal shows only what matters.
 * @param {string[]} args
 * @param {object} options `tell` picks the telling part of the output
 * @throws Failure of one line, drawn from that output
 */
export function runLogged(
  what,
  command,
  args,
  { log, env = process.env, cwd = root, tell = (output) => output },
) {
  const file = join(local, 'logs', log);
  const out = openSync(file, 'w');
  const { status, signal, error } = spawnSync(command, args, {
    cwd,
    env,
    stdio: ['ignore', out, out],
  });
  closeSync(out);
  if (signal) process.exit(130);
  const output = readFileSync(file, 'utf8');
  if (status !== 0) throw failureOf(what, error ?? tell(output), file);
  return output;
}
