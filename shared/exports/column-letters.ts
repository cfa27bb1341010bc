/**
 * A column as spreadsheets name it, counted from 0.
 *
 * @example columnLetters(0) // 'A'; columnLetters(27) // 'AB'
 */
export function columnLetters(index: number): string {
  const last = String.fromCharCode(65 + (index % 26));
  return index < 26 ? last : columnLetters(Math.floor(index / 26) - 1) + last;
}

/**
 * The other way round; -1 for what names no column.
 *
 * @example columnIndex('AB') // 27
 */
export function columnIndex(letters: string): number {
  if (!/^[A-Z]{1,3}$/.test(letters)) return -1;
  return [...letters].reduce((sum, letter) => sum * 26 + letter.charCodeAt(0) - 64, 0) - 1;
}
