import { invalid } from '@shared/problem';
import { placeOfZip } from '../fleet/locate-store';

/**
 * The position that a ZIP code stands for; nothing for none.
 * @throws Problem 422 under `homePostalCode` when no such code is known
 */
export function homeOfZip(
  postalCode: string | null,
): { readonly latitude: number; readonly longitude: number } | null {
  if (postalCode === null) return null;
  const place = placeOfZip(postalCode);
  if (place) return place;
  throw invalid([
    { field: 'homePostalCode', reason: 'unknown', message: 'This ZIP code is not known.' },
  ]);
}
