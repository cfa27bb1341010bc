import { SECONDS_PER_DAY, type WallSeconds } from '../calendar/local-date-time';
import { dayPeriods } from './day-periods';
import { resolveParts } from './implied-parts';
import type { Rule } from './rule';
import { pickPositions } from './set-positions';
import { withinDayChunks } from './within-day';

/**
 * The occurrences of a rule in consecutive chunks, numbered from 0 for the one with the start: an
 * interval of the rule, or a day of it where it recurs within days. COUNT, UNTIL and the start itself
 * are not looked at here.
 */
export interface Chunks {
  /** The chunk with the wall-clock time, or the last one before it; negative before the first. */
  indexAt(wall: WallSeconds): number;
  readonly lastIndex: number;
  /** Writes a chunk's occurrences into `out`, in order and without doubles; answers how many. */
  fill(index: number, out: WallSeconds[]): number;
}

/** The chunks of a rule that starts at the wall-clock time `start`. */
export function chunksOf(rule: Rule, start: WallSeconds): Chunks {
  const parts = resolveParts(rule, start);
  const startDay = Math.floor(start / SECONDS_PER_DAY);
  if (
    rule.frequency === 'HOURLY' ||
    rule.frequency === 'MINUTELY' ||
    rule.frequency === 'SECONDLY'
  ) {
    return withinDayChunks(rule.frequency, rule, parts, start);
  }
  const periods = dayPeriods(rule, parts, startDay);
  const times = timesOfDay(parts.byHour, parts.byMinute, parts.bySecond);
  const days: number[] = [];
  const { bySetPos } = rule;
  const single = times.length === 1 && bySetPos.length === 0 ? (times[0] as number) : null;
  return {
    indexAt: (wall) => periods.indexAt(Math.floor(wall / SECONDS_PER_DAY)),
    lastIndex: periods.lastIndex,
    fill(index, out) {
      if (single !== null) {
        const count = periods.fill(index, out);
        for (let i = 0; i < count; i++) out[i] = (out[i] as number) * SECONDS_PER_DAY + single;
        return count;
      }
      const count = periods.fill(index, days);
      return bySetPos.length > 0
        ? fillPicked(out, days, count, times, bySetPos)
        : fillAll(out, days, count, times);
    },
  };
}

function fillAll(out: number[], days: number[], count: number, times: readonly number[]): number {
  let filled = 0;
  for (let i = 0; i < count; i++) {
    const midnight = (days[i] as number) * SECONDS_PER_DAY;
    for (const time of times) out[filled++] = midnight + time;
  }
  return filled;
}

function fillPicked(
  out: number[],
  days: number[],
  count: number,
  times: readonly number[],
  bySetPos: readonly number[],
): number {
  const places = pickPositions(bySetPos, count * times.length);
  for (let i = 0; i < places.length; i++) {
    const place = places[i] as number;
    const day = Math.floor(place / times.length);
    out[i] = (days[day] as number) * SECONDS_PER_DAY + (times[place % times.length] as number);
  }
  return places.length;
}

/** Seconds of the day of every combination, in order. */
function timesOfDay(
  hours: readonly number[],
  minutes: readonly number[],
  seconds: readonly number[],
): number[] {
  const times: number[] = [];
  for (const hour of hours) {
    for (const minute of minutes) {
      for (const second of seconds) times.push(hour * 3600 + minute * 60 + second);
    }
  }
  return times;
}
