import { SECONDS_PER_DAY, type WallSeconds } from '../calendar/local-date-time';
import type { Chunks } from './chunks';
import { DayFilter } from './day-filter';
import { LAST_DAY } from './day-periods';
import type { ResolvedParts } from './implied-parts';
import type { Rule } from './rule';
import { pickPositions } from './set-positions';

const SECONDS_OF = { HOURLY: 3600, MINUTELY: 60, SECONDLY: 1 } as const;

/**
 * The occurrences of an HOURLY, MINUTELY or SECONDLY rule, one chunk a day. The interval counts from
 * the start's own hour, minute or second, across days; wall-clock days all have 24 hours here, and
 * what clocks skip or repeat is settled when the occurrence becomes an instant (erratum 4271).
 */
export function withinDayChunks(
  frequency: keyof typeof SECONDS_OF,
  rule: Rule,
  parts: ResolvedParts,
  start: WallSeconds,
): Chunks {
  const unit = SECONDS_OF[frequency];
  const unitsPerDay = SECONDS_PER_DAY / unit;
  const startDay = Math.floor(start / SECONDS_PER_DAY);
  const startUnit = Math.floor(start / unit);
  const { interval } = rule;
  const filter = new DayFilter(parts);
  const skip = unitSkipper(unit, parts);
  const inUnit = secondsWithin(unit, parts);
  const offsets =
    rule.bySetPos.length > 0
      ? pickPositions(rule.bySetPos, inUnit.length).map((place) => inUnit[place] as number)
      : inUnit;
  // An interval that no allowed time of day ever meets would be searched for to the end of time.
  const barren =
    offsets.length === 0 || !everMeets(startUnit, interval, unitsPerDay, (u) => skip(u) === u);

  return {
    indexAt: (wall) => Math.floor(wall / SECONDS_PER_DAY) - startDay,
    lastIndex: barren ? -1 : LAST_DAY - startDay,
    fill(index, out) {
      const day = startDay + index;
      if (!filter.passes(day)) return 0;
      const midnight = day * SECONDS_PER_DAY;
      let filled = 0;
      let at = positiveRemainder(startUnit - day * unitsPerDay, interval);
      while (at < unitsPerDay) {
        const allowed = skip(at);
        if (allowed > at) {
          at += Math.ceil((allowed - at) / interval) * interval;
          continue;
        }
        for (const offset of offsets) out[filled++] = midnight + at * unit + offset;
        at += interval;
      }
      return filled;
    },
  };
}

/**
 * For a unit of the day: the unit itself where BYHOUR, BYMINUTE and BYSECOND let it pass, else the
 * first unit after the hour or minute that does not pass.
 */
function unitSkipper(unit: number, parts: ResolvedParts): (at: number) => number {
  const hours = allowedIn(24, parts.byHour);
  const minutes = allowedIn(60, parts.byMinute);
  const seconds = allowedIn(60, parts.bySecond);
  const unitsPerHour = 3600 / unit;
  const unitsPerMinute = 60 / unit;
  return (at) => {
    const hour = Math.floor(at / unitsPerHour);
    if (!hours[hour]) return (hour + 1) * unitsPerHour;
    if (unit === 3600) return at;
    const minute = Math.floor(at / unitsPerMinute);
    if (!minutes[minute % 60]) return (minute + 1) * unitsPerMinute;
    if (unit === 60) return at;
    return seconds[at % 60] ? at : at + 1;
  };
}

/** What the parts finer than the frequency expand one unit to, in seconds from its beginning. */
function secondsWithin(unit: number, { byMinute, bySecond }: ResolvedParts): number[] {
  if (unit === 1) return [0];
  if (unit === 60) return [...bySecond];
  return byMinute.flatMap((minute) => bySecond.map((second) => minute * 60 + second));
}

function allowedIn(size: number, values: readonly number[]): boolean[] {
  return Array.from({ length: size }, (_, n) => values.length === 0 || values.includes(n));
}

/** Whether counting by `interval` from `start` ever meets a unit of the day that passes. */
function everMeets(
  start: number,
  interval: number,
  unitsPerDay: number,
  passes: (unit: number) => boolean,
): boolean {
  const step = greatestCommonDivisor(interval, unitsPerDay);
  for (let at = positiveRemainder(start, step); at < unitsPerDay; at += step) {
    if (passes(at)) return true;
  }
  return false;
}

function positiveRemainder(value: number, divisor: number): number {
  return ((value % divisor) + divisor) % divisor;
}

function greatestCommonDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestCommonDivisor(b, a % b);
}
