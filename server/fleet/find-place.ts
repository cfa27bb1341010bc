import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { locateStore } from '@shared/fleet/stores-contract';
import { placeOfZip, timeZoneAt } from './locate-store';

/** Where a position, or else a ZIP code, lies; null when neither says. */
export function findPlace({
  postalCode = '',
  latitude,
  longitude,
}: QueryOf<typeof locateStore>): ReplyOf<typeof locateStore>['place'] {
  const zip = placeOfZip(postalCode);
  const given = latitude !== undefined && longitude !== undefined;
  const position = given ? { latitude, longitude } : zip;
  if (!position) return null;
  return {
    latitude: position.latitude,
    longitude: position.longitude,
    positionFrom: given ? 'coordinates' : 'postal-code',
    timeZone: timeZoneAt(position),
    city: zip?.city ?? '',
    usState: zip?.usState ?? '',
  };
}
