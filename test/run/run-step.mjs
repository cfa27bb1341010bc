import { spawn } from 'node:child_process';
import { closeSync, openSync, readFileSync, rmSync } from 'node:fs';

const running = new Set();
const mostLines = 300;

/**
 * Runs one step with its output in a log of its own, shown only when the step fails.
 * @returns {Promise<{name: string, passed: number, failed: number, skipped: number, seconds: number}>}
 */
export async function runStep({ name, command, args, report }, env) {
  const log = `.local/logs/test-${name.replace(/\W+/g, '-')}.log`;
  const began = Date.now();
  if (report) rmSync(report, { force: true });
  const output = report ? ['--json', `--outputFile=${report}`] : [];
  const status = await run(command, [...args, ...output], log, env);
  const seconds = Math.round((Date.now() - began) / 1000);
  const counts = report ? countsOf(report, status) : countsOfCheck(status);
  if (counts.failed > 0) tell(`\n--- ${name} ---\n${lastLines(log)}\n--- end of ${name} ---\n`);
  const skipped = counts.skipped ? `, ${counts.skipped} skipped` : '';
  const detail = report ? `: ${counts.passed} passed, ${counts.failed} failed${skipped}` : '';
  tell(`${counts.failed ? 'FAILED' : 'passed'}  ${name}${detail} (${seconds} s)`);
  return { name, ...counts, seconds };
}

/** Ends what is still at work. */
export function endSteps() {
  for (const pid of running) {
    try {
      process.kill(-pid, 'SIGKILL');
    } catch {
      // It has just ended by itself.
    }
  }
}

function run(command, args, log, env) {
  const out = openSync(log, 'w');
  // Standard output of jest holds its JSON, which the report repeats; the words are on the other.
  const stdout = args.includes('--json') ? 'ignore' : out;
  const child = spawn(command, args, { env, stdio: ['ignore', stdout, out], detached: true });
  closeSync(out);
  running.add(child.pid);
  return new Promise((resolve) => {
    const end = (code) => {
      running.delete(child.pid);
      resolve(code ?? 1);
    };
    child.once('error', () => end(1));
    child.once('exit', end);
  });
}

const countsOfCheck = (status) => ({
  passed: status === 0 ? 1 : 0,
  failed: status === 0 ? 0 : 1,
  skipped: 0,
});

function countsOf(report, status) {
  try {
    const it = JSON.parse(readFileSync(report, 'utf8'));
    const failed = it.numFailedTests + it.numRuntimeErrorTestSuites;
    return {
      passed: it.numPassedTests,
      // A run that fails as a whole (set-up, no spec found) fails without a failed test.
      failed: failed === 0 && status !== 0 ? 1 : failed,
      skipped: it.numPendingTests + it.numTodoTests,
    };
  } catch {
    return { passed: 0, failed: 1, skipped: 0 };
  }
}

function lastLines(log) {
  return readFileSync(log, 'utf8').trimEnd().split('\n').slice(-mostLines).join('\n');
}

function tell(text) {
  process.stdout.write(`${text}\n`);
}
