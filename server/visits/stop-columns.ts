import type * as z from 'zod';
import {
  type DayHours,
  type StoreHours,
  hoursOfDay,
  unknownHours,
  weekdays,
} from '@shared/fleet/store-hours';
import { parseCalendarDate, weekdayOf } from '@shared/calendar/calendar-date';
import type { stop } from '@shared/visits/route-parts';

export type Stop = z.output<typeof stop>;

/** A store as a stop, built in SQL from `stores s`, so that a row carries it whole. */
export const stopColumn = `
  jsonb_build_object('id', s.id, 'number', s.number, 'name', s.name, 'addressLine', s.address_line,
    'city', s.city, 'usState', s.state, 'postalCode', s.postal_code, 'phone', s.phone,
    'accessNote', s.access_note, 'latitude', s.latitude, 'longitude', s.longitude,
    'timeZone', s.time_zone) AS store`;

/** A store's hours on a date; null when it stays closed. */
export function hoursOn(hours: Partial<StoreHours>, date: string): DayHours | null {
  const day = weekdays[weekdayOf(parseCalendarDate(date))] ?? 'MO';
  return hoursOfDay({ ...unknownHours, ...hours }, day);
}
