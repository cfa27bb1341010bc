import { type CalendarDate, civilFromDayNumber } from './calendar-date';
import {
  dateOf,
  fromWallSeconds,
  type LocalDateTime,
  SECONDS_PER_DAY,
  toWallSeconds,
  type WallSeconds,
} from './local-date-time';
import { GREGORIAN_CYCLE, type ZoneOffsets, zoneOffsets } from './zone-offsets';

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
  const shift = cyclesBeyond(wall) * GREGORIAN_CYCLE;
  const { starts, offsets, index } = segmentOfWall(wall - shift, tzid);
  const skipped = isSkipped(wall - shift, starts, offsets, index);
  return (wall - entry(offsets, skipped ? index - 1 : index)) * 1000;
}

/**
 * Whether clocks in `tzid` show a wall-clock time once, never (they skip it) or twice.
 * @throws RangeError when the machine knows no such zone.
 */
export function timesShown(local: LocalDateTime, tzid: string): 'once' | 'never' | 'twice' {
  const wall = toWallSeconds(local);
  const shifted = wall - cyclesBeyond(wall) * GREGORIAN_CYCLE;
  const { starts, offsets, index } = segmentOfWall(shifted, tzid);
  if (isSkipped(shifted, starts, offsets, index)) return 'never';
  const next = starts[index + 1];
  const again = next !== undefined && shifted - entry(offsets, index + 1) >= next;
  return again ? 'twice' : 'once';
}

/** The first spell of one offset that has not ended when its clocks show the wall-clock time. */
function segmentOfWall(wall: WallSeconds, tzid: string): ZoneOffsets & { readonly index: number } {
  const year = tabledYear(wall);
  // No zone is a whole day from UTC, so the instant lies within a day of the wall time read as UTC.
  const { starts, offsets } = zoneOffsets(tzid, year - 1, year + 1);
  let index = segmentAt(starts, wall - SECONDS_PER_DAY);
  while (index + 1 < starts.length && wall - entry(offsets, index) >= entry(starts, index + 1)) {
    index++;
  }
  return { starts, offsets, index };
}

function isSkipped(
  wall: WallSeconds,
  starts: readonly number[],
  offsets: readonly number[],
  index: number,
): boolean {
  return index > 0 && wall - entry(offsets, index) < entry(starts, index);
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
  return entry(offsets, segmentAt(starts, shifted));
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

/** An entry that is known to be there. */
function entry(entries: readonly number[], index: number): number {
  return entries[index] as number;
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
