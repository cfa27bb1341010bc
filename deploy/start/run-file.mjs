import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { Failure } from '../../db/cluster-failure.mjs';
import { local, root } from '../prepare/ground.mjs';

const file = join(local, 'run.json');
const commandOf = (pid) => {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').replaceAll('\0', ' ');
  } catch {
    return '';
  }
};

/**
 * Claims this clone for one start at a time, and ends what a start that was killed left behind.
 * @throws Failure when another start is at work
 */
export async function claimRun() {
  const { pid, children = [] } = existsSync(file) ? read() : {};
  if (pid && pid !== process.pid && commandOf(pid).includes('deploy/start.mjs')) {
    throw new Failure(`Vatwright already runs from this clone (process ${pid}): stop that first.`);
  }
  for (const child of children) await endLeftover(child);
  noteRun([]);
}

/** Notes which processes belong to this start. */
export function noteRun(children) {
  writeFileSync(file, JSON.stringify({ pid: process.pid, children }));
}

export function releaseRun() {
  rmSync(file, { force: true });
}

function read() {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return {};
  }
}

async function endLeftover(pid) {
  // The number may belong to another program by now: only our own bundles are ended.
  const ours = () => commandOf(pid).includes(join(root, 'dist/server'));
  for (const signal of ['SIGTERM', 'SIGKILL']) {
    if (ours()) process.kill(pid, signal);
    for (let i = 0; i < 50 && ours(); i += 1) await wait(100);
  }
}
