import * as z from 'zod';

/** A wall-clock time of the store, `HH:MM`. */
const time = z.iso.time({ precision: -1 });

/** Days of the week as RFC 5545 writes them. */
export const weekdays = ['MO', 'TU', 'WE', 'TH', 'FR', 'SA', 'SU'] as const;

export type WeekdayCode = (typeof weekdays)[number];

const rush = z.strictObject({ from: time, to: time }).refine(({ from, to }) => from < to, {
  path: ['to'],
  error: 'The rush must end after it begins.',
});

/** One day: when the store is open and when nobody may work on the line. */
export const dayHours = z.strictObject({
  open: time.nullable(),
  /** At or before `open` means after midnight. */
  close: time.nullable(),
  rush: z.array(rush).max(6),
});

/** A store's week: the usual day, and the days that differ (`null`: closed all day). */
export const storeHours = dayHours.extend({
  byDay: z.partialRecord(z.enum(weekdays), dayHours.nullable()).optional(),
});

export type DayHours = z.output<typeof dayHours>;
export type StoreHours = z.output<typeof storeHours>;

/** Nothing known of a store's hours. */
export const unknownHours: StoreHours = { open: null, close: null, rush: [] };

/**
 * The hours of one weekday; `null` when the store stays closed.
 *
 * @example hoursOfDay({ open: '06:00', close: '23:00', rush: [], byDay: { SU: null } }, 'SU') // null
 */
export function hoursOfDay(hours: StoreHours, day: WeekdayCode): DayHours | null {
  const own = hours.byDay?.[day];
  if (own !== undefined) return own;
  const { open, close, rush } = hours;
  return { open, close, rush };
}

/** Whether a wall-clock time (`HH:MM`) of that weekday lies in a rush; its end is free again. */
export function isRush(hours: StoreHours, day: WeekdayCode, at: string): boolean {
  return hoursOfDay(hours, day)?.rush.some(({ from, to }) => from <= at && at < to) ?? false;
}
