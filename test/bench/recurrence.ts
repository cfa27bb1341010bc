import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import {
  fromWallSeconds,
  type LocalDateTime,
  toWallSeconds,
  type WallSeconds,
} from '@shared/calendar/local-date-time';
import { occurrencesBetween, wallSecondsBetween } from '@shared/recurrence/expand';
import { RRule } from 'rrule';
import type { BenchReport } from './bench-report';

interface ThroughputMix {
  readonly window: readonly [LocalDateTime, LocalDateTime];
  readonly schedules: readonly { readonly dtstart: LocalDateTime; readonly rrule: string }[];
}

const FILE = join(process.cwd(), 'test/reference/data/recurrence/throughput-mix.json');
const BAR = 20;
const ROUNDS = 3;

/**
 * Reads and expands 10,000 schedules over 2025, by our engine and by the rrule package called
 * plainly, in turns in one process. Times are the median of the rounds, reading of the rule included.
 * The bar counts our slower form, which writes every occurrence out as text.
 */
export function benchRecurrence(): BenchReport {
  const mix = JSON.parse(readFileSync(FILE, 'utf8')) as ThroughputMix;
  const rounds = Array.from({ length: ROUNDS }, () => ({
    numbers: timed(() => byNumbers(mix)),
    text: timed(() => byText(mix)),
    rrule: timed(() => byRrule(mix)),
  }));
  const [first] = rounds;
  if (!first) throw new Error('No round was run.');
  const expected = first.rrule.result.map((list) => list.map((date) => date.getTime() / 1000));
  const identical =
    first.numbers.result.every((list, i) => sameList(list, expected[i])) &&
    first.text.result.every((list, i) => sameList(list, expected[i]?.map(fromWallSeconds)));
  const occurrences = expected.reduce((sum, list) => sum + list.length, 0);
  const numbers = median(rounds.map((round) => round.numbers.seconds));
  const text = median(rounds.map((round) => round.text.seconds));
  const rrule = median(rounds.map((round) => round.rrule.seconds));
  const ratio = rrule / text;
  return {
    bench: 'recurrence',
    bar: `identical results, at least ${BAR} times the rrule package`,
    met: identical && ratio >= BAR,
    figures: [
      { name: 'schedules', value: mix.schedules.length },
      { name: 'occurrences', value: occurrences },
      { name: 'identical', value: identical },
      { name: 'rrule package', value: round(rrule, 3), unit: 's' },
      { name: 'ours, as text', value: round(text, 3), unit: 's' },
      { name: 'ours, as numbers', value: round(numbers, 3), unit: 's' },
      { name: 'ratio, as text', value: round(ratio, 1) },
      { name: 'ratio, as numbers', value: round(rrule / numbers, 1) },
      { name: 'ours, as text', value: Math.round(occurrences / text), unit: 'occurrences/s' },
    ],
  };
}

function byNumbers({ window: [from, to], schedules }: ThroughputMix): WallSeconds[][] {
  const [first, last] = [toWallSeconds(from), toWallSeconds(to)];
  return schedules.map(({ dtstart, rrule }) =>
    wallSecondsBetween({ startsLocal: dtstart, rrules: [rrule] }, first, last),
  );
}

function byText({ window: [from, to], schedules }: ThroughputMix): LocalDateTime[][] {
  return schedules.map(({ dtstart, rrule }) =>
    occurrencesBetween({ startsLocal: dtstart, rrules: [rrule] }, from, to),
  );
}

function byRrule({ window: [from, to], schedules }: ThroughputMix): Date[][] {
  const [first, last] = [new Date(`${from}Z`), new Date(`${to}Z`)];
  return schedules.map(({ dtstart, rrule }) =>
    new RRule({ ...RRule.parseString(rrule), dtstart: new Date(`${dtstart}Z`) }).between(
      first,
      last,
      true,
    ),
  );
}

function timed<T>(work: () => T): { readonly result: T; readonly seconds: number } {
  const begun = performance.now();
  const result = work();
  return { result, seconds: (performance.now() - begun) / 1000 };
}

function sameList<T>(a: readonly T[], b: readonly T[] | undefined): boolean {
  return a.length === b?.length && a.every((value, i) => value === b[i]);
}

function median(values: readonly number[]): number {
  return [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? NaN;
}

function round(value: number, digits: number): number {
  return Number(value.toFixed(digits));
}
