import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import ICAL from 'ical.js';
import { RRule } from 'rrule';

/** A rule to ask other engines about, and how many of its first occurrences. */
export interface Question {
  readonly dtstart: string;
  readonly rrule: string;
  readonly most: number;
}

/** Why python-dateutil cannot be asked here; null where it can. */
export function dateutilMissing(): string | null {
  const { error, status } = spawnSync('python3', ['-c', 'import dateutil.rrule']);
  if (error) return 'python3 is not installed';
  return status === 0 ? null : 'python3 has no dateutil (Debian: python3-dateutil)';
}

/** What python-dateutil answers, one list for each question. */
export function askDateutil(questions: readonly Question[]): string[][] {
  const script = join(__dirname, 'expand-with-dateutil.py');
  const { status, stdout, stderr } = spawnSync('python3', [script], {
    input: JSON.stringify(questions),
    encoding: 'utf8',
    maxBuffer: 64 * 1024 * 1024,
  });
  if (status !== 0) throw new Error(`dateutil failed: ${stderr}`);
  return JSON.parse(stdout) as string[][];
}

/** What ical.js answers. */
export function askIcal({ dtstart, rrule, most }: Question): string[] {
  const iterator = ICAL.Recur.fromString(rrule).iterator(ICAL.Time.fromDateTimeString(dtstart));
  const found: string[] = [];
  while (found.length < most) {
    const next = iterator.next();
    if (!next) break;
    found.push(next.toString());
  }
  return found;
}

/** What the rrule package answers. */
export function askRrule({ dtstart, rrule, most }: Question): string[] {
  const found: string[] = [];
  const rule = new RRule({ ...RRule.parseString(rrule), dtstart: new Date(`${dtstart}Z`) });
  rule.all((date) => {
    found.push(date.toISOString().slice(0, 19));
    return found.length < most;
  });
  return found.slice(0, most);
}
