import type { DayHours } from '@shared/fleet/store-hours';

/** A piece of a day's bar, in percent of its width. */
export interface Span {
  readonly start: number;
  readonly width: number;
}

/** The bar of a day runs from four in the morning to four the next, so that late hours fit in. */
const STARTS_AT = 4 * 60;
const DAY = 24 * 60;

/**
 * Where a day's bar is open and where it rushes. A close at or before the opening lies after
 * midnight; what would reach past four in the morning is cut there.
 *
 * @example daySpans({ open: '10:00', close: '22:00', rush: [] }).open // { start: 25, width: 50 }
 */
export function daySpans(day: DayHours | null): {
  readonly open: Span | null;
  readonly rush: readonly Span[];
} {
  if (day === null) return { open: null, rush: [] };
  const { open, close, rush } = day;
  return {
    open: open === null || close === null ? null : span(open, close),
    rush: rush.map(({ from, to }) => span(from, to)),
  };
}

function span(from: string, to: string): Span {
  const start = placed(from);
  const end = placed(to) > start ? placed(to) : DAY;
  return { start: (start / DAY) * 100, width: ((end - start) / DAY) * 100 };
}

/** Minutes after the bar's beginning. */
function placed(time: string): number {
  const [hour = 0, minute = 0] = time.split(':').map(Number);
  return (hour * 60 + minute - STARTS_AT + DAY) % DAY;
}
