import type { DayHours } from '@shared/fleet/store-hours';
import type { RouteState } from '@shared/visits/route-state';
import { clockWords } from '../fleet/store-hours/hours-words';
import type { PlannedTask } from './visits-api';

/** Metres in an international mile (15 U.S.C. § 205, exact by the 1959 agreement). */
const METRES_PER_MILE = 1609.344;

/** How a route stands, in a word. */
export function routeStateWord(state: RouteState): string {
  switch (state) {
    case 'draft':
      return $localize`:@@visits.state.draft:not published`;
    case 'published':
      return $localize`:@@visits.state.published:published`;
    case 'changed':
      return $localize`:@@visits.state.changed:changed since published`;
  }
}

/** Metres as miles: "0.8 mi", "12 mi". */
export function milesText(metres: number, locale: string): string {
  const miles = metres / METRES_PER_MILE;
  return new Intl.NumberFormat(locale, {
    style: 'unit',
    unit: 'mile',
    unitDisplay: 'short',
    maximumFractionDigits: miles < 9.95 ? 1 : 0,
  }).format(miles);
}

/** Minutes as people say them: "50 min", "2 h", "2 h 50 min". */
export function minutesText(minutes: number): string {
  const [hours, rest] = [Math.floor(minutes / 60), minutes % 60];
  if (hours === 0) return $localize`:@@visits.minutes:${rest}:minutes: min`;
  if (rest === 0) return $localize`:@@visits.hours:${hours}:hours: h`;
  return $localize`:@@visits.hours-minutes:${hours}:hours: h ${rest}:minutes: min`;
}

export function tasksText(count: number): string {
  return count === 1
    ? $localize`:@@visits.one-task:1 task`
    : $localize`:@@visits.tasks:${count}:count: tasks`;
}

export function stopsText(count: number): string {
  return count === 1
    ? $localize`:@@visits.one-stop:1 stop`
    : $localize`:@@visits.stops:${count}:count: stops`;
}

export function storesText(count: number): string {
  return count === 1
    ? $localize`:@@visits.one-store:1 store`
    : $localize`:@@visits.stores:${count}:count: stores`;
}

/** Stops that the reader does not see, by their number alone. */
export function elsewhereText(count: number): string {
  return count === 1
    ? $localize`:@@visits.one-elsewhere:One more stop in a store that is not yours to plan.`
    : $localize`:@@visits.elsewhere:${count}:count: more stops in stores that are not yours to plan.`;
}

/** When nobody may work on the line, or that the store stays closed; empty when nothing is known. */
export function hoursText(hours: DayHours | null, locale: string): string {
  if (hours === null) return $localize`:@@visits.closed:closed that day`;
  const spans = hours.rush.map(
    ({ from, to }) => `${clockWords(from, locale)} – ${clockWords(to, locale)}`,
  );
  if (spans.length === 0) return '';
  const all = new Intl.ListFormat(locale, { type: 'conjunction' }).format(spans);
  return $localize`:@@visits.rush:no line work ${all}:times:`;
}

/** A task by its unit and rule: "F-2 Pump seal check". */
export const taskText = ({ unitTag, ruleName }: PlannedTask): string =>
  unitTag ? `${unitTag} ${ruleName}` : ruleName;
