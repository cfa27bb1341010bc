import type { Month } from '../compliance/month';
import { MOST_BEHIND, monthsToDigest } from './months-to-digest';

const of = (last: string | null, present: string) =>
  monthsToDigest(last as Month | null, present as Month);

describe('which months a chain still wants a digest of', () => {
  it.each([
    ['2026-09', '2026-12', ['2026-10', '2026-11']],
    ['2026-11', '2026-12', []],
    ['2026-12', '2026-12', []],
    ['2025-11', '2026-01', ['2025-12']],
    [null, '2026-01', ['2025-12']],
  ])('last %s, now %s', (last, present, months) => {
    expect(of(last, present)).toEqual(months);
  });

  it('makes up for a year at most', () => {
    const months = of('2020-01', '2026-01');
    expect(months).toHaveLength(MOST_BEHIND);
    expect(months[MOST_BEHIND - 1]).toBe('2025-12');
  });
});
