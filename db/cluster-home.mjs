import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import {
  chmodSync,
  chownSync,
  existsSync,
  mkdirSync,
  readFileSync,
  rmSync,
  statSync,
} from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { Failure, failureOf } from './cluster-failure.mjs';

const local = resolve(import.meta.dirname, '..', process.env.VATWRIGHT_LOCAL ?? '.local');

/**
 * The directory of one cluster of this clone, made when missing: under `.local`, or, for root in a
 * clone that the user `postgres` cannot reach (a home of mode 700), under `/var/lib/postgresql`.
 * @param {string} name `pg`, or `pg-test/…`
 * @param {{uid: number, gid: number} | undefined} user from `serverUser()`
 */
export function clusterHome(name, user) {
  const near = join(local, name);
  try {
    if (!user) return owned(near, process.getuid?.());
    mkdirSync(dirname(near), { recursive: true });
    if (reaches(user, dirname(near))) return owned(near, user.uid, user);
    const hash = createHash('sha256').update(local).digest('hex').slice(0, 12);
    const far = join('/var/lib/postgresql', `vatwright-${hash}`, name);
    makeReachable(dirname(far));
    return owned(far, user.uid, user);
  } catch (error) {
    throw failureOf('The folder of the database cannot be made', error);
  }
}

/** Whatever root's umask is, the user `postgres` must be able to pass. */
function makeReachable(folder) {
  const first = mkdirSync(folder, { recursive: true });
  for (let made = folder; first && made.startsWith(first); made = dirname(made)) {
    chmodSync(made, 0o755);
  }
}

function reaches(user, folder) {
  return spawnSync('/usr/bin/test', ['-x', folder], { ...user, cwd: '/' }).status === 0;
}

function owned(home, uid, user) {
  const fresh = !existsSync(home);
  if (fresh) {
    mkdirSync(dirname(home), { recursive: true });
    mkdirSync(home, { mode: 0o700 });
  }
  if (fresh && user) chownSync(home, user.uid, user.gid);
  if (statSync(home).uid !== uid) {
    throw new Failure(
      `${home} belongs to another user. Start as the user who started first, or move it away.`,
    );
  }
  return home;
}

/**
 * The process that serves a data directory.
 * @returns {{pid: number, port: number} | undefined} undefined also when the file is a leftover of
 *   a process that is gone, or whose number another program has taken over
 */
export function running(data) {
  const [pid, , , port] = linesOf(join(data, 'postmaster.pid'));
  if (!pid) return undefined;
  const command = linesOf(`/proc/${pid}/cmdline`).join(' ').replaceAll('\0', ' ');
  if (!command.includes('postgres') || !command.includes(data)) return undefined;
  return { pid: Number(pid), port: Number(port) };
}

/** Takes away a pid file whose process is gone: PostgreSQL may take its number for a live one. */
export function clearStalePid(data) {
  const file = join(data, 'postmaster.pid');
  if (existsSync(file) && !running(data)) rmSync(file);
}

function linesOf(file) {
  try {
    return readFileSync(file, 'utf8').split('\n');
  } catch {
    return [];
  }
}
