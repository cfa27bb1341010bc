import type { TodayTask } from './today-api';
import { minutesText, whenText, windowLeft } from './today-words';

const task = (more: Partial<TodayTask>) =>
  ({
    state: 'due-soon',
    opensAt: '2026-06-08T05:00:00Z',
    // Midnight in Chicago: the last moment belongs to the 12th.
    closesAt: '2026-06-13T05:00:00Z',
    ...more,
  }) as TodayTask;
const when = (more: Partial<TodayTask>, today: string) =>
  whenText(task(more), today, 'America/Chicago', 'en-US');

describe('the words of a day', () => {
  it.each([
    [0, '0 min'],
    [50, '50 min'],
    [120, '2 h'],
    [170, '2 h 50 min'],
  ])('says %d minutes', (minutes, text) => expect(minutesText(minutes)).toBe(text));

  it('counts days in the zone of the store', () => {
    expect(when({}, '2026-06-10')).toBe('due by Friday');
    expect(when({}, '2026-06-01')).toBe('due by Jun 12');
    expect(when({}, '2026-06-12')).toBe('due today');
    expect(when({ state: 'overdue' }, '2026-06-13')).toBe('1 day over');
    expect(when({ state: 'overdue' }, '2026-06-21')).toBe('9 days over');
    expect(when({ state: 'done' }, '2026-06-10')).toBe('');
  });

  it('empties the vat as the window runs out', () => {
    const at = (instant: string) => windowLeft(task({}), Date.parse(instant));
    expect(at('2026-06-08T05:00:00Z')).toBe(1);
    expect(at('2026-06-10T17:00:00Z')).toBe(0.5);
    expect(at('2026-06-14T00:00:00Z')).toBe(0);
  });
});
