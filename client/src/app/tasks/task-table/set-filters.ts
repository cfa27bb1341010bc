import type { SetFilter } from '../../ui/filter-bar/filter-bar';
import { dayText } from '../due-text/due-text';
import type { Get } from './task-filters';

/** The filters of the table's own that are set, in words that can be taken away. */
export function setFilters(get: Get, locale: string): readonly SetFilter[] {
  const day = (key: string) => dayText(get(key), locale, { dateStyle: 'medium' });
  const words: readonly (readonly [string, () => string])[] = [
    [
      'unassigned',
      () =>
        get('unassigned') === 'yes'
          ? $localize`:@@tasks.set.nobody:assigned to nobody`
          : $localize`:@@tasks.set.somebody:assigned to somebody`,
    ],
    ['unit', () => $localize`:@@tasks.set.unit:one unit`],
    ['from', () => $localize`:@@tasks.set.from:due from ${day('from')}:day:`],
    ['to', () => $localize`:@@tasks.set.to:due to ${day('to')}:day:`],
    [
      'closesFrom',
      () => $localize`:@@tasks.set.closes-from:window closed from ${day('closesFrom')}:day:`,
    ],
    ['closesTo', () => $localize`:@@tasks.set.closes-to:window closed to ${day('closesTo')}:day:`],
    ['end', () => get('end').split(',').map(endWord).join(', ')],
  ];
  return words.filter(([key]) => get(key) !== '').map(([key, label]) => ({ key, label: label() }));
}

function endWord(end: string): string {
  switch (end) {
    case 'onTime':
      return $localize`:@@tasks.end.on-time:done on time`;
    case 'late':
      return $localize`:@@tasks.end.late:done late`;
    case 'notDone':
      return $localize`:@@tasks.end.not-done:not done in its window`;
    case 'excused':
      return $localize`:@@tasks.end.excused:excused`;
    case 'covered':
      return $localize`:@@tasks.end.covered:covered`;
    default:
      return end;
  }
}
