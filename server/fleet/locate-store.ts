import { Geodesic } from 'geographiclib-geodesic';
import tzLookup from '@photostructure/tz-lookup';
import { lookup } from 'zipcodes';

/** Degrees on WGS 84, north and east positive. */
export interface Position {
  readonly latitude: number;
  readonly longitude: number;
}

export interface ZipPlace extends Position {
  readonly city: string;
  readonly usState: string;
}

/**
 * The centroid of a ZIP code (with or without its four more digits); undefined for one unknown.
 *
 * @example placeOfZip('60601') // near 41.886° N, 87.62° W: Chicago, IL
 */
export function placeOfZip(postalCode: string): ZipPlace | undefined {
  const five = /^(\d{5})(?:-?\d{4})?$/.exec(postalCode.trim())?.[1];
  const found = five === undefined ? undefined : lookup(five);
  if (!found) return undefined;
  const { latitude, longitude, city, state } = found;
  return { latitude, longitude, city, usState: state };
}

/**
 * The IANA time zone at a position. Near a zone's border it can be off by a few kilometres, which is
 * why a store's zone may also be said outright.
 */
export function timeZoneAt({ latitude, longitude }: Position): string {
  return tzLookup(latitude, longitude);
}

/** Length in metres of the shortest path on the WGS 84 ellipsoid (Karney 2013, exact to nanometres). */
export function distanceMetres(from: Position, to: Position): number {
  const path = Geodesic.WGS84.Inverse(
    from.latitude,
    from.longitude,
    to.latitude,
    to.longitude,
    Geodesic.DISTANCE,
  );
  return path.s12 as number;
}

/** Whether the runtime knows this IANA zone. */
export function isTimeZone(zone: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: zone });
    return true;
  } catch {
    return false;
  }
}
