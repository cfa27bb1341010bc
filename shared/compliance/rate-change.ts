/**
 * The change from one rate to another in percentage points, to one decimal as it is shown, or null
 * where either is missing. Taken from the rates themselves, not from their rounded words.
 *
 * @example rateChange(0.8, 0.875) // 7.5
 * @example rateChange(null, 0.875) // null
 */
export function rateChange(before: number | null, after: number | null): number | null {
  if (before === null || after === null) return null;
  const tenths = Math.round((after - before) * 1000);
  return tenths === 0 ? 0 : tenths / 10;
}
