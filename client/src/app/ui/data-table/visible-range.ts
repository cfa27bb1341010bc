export interface VisibleRange {
  readonly start: number;
  /** Exclusive. */
  readonly end: number;
}

/**
 * Which rows to draw of a long list with rows of one height, with `extra` rows above and below so
 * that a quick scroll meets no hole. All lengths in pixels.
 *
 * @example visibleRange(4400, 600, 44, 1000, 10) // { start: 90, end: 124 }
 */
export function visibleRange(
  scrolled: number,
  height: number,
  rowHeight: number,
  count: number,
  extra: number,
): VisibleRange {
  const first = Math.floor(Math.max(0, scrolled) / rowHeight);
  const last = Math.ceil((Math.max(0, scrolled) + height) / rowHeight);
  const start = Math.max(0, Math.min(count, first - extra));
  return { start, end: Math.max(start, Math.min(count, last + extra)) };
}
