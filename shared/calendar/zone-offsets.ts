import { dayNumber } from './calendar-date';

/**
 * The offsets of one time zone from UTC, as the machine's time-zone data has them: the offset
 * `offsets[i]` holds from `starts[i]` up to `starts[i + 1]`. All numbers are seconds; instants count
 * from the POSIX epoch. The table covers whole years and grows to the years that are asked for.
 */
export interface ZoneOffsets {
  readonly starts: readonly number[];
  readonly offsets: readonly number[];
}

interface Table extends ZoneOffsets {
  readonly starts: number[];
  readonly offsets: number[];
  firstYear: number;
  lastYear: number;
  readonly offsetAt: (instant: number) => number;
}

/**
 * No two changes of one zone lie this close, so sampling at this distance misses none: the shortest
 * spell in the tz database (2025b) is Freetown's of 1939, just under four days.
 */
const SAMPLE = 3 * 86_400;

/** Longest cycle of the Gregorian calendar, after which weekdays and leap years repeat, in seconds. */
export const GREGORIAN_CYCLE = 146_097 * 86_400;

const tables = new Map<string, Table>();

/**
 * The offsets of `tzid` over at least the given UTC years.
 * @throws RangeError when the machine knows no such zone.
 */
export function zoneOffsets(tzid: string, firstYear: number, lastYear: number): ZoneOffsets {
  let table = tables.get(tzid);
  if (!table) {
    const offsetAt = offsetReader(tzid);
    const start = yearStart(firstYear);
    table = {
      starts: [start],
      offsets: [offsetAt(start)],
      firstYear,
      lastYear: firstYear - 1,
      offsetAt,
    };
    tables.set(tzid, table);
  }
  if (lastYear > table.lastYear) extendForward(table, lastYear);
  if (firstYear < table.firstYear) extendBackward(table, firstYear);
  return table;
}

/** Whether the machine's time-zone data has a zone of this name. */
export function isTimeZone(tzid: string): boolean {
  try {
    // A bare offset such as +02:00 is accepted by newer engines; it is no zone of the tz database.
    return /^[A-Za-z]/.test(tzid) && Boolean(new Intl.DateTimeFormat('en', { timeZone: tzid }));
  } catch {
    return false;
  }
}

function yearStart(year: number): number {
  return dayNumber(year, 1, 1) * 86_400;
}

function extendForward(table: Table, lastYear: number): void {
  changesBetween(table, yearStart(table.lastYear + 1), yearStart(lastYear + 1), (at, offset) => {
    table.starts.push(at);
    table.offsets.push(offset);
  });
  table.lastYear = lastYear;
}

function extendBackward(table: Table, firstYear: number): void {
  const from = yearStart(firstYear);
  const starts = [from];
  const offsets = [table.offsetAt(from)];
  changesBetween(table, from, yearStart(table.firstYear), (at, offset) => {
    starts.push(at);
    offsets.push(offset);
  });
  // The old first entry began at a year's start, where no change need have been.
  const sameOffset = offsets[offsets.length - 1] === table.offsets[0];
  table.starts.splice(0, sameOffset ? 1 : 0, ...starts);
  table.offsets.splice(0, sameOffset ? 1 : 0, ...offsets);
  table.firstYear = firstYear;
}

/** Reports each change of offset in (from, to], found by sampling and then halving. */
function changesBetween(
  { offsetAt }: Table,
  from: number,
  to: number,
  report: (at: number, offset: number) => void,
): void {
  let [before, offset] = [from, offsetAt(from)];
  while (before < to) {
    const after = Math.min(before + SAMPLE, to);
    const next = offsetAt(after);
    if (next !== offset) {
      let [low, high] = [before, after];
      while (high - low > 1) {
        const middle = Math.floor((low + high) / 2);
        if (offsetAt(middle) === offset) low = middle;
        else high = middle;
      }
      report(high, next);
      offset = next;
    }
    before = after;
  }
}

function offsetReader(tzid: string): (instant: number) => number {
  const format = new Intl.DateTimeFormat('en-US', {
    timeZone: tzid,
    hourCycle: 'h23',
    calendar: 'gregory',
    era: 'short',
    year: 'numeric',
    month: 'numeric',
    day: 'numeric',
    hour: 'numeric',
    minute: 'numeric',
    second: 'numeric',
  });
  return (instant) => {
    const part: Record<string, string> = {};
    for (const { type, value } of format.formatToParts(instant * 1000)) part[type] = value;
    const year = part.era === 'BC' ? 1 - Number(part.year) : Number(part.year);
    const day = dayNumber(year, Number(part.month), Number(part.day));
    const wall =
      day * 86_400 + Number(part.hour) * 3600 + Number(part.minute) * 60 + Number(part.second);
    return wall - instant;
  };
}
