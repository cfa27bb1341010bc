import type { Month } from '@shared/compliance/month';
import { monthsFrom, monthsToPick, presentMonth, presetMonths } from './month-choice';

const present = '2026-12' as Month;

describe('the months of an address', () => {
  it.each([
    ['', '', '2026-10', '2026-12'],
    ['2026-01', '2026-03', '2026-01', '2026-03'],
    ['2026-05', '2026-03', '2026-05', '2026-05'],
    ['2019-05', '2026-03', '2023-04', '2026-03'],
    ['rubbish', '2026-03', '2026-01', '2026-03'],
    ['2026-11', '', '2026-11', '2026-12'],
    ['2027-02', '', '2027-02', '2027-02'],
  ])('%p to %p is %s to %s', (from, to, first, last) => {
    expect(monthsFrom(from, to, present)).toEqual({ from: first, to: last });
  });

  it('offers three years, the present month first', () => {
    const months = monthsToPick(present);
    expect(months).toHaveLength(36);
    expect(months[0]).toBe('2026-12');
    expect(months[35]).toBe('2024-01');
  });

  it('knows the present month by the zone of the reader', () => {
    const instant = new Date('2026-12-01T03:00:00Z');
    expect(presentMonth(instant, 'America/Chicago')).toBe('2026-11');
    expect(presentMonth(instant, 'Europe/Madrid')).toBe('2026-12');
  });

  it('has ranges for one press', () => {
    expect(presetMonths('last', '2026-01' as Month)).toEqual({ from: '2025-12', to: '2025-12' });
    expect(presetMonths('year', present).from).toBe('2026-01');
  });
});
