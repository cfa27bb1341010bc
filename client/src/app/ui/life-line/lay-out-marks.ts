/** What happened to a component at a moment. */
export type LifeKind = 'installed' | 'inspected' | 'found' | 'repaired' | 'replaced' | 'judged';

export interface LifeMark {
  readonly id: string;
  readonly kind: LifeKind;
  /** Epoch milliseconds. */
  readonly at: number;
}

export interface PlacedMark<M extends LifeMark> {
  readonly mark: M;
  /** Along the axis, 0 to 100. */
  readonly percent: number;
  /** 0 lies on the axis; close neighbours climb. */
  readonly lane: number;
}

/**
 * Places marks along an axis from `from` to `to` (epoch milliseconds), in order of time. A mark
 * nearer than `gap` percent to one before it climbs to the first lane that is free there; from
 * the last of `lanes` on they overlap.
 */
export function layOutMarks<M extends LifeMark>(
  marks: readonly M[],
  from: number,
  to: number,
  gap = 2.6,
  lanes = 4,
): readonly PlacedMark<M>[] {
  const whole = Math.max(1, to - from);
  const ends: number[] = Array.from({ length: lanes }, () => -Infinity);
  return [...marks]
    .sort((a, b) => a.at - b.at)
    .map((mark) => {
      const percent = Math.min(100, Math.max(0, ((mark.at - from) / whole) * 100));
      const free = ends.findIndex((end) => percent - end >= gap);
      const lane = free === -1 ? lanes - 1 : free;
      ends[lane] = percent;
      return { mark, percent, lane };
    });
}

/**
 * The ticks of the axis: starts of years, or of months where the axis is shorter than eighteen
 * months, in UTC. At most about twenty.
 */
export function axisTicks(from: number, to: number): readonly { at: number; year: boolean }[] {
  const months = (to - from) / 2_629_800_000;
  const step = months <= 18 ? 1 : months <= 40 ? 3 : 12;
  const start = new Date(from);
  const ticks: { at: number; year: boolean }[] = [];
  for (let month = Math.ceil(start.getUTCMonth() / step) * step; ; month += step) {
    const at = Date.UTC(start.getUTCFullYear(), month, 1);
    if (at > to) return ticks;
    if (at >= from) ticks.push({ at, year: month % 12 === 0 });
  }
}
