import type { WindowPlan } from '@shared/recurrence/window';

/**
 * A window in words, one phrase for each of its moments.
 *
 * @param dueTime time of day at which it is due, HH:MM
 */
export function windowLines(
  { kind, before, after, late, dueSoon }: WindowPlan,
  dueTime: string,
): readonly string[] {
  const due = $localize`:@@programmes.window.due:due at ${dueTime}:time:`;
  const untilNext = $localize`:@@programmes.window.late-next:then late, until the next one opens`;
  if (kind === 'hours') {
    return [
      before === 0
        ? ''
        : $localize`:@@programmes.window.opens-hours:opens ${before}:hours: h before`,
      dueSoon === 0
        ? ''
        : $localize`:@@programmes.window.soon-hours:due soon from ${dueSoon}:hours: h before`,
      due,
      $localize`:@@programmes.window.closes-hours:on time until ${after}:hours: h after`,
      late === null
        ? untilNext
        : $localize`:@@programmes.window.late-hours:then late for ${late}:hours: h`,
    ].filter(Boolean);
  }
  return [
    before === 0
      ? $localize`:@@programmes.window.opens-same-day:opens at midnight of the day it is due`
      : before === 1
        ? $localize`:@@programmes.window.opens-day:opens at midnight one day before`
        : $localize`:@@programmes.window.opens-days:opens at midnight ${before}:days: days before`,
    dueSoon === 0
      ? ''
      : dueSoon === 1
        ? $localize`:@@programmes.window.soon-day:due soon from the day before`
        : $localize`:@@programmes.window.soon-days:due soon from ${dueSoon}:days: days before`,
    due,
    after === 0
      ? $localize`:@@programmes.window.closes-same-day:on time until the end of that day`
      : after === 1
        ? $localize`:@@programmes.window.closes-day:on time until the end of the next day`
        : $localize`:@@programmes.window.closes-days:on time until the end of the day ${after}:days: days after`,
    late === null
      ? untilNext
      : late === 1
        ? $localize`:@@programmes.window.late-day:then late for one day`
        : $localize`:@@programmes.window.late-days:then late for ${late}:days: days`,
  ].filter(Boolean);
}
