import { onTimeRate } from './on-time-rate';
import { rateChange } from './rate-change';
import { addToMonth, isMonth, lastDayOf, type Month, monthRange } from './month';
import { addCounts, countWindows, noWindows, windowEnd } from './window-end';

const closesAt = 1000;

describe('in which count a task stands', () => {
  it.each([
    ['none', null, 999, null],
    ['none', null, 1000, 'notDone'],
    ['done', 999, 1000, 'onTime'],
    // The window's end is outside it, as for the state of a task.
    ['done', 1000, 1000, 'late'],
    ['done', 3, 999, null],
    ['excused', 3, 999, null],
    ['excused', 3, 1000, 'excused'],
    ['covered', 3, 1000, 'covered'],
  ] as const)('%s at %s, looked at at %s: %s', (outcome, outcomeAt, now, count) => {
    expect(windowEnd({ outcome, outcomeAt, closesAt }, now)).toBe(count);
  });

  // Worked example: 20 windows closed in June. 15 done inside, 2 late, 1 never, 1 excused as the store
  // was closed, 1 covered by a quarterly inspection: 15 of 18 are on time, 83.3 %.
  it('counts a month that can be checked by hand', () => {
    const tasks = [
      ...Array(15).fill({ outcome: 'done', outcomeAt: 900, closesAt }),
      ...Array(2).fill({ outcome: 'done', outcomeAt: 1100, closesAt }),
      { outcome: 'none', outcomeAt: null, closesAt },
      { outcome: 'excused', outcomeAt: 500, closesAt },
      { outcome: 'covered', outcomeAt: 500, closesAt },
      { outcome: 'none', outcomeAt: null, closesAt: 5000 },
    ];
    const counts = countWindows(tasks, 2000);
    expect(counts).toEqual({ onTime: 15, late: 2, notDone: 1, excused: 1, covered: 1 });
    expect(onTimeRate(counts)).toBeCloseTo(0.8333, 4);
    expect(addCounts(counts, noWindows)).toEqual(counts);
  });
});

describe('change of a rate', () => {
  it('is in points, to one decimal, and nothing where a rate is missing', () => {
    expect(rateChange(0.8, 0.875)).toBe(7.5);
    expect(rateChange(0.9, 0.8999)).toBe(0);
    expect(rateChange(null, 0.5)).toBeNull();
  });
});

describe('months', () => {
  it('runs across years and knows month ends', () => {
    expect(monthRange('2025-11' as Month, '2026-02' as Month)).toEqual([
      '2025-11',
      '2025-12',
      '2026-01',
      '2026-02',
    ]);
    expect(addToMonth('2026-01' as Month, -13)).toBe('2024-12');
    expect(lastDayOf('2028-02' as Month)).toBe('2028-02-29');
    expect(isMonth('2026-13')).toBe(false);
  });
});
