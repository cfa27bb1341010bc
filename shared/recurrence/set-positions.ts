/**
 * The places that BYSETPOS picks from a set of `size`, from 0, in order and without doubles
 * (RFC 5545, 3.3.10). Positions outside the set pick nothing.
 *
 * @example pickPositions([1, -1], 3) // [0, 2]
 */
export function pickPositions(bySetPos: readonly number[], size: number): number[] {
  const places: number[] = [];
  for (const position of bySetPos) {
    const place = position > 0 ? position - 1 : size + position;
    if (place >= 0 && place < size && !places.includes(place)) places.push(place);
  }
  return places.length > 1 ? places.sort((a, b) => a - b) : places;
}
