import { instantOfWall, wallAt } from '../calendar/instant-of';
import {
  fromWallSeconds,
  type LocalDateTime,
  SECONDS_PER_DAY,
  type WallSeconds,
} from '../calendar/local-date-time';
import { eachWallSeconds, wallSecondsBetween } from './expand';
import type { RecurrenceSet } from './rule';

/** An occurrence on the wall clock of its zone and as an instant (epoch milliseconds). */
export interface ZonedOccurrence {
  readonly local: LocalDateTime;
  readonly instant: number;
}

/**
 * The occurrences of a set in a zone from one instant to another (epoch milliseconds), both included,
 * in order of the instants. Where clocks change, two wall times can mean the same instant (02:30,
 * which is skipped, and 03:30); it counts once, under the earlier wall time.
 */
export function zonedOccurrencesBetween(
  set: RecurrenceSet,
  tzid: string,
  from: number,
  to: number,
): ZonedOccurrence[] {
  const walls = wallSecondsBetween(
    set,
    wallAt(from, tzid) - SECONDS_PER_DAY,
    wallAt(to, tzid) + SECONDS_PER_DAY,
    tzid,
  );
  return inOrder(walls.map((wall) => zoned(wall, tzid))).filter(
    ({ instant }) => instant >= from && instant <= to,
  );
}

/** The next `n` occurrences strictly after an instant (epoch milliseconds), as above. */
export function nextZonedOccurrences(
  set: RecurrenceSet,
  tzid: string,
  after: number,
  n: number,
): ZonedOccurrence[] {
  const first = wallAt(after, tzid) - SECONDS_PER_DAY;
  const found: ZonedOccurrence[] = [];
  let enough = Infinity;
  for (const wall of eachWallSeconds(set, first, tzid)) {
    // Only what lies within a day on the wall clock can still come earlier as an instant.
    if (wall > enough) break;
    const occurrence = zoned(wall, tzid);
    if (occurrence.instant <= after) continue;
    found.push(occurrence);
    if (found.length === n) enough = wall + SECONDS_PER_DAY;
  }
  return inOrder(found).slice(0, n);
}

function zoned(wall: WallSeconds, tzid: string): ZonedOccurrence {
  return { local: fromWallSeconds(wall), instant: instantOfWall(wall, tzid) };
}

function inOrder(occurrences: ZonedOccurrence[]): ZonedOccurrence[] {
  return occurrences
    .sort((a, b) => a.instant - b.instant || (a.local < b.local ? -1 : 1))
    .filter(({ instant }, i, all) => i === 0 || all[i - 1]?.instant !== instant);
}
