/** The vat in section, in its 20 × 20 box: walls, rims, and how far the oil stands in it. */
export const VAT = {
  walls: 'M3 4.5 4.6 13 10 17 15.4 13 17 4.5',
  rims: 'M1.5 4.5H4M16 4.5H18.5',
  body: 'M3 4.5 4.6 13 10 17 15.4 13 17 4.5Z',
  tick: 'M6.9 9.4 9.2 11.7 13.3 7.3',
  /** The tick as an outline, wound against the body: cut out of it by the even-odd rule. */
  tickHole: 'M7.04 8.34 9.18 10.48 13.03 6.35 14.27 7.51 9.22 12.92 5.84 9.54Z',
  drop: 'M10 6.9c1.5 1.8 2.4 3 2.4 4.4a2.4 2.4 0 0 1-4.8 0c0-1.4.9-2.6 2.4-4.4z',
  stroke: 'M4.2 16.2 16.2 3.2',
  lid: 'M2 1.9H18',
} as const;

const TOP = 4.5;
const KNEE = 13;
const FLOOR = 17;

/** Half the inner width of the vat at the height `y` of its box. */
function halfWidth(y: number): number {
  return y >= KNEE ? ((FLOOR - y) / (FLOOR - KNEE)) * 5.4 : 5.4 + ((KNEE - y) / (KNEE - TOP)) * 1.6;
}

/**
 * The oil as a path: from the floor up to `level` of the height (0 empty, 1 to the rim; beyond is
 * clamped). Empty gives an empty path.
 *
 * @example oilPath(1) // the whole body
 */
export function oilPath(level: number): string {
  const share = Math.min(1, Math.max(0, level));
  if (share === 0) return '';
  const y = FLOOR - share * (FLOOR - TOP);
  const half = halfWidth(y);
  const left = `M${round(10 - half)} ${round(y)}`;
  const right = `L${round(10 + half)} ${round(y)}Z`;
  return y < KNEE ? `${left}L4.6 13 10 17 15.4 13${right}` : `${left}L10 17${right}`;
}

/** The point on the right wall at `level`, for marks. */
export function wallPoint(level: number): { readonly x: number; readonly y: number } {
  const y = FLOOR - Math.min(1, Math.max(0, level)) * (FLOOR - TOP);
  return { x: round(10 + halfWidth(y)), y: round(y) };
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}
