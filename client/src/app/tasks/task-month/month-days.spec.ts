import type { Month } from '@shared/compliance/month';
import { monthWeeks } from './month-days';

describe('monthWeeks', () => {
  it('begins each week on Monday', () => {
    const weeks = monthWeeks('2026-12' as Month);
    expect(weeks[0]).toEqual([
      null,
      '2026-12-01',
      '2026-12-02',
      '2026-12-03',
      '2026-12-04',
      '2026-12-05',
      '2026-12-06',
    ]);
    expect(weeks).toHaveLength(5);
    expect(weeks.at(-1)).toEqual([
      '2026-12-28',
      '2026-12-29',
      '2026-12-30',
      '2026-12-31',
      null,
      null,
      null,
    ]);
  });

  it('takes six weeks or four where the month asks for them', () => {
    expect(monthWeeks('2026-08' as Month)).toHaveLength(6);
    expect(monthWeeks('2021-02' as Month)).toHaveLength(4);
  });

  it('holds every day of a leap February once', () => {
    expect(
      monthWeeks('2028-02' as Month)
        .flat()
        .filter(Boolean),
    ).toHaveLength(29);
  });
});
