import { instantOf, timesShown } from '@shared/calendar/instant-of';
import {
  type LocalDateTime,
  parseLocalDateTime,
  readBasicDateTime,
} from '@shared/calendar/local-date-time';
import { eachOccurrence } from '@shared/recurrence/expand';
import type { RecurrenceSet } from '@shared/recurrence/rule';
import { nextZonedOccurrences } from '@shared/recurrence/zoned-occurrences';
import type { ReferenceReport } from '../reference-report';
import {
  holdsExamples,
  holdsVectors,
  type RfcExample,
  type RfcExamples,
  type Vector,
} from './recurrence-file';

/** Whether a case came out right, and how many occurrences were compared. */
interface Outcome {
  readonly id: string;
  readonly right: boolean;
  readonly occurrences: number;
}

/** Earlier than any start: everything comes after it. */
const LONG_AGO = Date.parse('0000-01-01T00:00:00Z');

/**
 * Checks a parsed reference file of any of the four forms, told apart by its keys.
 * @throws Error when it is none of them.
 */
export function checkRecurrenceFile(file: unknown): ReferenceReport {
  const outcomes = holdsExamples(file)
    ? checkExamples(file)
    : holdsVectors(file)
      ? file.vectors.filter(({ decided }) => decided !== false).map(checkVector)
      : null;
  if (!outcomes) throw new Error('The file holds neither examples nor vectors.');
  const failures = outcomes.filter(({ right }) => !right).map(({ id }) => id);
  return {
    cases: outcomes.length,
    failed: failures.length,
    failures,
    occurrences: outcomes.reduce((sum, { occurrences }) => sum + occurrences, 0),
  };
}

function checkExamples(file: RfcExamples): Outcome[] {
  return [
    ...file.examples.map(checkExample),
    ...(file.dst_cases ?? []).map(({ id, local, tzid, utc }) => ({
      id,
      right: instantOf(read(local), tzid) === readUtc(utc),
      occurrences: 1,
    })),
    ...(file.dst_rule_sequences ?? []).map(({ dtstart, rrule, tzid, expected_utc }, i) =>
      checked(`dst-rule-${i + 1}`, () =>
        rightInstants(setOf(dtstart, [rrule]), tzid, expected_utc, /COUNT|UNTIL/.test(rrule)),
      ),
    ),
  ];
}

/** Checks one worked example of the RFC, each of its equivalent rules by itself. */
export function checkExample(example: RfcExample): Outcome {
  const { dtstart, complete, expected_local, expected_utc } = example;
  const tzid = example.tzid ?? undefined;
  const ruleLists = example.rrules.length > 0 ? example.rrules.map((rule) => [rule]) : [[]];
  return checked(String(example.id), () =>
    ruleLists.reduce((sum, rrules) => {
      const set = setOf(dtstart, rrules, example.exdate ?? [], example.rdate ?? []);
      const locals = expected_local ? rightLocals(set, tzid, expected_local, complete) : 0;
      const instants = expected_utc
        ? rightInstants(set, tzid ?? 'UTC', expected_utc, complete)
        : locals;
      return sum + Math.max(locals, instants);
    }, 0),
  );
}

/** Checks one vector: its wall-clock times, and in a zone its instants, gaps and repeats. */
export function checkVector(vector: Vector): Outcome {
  const { id, dtstart, rrule, tzid, complete } = vector;
  const set = setOf(dtstart, [rrule]);
  return checked(id, () => {
    const expected = vector.occurrences ?? vector.expected ?? vector.local;
    if (!expected) throw new Mismatch('The case expects nothing.');
    const compared = rightLocals(set, tzid, expected, complete);
    if (tzid !== undefined && vector.utc) {
      rightInstants(set, tzid, vector.utc, complete);
      const shown = expected.map((local) => timesShown(read(local), tzid));
      same(placesOf(shown, 'never'), vector.gap ?? []);
      same(placesOf(shown, 'twice'), vector.ambiguous ?? []);
    }
    return compared;
  });
}

class Mismatch extends Error {}

function checked(id: string, compare: () => number): Outcome {
  try {
    return { id, right: true, occurrences: compare() };
  } catch (error) {
    // A rule that should be readable and is refused fails its case like a wrong date.
    if (error instanceof Mismatch || error instanceof RangeError) {
      return { id, right: false, occurrences: 0 };
    }
    throw error;
  }
}

function rightLocals(
  set: RecurrenceSet,
  tzid: string | undefined,
  expected: readonly string[],
  complete: boolean,
): number {
  const most = expected.length + (complete ? 1 : 0);
  const found: LocalDateTime[] = [];
  if (most > 0) {
    for (const local of eachOccurrence(set, undefined, tzid)) {
      found.push(local);
      if (found.length === most) break;
    }
  }
  same(found, expected.map(read));
  return found.length;
}

function rightInstants(
  set: RecurrenceSet,
  tzid: string,
  expected: readonly string[],
  complete: boolean,
): number {
  const most = expected.length + (complete ? 1 : 0);
  const found = nextZonedOccurrences(set, tzid, LONG_AGO, most).map(({ instant }) => instant);
  same(found, expected.map(readUtc));
  return found.length;
}

function same(found: readonly (string | number)[], expected: readonly (string | number)[]): void {
  if (found.length !== expected.length || found.some((value, i) => value !== expected[i])) {
    throw new Mismatch(`Expected ${expected.join(' ')}; found ${found.join(' ')}.`);
  }
}

function placesOf(shown: readonly string[], kind: string): number[] {
  return shown.flatMap((value, i) => (value === kind ? [i] : []));
}

function setOf(
  dtstart: string,
  rrules: readonly string[],
  exdates: readonly string[] = [],
  rdates: readonly string[] = [],
): RecurrenceSet {
  return {
    startsLocal: read(dtstart),
    rrules,
    exdates: exdates.map(read),
    rdates: rdates.map(read),
  };
}

/** Reads a wall-clock time in the RFC's form or in ISO 8601's; a date stands for its midnight. */
function read(text: string): LocalDateTime {
  if (/^\d{8}$/.test(text)) return read(`${text}T000000`);
  if (/^\d{4}-\d\d-\d\d$/.test(text)) return read(`${text}T00:00:00`);
  return readBasicDateTime(text) ?? parseLocalDateTime(text);
}

function readUtc(text: string): number {
  return Date.parse(`${read(text.replace(/Z$/, ''))}Z`);
}
