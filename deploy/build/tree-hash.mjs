import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { root } from '../prepare/ground.mjs';

// Specs are no part of what is built; the gathered translations are made from other files.
const ignored = /\.spec\.ts$|\/messages\.\w+\.json$/;

/** One hash over the content of files and folders. */
function treeHash(paths) {
  const hash = createHash('sha256');
  const add = (path) => {
    const full = join(root, path);
    if (!existsSync(full) || ignored.test(path)) return;
    if (statSync(full).isDirectory()) {
      for (const name of readdirSync(full).sort()) add(join(path, name));
      return;
    }
    const content = readFileSync(full);
    hash.update(`${path}\0${content.length}\0`).update(content);
  };
  for (const path of paths) add(path);
  return hash.digest('hex');
}

/**
 * Runs `build` unless its last success saw the same files and left all of `results` in place.
 * @returns whether it ran
 */
export async function buildIfChanged(stamp, paths, results, build) {
  const file = join(root, 'dist', stamp);
  const wanted = treeHash(paths);
  const there = [file, ...results.map((it) => join(root, it))].every((it) => existsSync(it));
  if (there && readFileSync(file, 'utf8') === wanted) return false;
  rmSync(file, { force: true });
  await build();
  writeFileSync(file, wanted);
  return true;
}
