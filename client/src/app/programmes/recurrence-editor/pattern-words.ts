import type { PlainUnit } from './plain-pattern';

/** The unit behind "every" or "every 3". */
export function unitWord(unit: PlainUnit, count: number): string {
  const one = count === 1;
  switch (unit) {
    case 'DAILY':
      return one ? $localize`:@@programmes.unit.day:day` : $localize`:@@programmes.unit.days:days`;
    case 'WEEKLY':
      return one
        ? $localize`:@@programmes.unit.week:week`
        : $localize`:@@programmes.unit.weeks:weeks`;
    case 'MONTHLY':
      return one
        ? $localize`:@@programmes.unit.month:month`
        : $localize`:@@programmes.unit.months:months`;
    case 'YEARLY':
      return one
        ? $localize`:@@programmes.unit.year:year`
        : $localize`:@@programmes.unit.years:years`;
  }
}

/** Which weekday of the month: first to fifth, or the last. */
export function nthWord(nth: number): string {
  const words: Readonly<Record<number, string>> = {
    1: $localize`:@@programmes.nth.1:first`,
    2: $localize`:@@programmes.nth.2:second`,
    3: $localize`:@@programmes.nth.3:third`,
    4: $localize`:@@programmes.nth.4:fourth`,
    5: $localize`:@@programmes.nth.5:fifth`,
    [-1]: $localize`:@@programmes.nth.last:last`,
  };
  return words[nth] ?? String(nth);
}
