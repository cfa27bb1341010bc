import { instantOfWall, wallAt } from '../calendar/instant-of';
import {
  type LocalDateTime,
  SECONDS_PER_DAY,
  toWallSeconds,
  type WallSeconds,
} from '../calendar/local-date-time';
import { type Chunks, chunksOf } from './chunks';
import type { Rule, Until } from './rule';

/** A rule made ready to be followed from its start. */
export interface CompiledRule {
  readonly start: WallSeconds;
  readonly chunks: Chunks;
  /** Infinity without COUNT. */
  readonly count: number;
  /** No occurrence comes after it; Infinity without UNTIL. */
  readonly last: WallSeconds;
  /** What UNTIL excludes although it lies before `last`, where the two clocks disagree. */
  readonly excludes: ((wall: WallSeconds) => boolean) | null;
}

/**
 * Makes a rule ready. UNTIL in UTC is compared with the instants that occurrences have in `tzid`;
 * without a zone the wall clock is taken to be UTC's.
 */
export function compileRule(rule: Rule, start: WallSeconds, tzid?: string): CompiledRule {
  return {
    start,
    chunks: chunksOf(rule, start),
    count: rule.count ?? Infinity,
    ...untilBounds(rule.until, tzid),
  };
}

function untilBounds(
  until: Until | null,
  tzid: string | undefined,
): Pick<CompiledRule, 'last' | 'excludes'> {
  if (!until) return { last: Infinity, excludes: null };
  // A date includes the whole of its day, as whoever wrote it beside a time of day will have meant.
  if (until.form === 'date') {
    return { last: toWallSeconds(`${until.date}T23:59:59` as LocalDateTime), excludes: null };
  }
  if (until.form === 'local') return { last: toWallSeconds(until.local), excludes: null };
  const { instant } = until;
  if (tzid === undefined) return { last: instant / 1000, excludes: null };
  const local = wallAt(instant, tzid);
  return {
    // Within a day of a change of the clocks the order of wall times is not that of instants.
    last: local + SECONDS_PER_DAY,
    excludes: (wall) => wall > local - SECONDS_PER_DAY && instantOfWall(wall, tzid) > instant,
  };
}

/** Follows one rule, occurrence by occurrence. */
export class RuleRun {
  private readonly buffer: WallSeconds[] = [];
  private filled = 0;
  private place = 0;
  private index: number;
  private left: number;

  /** Starts at the first occurrence at or after `from`. */
  constructor(
    private readonly rule: CompiledRule,
    private readonly from: WallSeconds,
  ) {
    this.left = rule.count;
    this.index = firstChunk(rule, from);
  }

  /** The next occurrence, or Infinity after the last. */
  next(): WallSeconds {
    const { start, last, excludes, chunks } = this.rule;
    while (this.left > 0) {
      while (this.place === this.filled) {
        if (this.index > chunks.lastIndex) return Infinity;
        this.filled = chunks.fill(this.index++, this.buffer);
        this.place = 0;
      }
      const wall = this.buffer[this.place++] as number;
      if (wall > last) break;
      if (wall < start || (excludes !== null && excludes(wall))) continue;
      this.left--;
      if (wall >= this.from) return wall;
    }
    this.left = 0;
    return Infinity;
  }
}

/** Appends the occurrences from `from` to `to`, both included, to `out`: the fast way through. */
export function collect(
  rule: CompiledRule,
  from: WallSeconds,
  to: WallSeconds,
  out: WallSeconds[],
): void {
  const { start, chunks, excludes } = rule;
  const end = Math.min(to, rule.last);
  const lastIndex =
    end === Infinity ? chunks.lastIndex : Math.min(chunks.lastIndex, chunks.indexAt(end));
  const buffer: WallSeconds[] = [];
  let left = rule.count;
  for (let index = firstChunk(rule, from); index <= lastIndex; index++) {
    const filled = chunks.fill(index, buffer);
    for (let i = 0; i < filled; i++) {
      const wall = buffer[i] as number;
      if (wall < start) continue;
      if (wall > end) return;
      if (excludes !== null && excludes(wall)) continue;
      if (wall >= from) out.push(wall);
      if (--left === 0) return;
    }
  }
}

/** COUNT has to be counted from the very first; everything else can be entered anywhere. */
function firstChunk(rule: CompiledRule, from: WallSeconds): number {
  if (rule.count !== Infinity || from <= rule.start) return 0;
  return from === Infinity ? rule.chunks.lastIndex + 1 : Math.max(0, rule.chunks.indexAt(from));
}
