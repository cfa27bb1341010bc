/** Steps of the scale, worst first; each has its ink and its ground in the style sheet. */
export type HeatStep = 'none' | 'low' | 'weak' | 'fair' | 'good' | 'high';

/** Lower bounds of the steps above the lowest, as shares. A convention of ours, not a standard. */
export const HEAT_BOUNDS: readonly (readonly [number, HeatStep])[] = [
  [0.97, 'high'],
  [0.9, 'good'],
  [0.8, 'fair'],
  [0.7, 'weak'],
  [0, 'low'],
];

/**
 * The step of a rate from 0 to 1; a bound belongs to the step above it.
 *
 * @example heatStep(0.9) // 'good'
 */
export function heatStep(rate: number | null): HeatStep {
  if (rate === null || Number.isNaN(rate)) return 'none';
  return HEAT_BOUNDS.find(([bound]) => rate >= bound)?.[1] ?? 'low';
}
