import type { Observable, OperatorFunction } from 'rxjs';
import { catchError, debounceTime, distinctUntilChanged, map, of, switchMap } from 'rxjs';
import type { FleetApi, FoundPlace, PlaceQuery } from '../fleet-api';
import type { StoreForm } from './store-form-model';

/** Where what stands in the form lies: asked once typing rests, null where nobody can say. */
export function placeOf(
  form: StoreForm,
  api: FleetApi,
): OperatorFunction<unknown, FoundPlace | null | undefined> {
  const ask = (query: PlaceQuery): Observable<FoundPlace | null | undefined> =>
    Object.keys(query).length === 0
      ? of(undefined)
      : api.locate(query).pipe(
          map(({ place }) => place),
          catchError(() => of(undefined)),
        );
  return (changes) =>
    changes.pipe(
      debounceTime(350),
      map(() => questionOf(form)),
      distinctUntilChanged((a, b) => JSON.stringify(a) === JSON.stringify(b)),
      switchMap(ask),
    );
}

function questionOf(form: StoreForm): PlaceQuery {
  const { positionGiven, position, postalCode } = form.getRawValue();
  const { latitude, longitude } = position;
  if (positionGiven && form.controls.position.valid && latitude !== null && longitude !== null) {
    return { latitude, longitude };
  }
  return /^\d{5}/.test(postalCode.trim()) ? { postalCode: postalCode.trim() } : {};
}
