import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { Failure } from './cluster-failure.mjs';

const root = resolve(import.meta.dirname, '..');
/** Where packages are unpacked for a user who may not install them. */
export const unpacked = join(root, '.local/debian');

const number = (text) => Number.parseInt(text, 10);

/**
 * The newest PostgreSQL server on this machine, or the one of major version `wanted`.
 * @returns {{bin: string, version: number, env: NodeJS.ProcessEnv} | undefined}
 */
export function findServer(wanted) {
  for (const base of ['/', unpacked]) {
    const home = join(base, 'usr/lib/postgresql');
    const versions = existsSync(home) ? readdirSync(home).map(number).filter(Boolean) : [];
    const version = versions
      .filter((it) => existsSync(join(home, String(it), 'bin/postgres')))
      .filter((it) => wanted === undefined || it === wanted)
      .sort((a, b) => b - a)[0];
    if (version) {
      return {
        bin: join(home, String(version), 'bin'),
        version,
        env: base === '/' ? {} : librariesUnder(base),
      };
    }
  }
  return undefined;
}

/** Unpacked programs look for their libraries beside themselves first. */
export function librariesUnder(base) {
  const triplet = { x64: 'x86_64-linux-gnu', arm64: 'aarch64-linux-gnu' }[process.arch] ?? '';
  const folders = [`usr/lib/${triplet}`, `usr/lib/${triplet}/pulseaudio`, `lib/${triplet}`].map(
    (it) => join(base, it),
  );
  return { LD_LIBRARY_PATH: [...folders, process.env.LD_LIBRARY_PATH].filter(Boolean).join(':') };
}

/**
 * Who runs the server: the user `postgres` when we are root, which PostgreSQL refuses to be.
 * @returns {{uid: number, gid: number} | undefined} undefined: ourselves
 */
export function serverUser() {
  if (process.getuid?.() !== 0) return undefined;
  const ask = (flag) => spawnSync('id', [flag, 'postgres'], { encoding: 'utf8' }).stdout.trim();
  const [uid, gid] = [number(ask('-u')), number(ask('-g'))];
  if (!uid || !gid) {
    throw new Failure('PostgreSQL refuses to run as root and this machine has no user postgres.');
  }
  return { uid, gid };
}

/** The full path of one of PostgreSQL's programs with the environment it needs. */
export function program(name) {
  const server = findServer();
  if (!server) {
    throw new Failure('The PostgreSQL server is not installed. Run node deploy/prepare.mjs start.');
  }
  return { path: join(server.bin, name), env: { ...process.env, ...server.env } };
}
