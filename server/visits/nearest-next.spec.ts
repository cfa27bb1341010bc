import fc from 'fast-check';
import { distanceMetres } from '../fleet/locate-store';
import { nearestNext } from './nearest-next';

const at = (latitude: number, longitude: number) => ({ latitude, longitude });

describe('nearestNext', () => {
  it('goes from home to the nearest, and from each to the nearest left', () => {
    const [far, near, behind] = [at(0, 3), at(0, 1), at(0, -1.5)];
    // From 1° east the stop at 3° is 2° away and the one at 1.5° west is 2.5° away.
    expect(nearestNext(at(0, 0), [far, near, behind])).toEqual([near, far, behind]);
  });

  it('measures on the ellipsoid, not in degrees', () => {
    // One degree of longitude at 60° N is 55.8 km, half a degree and a bit of latitude is 66.8 km
    // (Karney's geodesic on WGS 84): in degrees the order would be the other way round.
    const [east, north] = [at(60, 1), at(60.6, 0)];
    expect(nearestNext(at(60, 0), [north, east])).toEqual([east, north]);
  });

  it('crosses the date line the short way', () => {
    const [across, before] = [at(52, -179.9), at(52, 179)];
    expect(nearestNext(at(52, 179.8), [before, across])).toEqual([across, before]);
  });

  it('keeps the first stop first where no home is known, and ties in their order', () => {
    const [first, second, third] = [at(0, 9), at(0, 0), at(0, 8)];
    expect(nearestNext(null, [first, second, third])).toEqual([first, third, second]);
    const [one, two] = [at(0, 1), at(0, -1)];
    expect(nearestNext(at(0, 0), [two, one])[0]).toBe(two);
    expect(nearestNext(at(0, 0), [])).toEqual([]);
  });

  it('visits every stop once, each the nearest of those left', () => {
    const place = fc.record({
      latitude: fc.double({ min: -80, max: 80, noNaN: true }),
      longitude: fc.double({ min: -180, max: 180, noNaN: true }),
    });
    fc.assert(
      fc.property(place, fc.array(place, { maxLength: 12 }), (home, stops) => {
        const ordered = nearestNext(home, stops);
        expect(new Set(ordered)).toEqual(new Set(stops));
        expect(ordered).toHaveLength(stops.length);
        ordered.forEach((stop, index) => {
          const from = ordered[index - 1] ?? home;
          const leg = distanceMetres(from, stop);
          for (const later of ordered.slice(index + 1)) {
            expect(leg).toBeLessThanOrEqual(distanceMetres(from, later));
          }
        });
      }),
      { numRuns: 60 },
    );
  });
});
