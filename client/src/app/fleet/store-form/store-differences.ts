import type { StoreHours } from '@shared/fleet/store-hours';
import type { FilterOption } from '../../ui/filter-bar/filter-select';
import type { FieldDifference } from '../edit-conflict/edit-conflict';
import { differencesOf } from '../edit-conflict/edit-conflict';
import type { Store, StoreBody } from '../fleet-api';
import { dayOf, openWords, rushWords, weekdayName, weekdays } from '../store-hours/hours-words';
import { bodyOfStore } from './store-form-model';

/** Names of a store's fields, by their paths. */
export function storeLabels() {
  return {
    chainId: $localize`:@@fleet.chain:Chain`,
    regionId: $localize`:@@fleet.region:Region`,
    number: $localize`:@@fleet.number:Number`,
    name: $localize`:@@fleet.name:Name`,
    addressLine: $localize`:@@fleet.street:Street and house number`,
    postalCode: $localize`:@@fleet.zip:ZIP code`,
    city: $localize`:@@fleet.city:City`,
    usState: $localize`:@@fleet.us-state:State`,
    phone: $localize`:@@fleet.phone:Phone`,
    accessNote: $localize`:@@fleet.access-note:Getting in`,
    position: $localize`:@@fleet.position:Position`,
    'position.latitude': $localize`:@@fleet.latitude:Latitude`,
    'position.longitude': $localize`:@@fleet.longitude:Longitude`,
    timeZone: $localize`:@@fleet.time-zone:Time zone`,
    hours: $localize`:@@fleet.hours:Hours`,
  };
}

/** Where a store as somebody else saved it differs from what is being sent. */
export function storeDifferences(
  theirs: Store,
  mine: StoreBody,
  groups: readonly FilterOption[],
  locale: string,
): readonly FieldDifference[] {
  const nameOf = (id: unknown) => groups.find(({ value }) => value === id)?.label ?? '';
  return differencesOf(bodyOfStore(theirs), mine, storeLabels(), (key, value) => {
    if (key === 'chainId' || key === 'regionId') return nameOf(value);
    if (key === 'hours') return weekWords(value as StoreHours, locale);
    if (key === 'position') {
      const position = value as StoreBody['position'];
      return position ? `${position.latitude}, ${position.longitude}` : '';
    }
    return String(value ?? '');
  });
}

function weekWords(hours: StoreHours, locale: string): string {
  return weekdays
    .map((day) => {
      const own = dayOf(hours, day);
      const rush = rushWords(own, locale);
      return `${weekdayName(day, locale, 'short')}: ${openWords(own, locale)}${rush && ` (${rush})`}`;
    })
    .join('\n');
}
