/**
 * The list with one item at another place.
 *
 * @example movedTo(['a', 'b', 'c'], 2, 0) // ['c', 'a', 'b']
 */
export function movedTo<T>(items: readonly T[], from: number, to: number): T[] {
  const moved = [...items];
  moved.splice(to, 0, ...moved.splice(from, 1));
  return moved;
}
