import type { WindowPlan } from '@shared/recurrence/window';

export interface WindowLine {
  readonly moment: 'opens' | 'soon' | 'due' | 'closes' | 'late';
  readonly words: string;
}

/**
 * A window in words, one phrase for each of its moments.
 *
 * @param dueTime time of day at which it is due, HH:MM
 */
export function windowLines(
  { kind, before, after, late, dueSoon }: WindowPlan,
  dueTime: string,
): readonly WindowLine[] {
  const due = $localize`:@@programmes.window.due:due at ${dueTime}:time:`;
  const untilNext = $localize`:@@programmes.window.late-next:then late, until the next one opens`;
  const lines: readonly WindowLine[] =
    kind === 'hours'
      ? [
          { moment: 'opens', words: opensHours(before) },
          { moment: 'soon', words: soonHours(dueSoon) },
          { moment: 'due', words: due },
          {
            moment: 'closes',
            words: $localize`:@@programmes.window.closes-hours:on time until ${after}:hours: h after`,
          },
          { moment: 'late', words: late === null ? untilNext : lateHours(late) },
        ]
      : [
          { moment: 'opens', words: opensDays(before) },
          { moment: 'soon', words: soonDays(dueSoon) },
          { moment: 'due', words: due },
          { moment: 'closes', words: closesDays(after) },
          { moment: 'late', words: late === null ? untilNext : lateDays(late) },
        ];
  return lines.filter(({ words }) => words !== '');
}

/** {@link windowLines} as one text. */
export function windowWords(plan: WindowPlan, dueTime: string): string {
  return windowLines(plan, dueTime)
    .map(({ words }) => words)
    .join('; ');
}

const opensHours = (hours: number): string =>
  hours === 0 ? '' : $localize`:@@programmes.window.opens-hours:opens ${hours}:hours: h before`;

const soonHours = (hours: number): string =>
  hours === 0
    ? ''
    : $localize`:@@programmes.window.soon-hours:due soon from ${hours}:hours: h before`;

const lateHours = (hours: number): string =>
  $localize`:@@programmes.window.late-hours:then late for ${hours}:hours: h`;

function opensDays(days: number): string {
  if (days === 0) {
    return $localize`:@@programmes.window.opens-same-day:opens at midnight of the day it is due`;
  }
  return days === 1
    ? $localize`:@@programmes.window.opens-day:opens at midnight one day before`
    : $localize`:@@programmes.window.opens-days:opens at midnight ${days}:days: days before`;
}

function soonDays(days: number): string {
  if (days === 0) return '';
  return days === 1
    ? $localize`:@@programmes.window.soon-day:due soon from the day before`
    : $localize`:@@programmes.window.soon-days:due soon from ${days}:days: days before`;
}

function closesDays(days: number): string {
  if (days === 0) {
    return $localize`:@@programmes.window.closes-same-day:on time until the end of that day`;
  }
  return days === 1
    ? $localize`:@@programmes.window.closes-day:on time until the end of the next day`
    : $localize`:@@programmes.window.closes-days:on time until the end of the day ${days}:days: days after`;
}

const lateDays = (days: number): string =>
  days === 1
    ? $localize`:@@programmes.window.late-day:then late for one day`
    : $localize`:@@programmes.window.late-days:then late for ${days}:days: days`;
