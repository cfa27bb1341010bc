import { parseLocalDateTime } from '../calendar/local-date-time';
import type { RecurrenceSet } from './rule';
import { nextZonedOccurrences, zonedOccurrencesBetween } from './zoned-occurrences';

const set = (startsLocal: string, rrule: string): RecurrenceSet => ({
  startsLocal: parseLocalDateTime(startsLocal),
  rrules: [rrule],
});

const iso = (occurrences: readonly { instant: number }[]) =>
  occurrences.map(({ instant }) => new Date(instant).toISOString().slice(0, 16));

describe('occurrences in a zone', () => {
  // Erratum 4271 with RFC 5545, 3.3.5: a time that clocks skip is moved, not left out.
  it('keeps an occurrence in a gap', () => {
    const nightly = set('2026-03-06T02:30', 'FREQ=DAILY;COUNT=4');
    expect(iso(nextZonedOccurrences(nightly, 'America/New_York', 0, 9))).toEqual([
      '2026-03-06T07:30',
      '2026-03-07T07:30',
      '2026-03-08T07:30',
      '2026-03-09T06:30',
    ]);
  });

  // 3.8.5.3: duplicates of one instant count once.
  it('counts two wall times that are one instant once, and stays in order', () => {
    const half = set('2026-03-08T01:30', 'FREQ=MINUTELY;INTERVAL=30;COUNT=6');
    expect(iso(nextZonedOccurrences(half, 'America/New_York', 0, 9))).toEqual([
      '2026-03-08T06:30',
      '2026-03-08T07:00',
      '2026-03-08T07:30',
      '2026-03-08T08:00',
    ]);
  });

  // 3.3.10: UNTIL in UTC is inclusive and is compared with the instant.
  it('compares UNTIL in UTC with the instants', () => {
    const rule = (until: string) => set('2026-10-30T01:30', `FREQ=DAILY;UNTIL=${until}`);
    const count = (until: string) =>
      nextZonedOccurrences(rule(until), 'America/New_York', 0, 99).length;
    expect(count('20261102T063000Z')).toBe(4);
    expect(count('20261102T062959Z')).toBe(3);
    expect(count('20261101T053000Z')).toBe(3);
    expect(count('20261101T052959Z')).toBe(2);
  });

  it('finds what lies between two instants, both included', () => {
    const daily = set('2026-01-01T09:00', 'FREQ=DAILY');
    const from = Date.UTC(2026, 5, 1, 14);
    const found = zonedOccurrencesBetween(daily, 'America/Chicago', from, from + 2 * 86_400_000);
    expect(found.map(({ local }) => local)).toEqual([
      '2026-06-01T09:00:00',
      '2026-06-02T09:00:00',
      '2026-06-03T09:00:00',
    ]);
  });
});
