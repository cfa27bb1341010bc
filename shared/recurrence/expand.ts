import {
  fromWallSeconds,
  type LocalDateTime,
  toWallSeconds,
  type WallSeconds,
} from '../calendar/local-date-time';
import { readRule } from './parse-rule';
import type { RecurrenceSet } from './rule';
import { collect, type CompiledRule, compileRule, RuleRun } from './rule-run';

/**
 * The occurrences of a set from one wall-clock time to another, both included, in order and without
 * doubles. `tzid` is the zone in which UNTIL in UTC is read; floating without it.
 *
 * @throws RangeError when a rule of the set cannot be read.
 */
export function occurrencesBetween(
  set: RecurrenceSet,
  from: LocalDateTime,
  to: LocalDateTime,
  tzid?: string,
): LocalDateTime[] {
  return wallSecondsBetween(set, toWallSeconds(from), toWallSeconds(to), tzid).map(fromWallSeconds);
}

/** {@link occurrencesBetween} in numbers, for whoever goes on calculating. */
export function wallSecondsBetween(
  set: RecurrenceSet,
  from: WallSeconds,
  to: WallSeconds,
  tzid?: string,
): WallSeconds[] {
  const rules = compileSet(set, tzid);
  const found: WallSeconds[] = [];
  for (const rule of rules) collect(rule, from, to, found);
  const extra = extraDates(set);
  if (rules.length === 1 && extra.length === 0 && !set.exdates?.length) return found;
  for (const wall of extra) if (wall >= from && wall <= to) found.push(wall);
  const excluded = new Set(set.exdates?.map(toWallSeconds));
  return [...new Set(found)].filter((wall) => !excluded.has(wall)).sort((a, b) => a - b);
}

/** The next `n` occurrences strictly after a wall-clock time; fewer where the set ends. */
export function nextOccurrences(
  set: RecurrenceSet,
  after: LocalDateTime,
  n: number,
  tzid?: string,
): LocalDateTime[] {
  const next: LocalDateTime[] = [];
  if (n <= 0) return next;
  for (const wall of eachWallSeconds(set, toWallSeconds(after) + 1, tzid)) {
    next.push(fromWallSeconds(wall));
    if (next.length === n) break;
  }
  return next;
}

/** Every occurrence from `from` (the start, if not given) on, one at a time; it may never end. */
export function* eachOccurrence(
  set: RecurrenceSet,
  from: LocalDateTime = set.startsLocal,
  tzid?: string,
): Generator<LocalDateTime, void> {
  for (const wall of eachWallSeconds(set, toWallSeconds(from), tzid)) yield fromWallSeconds(wall);
}

/** {@link eachOccurrence} in numbers. */
export function* eachWallSeconds(
  set: RecurrenceSet,
  from: WallSeconds,
  tzid?: string,
): Generator<WallSeconds, void> {
  const runs = compileSet(set, tzid).map((rule) => new RuleRun(rule, from));
  const heads = runs.map((run) => run.next());
  const extra = extraDates(set).filter((wall) => wall >= from);
  const excluded = new Set(set.exdates?.map(toWallSeconds));
  let place = 0;
  for (;;) {
    let earliest = extra[place] ?? Infinity;
    for (const head of heads) if (head < earliest) earliest = head;
    if (earliest === Infinity) return;
    for (let i = 0; i < heads.length; i++) {
      if (heads[i] === earliest) heads[i] = (runs[i] as RuleRun).next();
    }
    while (extra[place] === earliest) place++;
    if (!excluded.has(earliest)) yield earliest;
  }
}

function compileSet(set: RecurrenceSet, tzid: string | undefined): CompiledRule[] {
  const start = toWallSeconds(set.startsLocal);
  return set.rrules.map((text) => compileRule(readRule(text), start, tzid));
}

/** RDATEs in order, and the start itself where no rule says what recurs. */
function extraDates(set: RecurrenceSet): WallSeconds[] {
  const dates = (set.rdates ?? []).map(toWallSeconds);
  if (set.rrules.length === 0) dates.push(toWallSeconds(set.startsLocal));
  return dates.sort((a, b) => a - b);
}
