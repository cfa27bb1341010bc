// `npm test`: every check in turn, counted, ending with one line that a machine can read.
import { spawnSync } from 'node:child_process';
import { mkdirSync, readFileSync, rmSync } from 'node:fs';

const report = '.local/jest.json';
let passed = 0;
let failed = 0;

function check(name, script) {
  const { status } = spawnSync('npm', ['run', '--silent', script], { stdio: 'inherit' });
  if (status === 0) passed += 1;
  else failed += 1;
  console.log(`${status === 0 ? 'passed' : 'FAILED'}  ${name}`);
}

check('format', 'format:check');
check('lint', 'lint:code');
check('types', 'types:server');

mkdirSync('.local', { recursive: true });
rmSync(report, { force: true });
spawnSync('npx', ['jest', '--selectProjects=server', '--json', `--outputFile=${report}`], {
  stdio: 'inherit',
});
try {
  const counts = JSON.parse(readFileSync(report, 'utf8'));
  passed += counts.numPassedTests;
  failed += counts.numFailedTests + counts.numRuntimeErrorTestSuites;
} catch {
  failed += 1;
}
console.log(`${passed} passed, ${failed} failed`);
process.exit(failed === 0 ? 0 : 1);
