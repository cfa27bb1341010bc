import { type CalendarDate, civilFromDayNumber } from './calendar-date';
import {
  dateOf,
  fromWallSeconds,
  type LocalDateTime,
  SECONDS_PER_DAY,
  toWallSeconds,
  type WallSeconds,
} from './local-date-time';
import { GREGORIAN_CYCLE, zoneOffsets } from './zone-offsets';

/** Before it no zone of the tz database ever changed; its first offset holds back for ever. */
const FIRST_TABLED_YEAR = 1800;

/** From here on a zone's rules repeat as the calendar does, every 400 years. */
const LAST_TABLED_YEAR = 2400;

/**
 * The instant, in epoch milliseconds, at which clocks in `tzid` show `local`, by RFC 5545, 3.3.5: a
 * time that clocks skip is read with the offset from before the gap, and of a time that they show
 * twice the first is meant.
 *
 * @example instantOf('2007-03-11T02:30:00', 'America/New_York') // 2007-03-11T07:30:00Z, 03:30 EDT
 * @throws RangeError when the machine knows no such zone.
 */
export function instantOf(local: LocalDateTime, tzid: string): number {
  return instantOfWall(toWallSeconds(local), tzid);
}

/** {@link instantOf} for a wall-clock time given as a number. */
export function instantOfWall(wall: WallSeconds, tzid: string): number {
  const cycles = cyclesBeyond(wall);
  const shifted = wall - cycles * GREGORIAN_CYCLE;
  const year = tabledYear(shifted);
  // No zone is a whole day from UTC, so the instant lies within a day of the wall time read as UTC.
  const { starts, offsets } = zoneOffsets(tzid, year - 1, year + 1);
  let i = segmentAt(starts, shifted - SECONDS_PER_DAY);
  for (; i + 1 < starts.length; i++) {
    if (shifted - offset(offsets, i) < (starts[i + 1] as number)) break;
  }
  const instant = shifted - offset(offsets, i);
  const skipped = i > 0 && instant < (starts[i] as number);
  const settled = skipped ? shifted - offset(offsets, i - 1) : instant;
  return (settled + cycles * GREGORIAN_CYCLE) * 1000;
}

/** What clocks in `tzid` show at an instant (epoch milliseconds; parts of a second fall away). */
export function localAt(instant: number, tzid: string): LocalDateTime {
  return fromWallSeconds(wallAt(instant, tzid));
}

/** {@link localAt} as a number, for any year. */
export function wallAt(instant: number, tzid: string): WallSeconds {
  return Math.floor(instant / 1000) + offsetAt(instant, tzid);
}

/** The calendar date in `tzid` at an instant (epoch milliseconds). */
export function dateAt(instant: number, tzid: string): CalendarDate {
  return dateOf(localAt(instant, tzid));
}

/** Seconds by which clocks in `tzid` are ahead of UTC at an instant (epoch milliseconds). */
export function offsetAt(instant: number, tzid: string): number {
  const second = Math.floor(instant / 1000);
  const shifted = second - cyclesBeyond(second) * GREGORIAN_CYCLE;
  const year = tabledYear(shifted);
  const { starts, offsets } = zoneOffsets(tzid, year, year);
  return offset(offsets, segmentAt(starts, shifted));
}

/** How many whole 400-year cycles to go back so that the table stays small. */
function cyclesBeyond(seconds: number): number {
  const year = 1970 + seconds / (365.2425 * SECONDS_PER_DAY);
  return year < LAST_TABLED_YEAR ? 0 : Math.ceil((year - LAST_TABLED_YEAR) / 400);
}

function tabledYear(seconds: number): number {
  const { year } = civilFromDayNumber(Math.floor(seconds / SECONDS_PER_DAY));
  return Math.max(FIRST_TABLED_YEAR, year);
}

function offset(offsets: readonly number[], index: number): number {
  return offsets[index] as number;
}

/** The last entry that starts at or before the second, or the first entry of all. */
function segmentAt(starts: readonly number[], second: number): number {
  let [low, high] = [0, starts.length - 1];
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if ((starts[middle] as number) <= second) low = middle;
    else high = middle - 1;
  }
  return low;
}
