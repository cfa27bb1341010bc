import type { LocalDateTime } from '../calendar/local-date-time';
import { recurrencePreview } from './recurrence-preview';
import { recurrenceProblems } from './recurrence-problems';
import type { Recurrence } from './recurrence-set';

const recurrence = (rrules: string[], more: Partial<Recurrence> = {}): Recurrence => ({
  startsLocal: '2026-01-05T09:00:00',
  rrules,
  rdates: [],
  exdates: [],
  ...more,
});
const words = (it: Recurrence) =>
  recurrencePreview(it, '2026-01-01T00:00:00' as LocalDateTime, 3).words;

describe('a recurrence in words', () => {
  it('says aloud what the start implies', () => {
    expect(words(recurrence(['FREQ=MONTHLY']))).toEqual({
      en: 'Every month on the 5th at 09:00.',
      es: 'Cada mes el día 5 a las 09:00.',
    });
    expect(words(recurrence(['FREQ=WEEKLY;INTERVAL=2']))?.en).toBe(
      'Every 2 weeks on Monday at 09:00.',
    );
  });

  it('names several rules, dates added and dates taken out', () => {
    const both = words(
      recurrence(['FREQ=DAILY', 'FREQ=YEARLY;BYMONTH=3;BYMONTHDAY=1'], {
        exdates: ['2026-01-07T09:00:00'],
      }),
    );
    expect(both?.en).toMatch(/^Every day at 09:00\. Every year .*Not on January 7, 2026/);
    expect(both?.es).toMatch(/Excepto el 7 de enero de 2026/);
  });

  it('names the dates of one without rules', () => {
    expect(words(recurrence([]))?.en).toMatch(/^On January 5, 2026/);
  });
});

describe('what is wrong with a recurrence', () => {
  const of = (rrules: string[]) =>
    recurrenceProblems(recurrence(rrules)).map(
      ({ field, part, code }) => `${field} ${part} ${code}`,
    );

  it('is told by rule and part', () => {
    expect(of(['FREQ=DAILY', 'FREQ=MONTHLY;BYMONTHDAY=32'])).toEqual([
      'rrules.1 BYMONTHDAY out-of-range',
    ]);
    expect(of(['FREQ=YEARLY;BYMONTH=2;BYMONTHDAY=30'])).toEqual([
      'rrules.0 BYMONTHDAY never-occurs',
    ]);
    expect(of(['FREQ=MINUTELY'])).toEqual(['rrules.0 RRULE too-often']);
  });

  it('is found where only the rules together are too many', () => {
    const half = (minute: number) => `FREQ=HOURLY;BYMINUTE=${minute}`;
    expect(of([half(0)])).toEqual([]);
    expect(of([half(0), half(30)])).toEqual(['rrules RRULE too-often']);
  });
});
