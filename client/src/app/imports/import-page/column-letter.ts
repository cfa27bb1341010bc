/**
 * The letter of a column as spreadsheets write it, counted from 0.
 *
 * @example columnLetter(27) // 'AB'
 */
export function columnLetter(index: number): string {
  const last = String.fromCharCode(65 + (index % 26));
  return index < 26 ? last : columnLetter(Math.floor(index / 26) - 1) + last;
}
