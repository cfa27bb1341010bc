import { existsSync, mkdirSync, rmSync, statfsSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { Failure, failureOf } from '../../db/cluster-failure.mjs';

export const root = resolve(import.meta.dirname, '../..');
/** What this machine keeps for the clone. Another folder makes a second installation of it. */
export const local = resolve(root, process.env.VATWRIGHT_LOCAL ?? '.local');

// Packages take 0.65 GB, Angular's cache and the builds 0.1, a seeded database 0.3.
const megabytesForFirstStart = 1500;
const megabytesForLater = 150;

/** What must hold before any work: Node's version, a writable clone, room on the disk. */
export function checkGround() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19)) {
    throw new Failure(`Node 20.19 or newer is needed, and this is ${process.versions.node}.`);
  }
  try {
    mkdirSync(join(local, 'logs'), { recursive: true });
    const probe = join(local, `probe-${process.pid}`);
    writeFileSync(probe, 'x');
    rmSync(probe);
  } catch (error) {
    throw failureOf(`${local} cannot be written`, error);
  }
  const fresh = !existsSync(join(root, 'node_modules'));
  const { bavail, bsize } = statfsSync(local);
  const free = Math.floor((bavail * bsize) / 1e6);
  const needed = fresh ? megabytesForFirstStart : megabytesForLater;
  if (free < needed) {
    throw new Failure(
      `The disk of ${root} is full: ${free} MB are free and this start needs ${needed} MB.`,
    );
  }
}

/** A line for the person who waits; kept out of the way of the last line of the tests. */
export function say(line) {
  process.stdout.write(`${line}\n`);
}
