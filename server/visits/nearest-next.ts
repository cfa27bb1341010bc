import { type Position, distanceMetres } from '../fleet/locate-store';

/**
 * The order in which each stop is the nearest of those left, beginning at `start`; without a start
 * the first stop given stays first. Of equally near ones the one given first comes first. A quick,
 * foreseeable order, not the shortest one there is.
 *
 * @param start where the day begins, or null when that is not known
 * @example nearestNext({ latitude: 0, longitude: 0 }, [at(0, 3), at(0, 1), at(0, -1.5)]) // 1, 3, -1.5
 */
export function nearestNext<T extends Position>(start: Position | null, stops: readonly T[]): T[] {
  const left = [...stops];
  const ordered: T[] = [];
  let here: Position | null | undefined = start;
  while (left.length > 0) {
    const from = here;
    const index = from ? indexOfNearest(from, left) : 0;
    const [next] = left.splice(index, 1) as [T];
    ordered.push(next);
    here = next;
  }
  return ordered;
}

function indexOfNearest(from: Position, stops: readonly Position[]): number {
  let nearest = 0;
  let least = Infinity;
  stops.forEach((stop, index) => {
    const metres = distanceMetres(from, stop);
    if (metres < least) [nearest, least] = [index, metres];
  });
  return nearest;
}
