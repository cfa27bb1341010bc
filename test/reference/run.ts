// `npm run reference -- KIND FILE`: holds the product against a file of outside answers and prints one
// JSON line. Exit status: 0 all passed, 1 a case failed, 2 the call or the file cannot be used.
import { readFileSync } from 'node:fs';
import { checkRecurrenceFile } from './recurrence/check-recurrence-file';
import type { ReferenceReport } from './reference-report';

type Check = (file: unknown) => ReferenceReport;

const CHECKS: Readonly<Record<string, Check>> = { recurrence: checkRecurrenceFile };

const PLANNED = ['routing', 'reliability'];

function main([kind, path]: readonly string[]): number {
  const check = kind === undefined ? undefined : CHECKS[kind];
  if (!check) {
    const words = PLANNED.includes(kind ?? '')
      ? `The kind “${kind}” is not supported yet.`
      : 'Usage: npm run reference -- recurrence FILE';
    process.stderr.write(`${words}\n`);
    return 2;
  }
  if (path === undefined) {
    process.stderr.write(`Usage: npm run reference -- ${kind} FILE\n`);
    return 2;
  }
  try {
    const begun = performance.now();
    const report = check(JSON.parse(readFileSync(path, 'utf8')));
    const seconds = Number(((performance.now() - begun) / 1000).toFixed(3));
    process.stdout.write(`${JSON.stringify({ ...report, seconds })}\n`);
    return report.failed === 0 ? 0 : 1;
  } catch (error) {
    process.stderr.write(`${path}: ${error instanceof Error ? error.message : String(error)}\n`);
    return 2;
  }
}

process.exitCode = main(process.argv.slice(2));
