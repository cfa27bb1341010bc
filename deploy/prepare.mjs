// Runs before `npm start` and `npm test` in a clone that may have no packages yet, so it uses Node alone.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';

const stamp = '.local/packages.sha256';
const wanted = createHash('sha256').update(readFileSync('package-lock.json')).digest('hex');
const current = existsSync('node_modules') && existsSync(stamp) ? readFileSync(stamp, 'utf8') : '';
if (current !== wanted) {
  const { status } = spawnSync('npm', ['ci'], { stdio: 'inherit' });
  if (status !== 0) process.exit(status ?? 1);
  mkdirSync('.local', { recursive: true });
  writeFileSync(stamp, wanted);
}
