import { addToMonth, isMonth, type Month, monthRange, monthsIn } from '@shared/compliance/month';

export interface Months {
  readonly from: Month;
  readonly to: Month;
}

/** The server answers for so many months at once. */
const MOST = 36;

/** Months that can be picked, the present one first: three years. */
export const monthsToPick = (present: Month): Month[] =>
  monthRange(addToMonth(present, 1 - MOST), present).reverse();

/** The present month of a zone. */
export function presentMonth(now: Date, timeZone: string): Month {
  const parts = new Intl.DateTimeFormat('en-US', { timeZone, year: 'numeric', month: '2-digit' });
  const part = (type: string) => parts.formatToParts(now).find((it) => it.type === type)?.value;
  return `${part('year')}-${part('month')}` as Month;
}

/**
 * The months of an address, made usable: what is missing or no month falls back to the three months
 * up to the present one, and ends that are crossed or too far apart are brought together.
 *
 * @example monthsFrom('', '', '2026-12') // { from: '2026-10', to: '2026-12' }
 * @example monthsFrom('2026-05', '2026-03', '2026-12') // { from: '2026-05', to: '2026-05' }
 */
export function monthsFrom(from: string, to: string, present: Month): Months {
  const end = isMonth(to) ? to : isMonth(from) && from > present ? from : present;
  const start = isMonth(from) ? from : addToMonth(end, -2);
  const length = monthsIn(start, end);
  if (length < 1) return { from: start, to: start };
  return length > MOST ? { from: addToMonth(end, 1 - MOST), to: end } : { from: start, to: end };
}

export type Preset = 'this' | 'last' | 'three' | 'year';

/** The ranges that one press chooses. */
export function presetMonths(preset: Preset, present: Month): Months {
  switch (preset) {
    case 'this':
      return { from: present, to: present };
    case 'last':
      return { from: addToMonth(present, -1), to: addToMonth(present, -1) };
    case 'three':
      return { from: addToMonth(present, -2), to: present };
    case 'year':
      return { from: addToMonth(present, -11), to: present };
  }
}
