import { anyStart } from '@test/reference/recurrence/rule-arbitrary';
import * as fc from 'fast-check';
import { parseLocalDateTime } from '../calendar/local-date-time';
import { NEVER_LAPSES, windowOpensAt, type WindowPlan, windowTimes } from './window';

const at = parseLocalDateTime;
const days: WindowPlan = { kind: 'days', before: 2, after: 2, late: 7, dueSoon: 1 };
const iso = (instant: number) => new Date(instant).toISOString().slice(0, 16);

describe('window in calendar days', () => {
  it('reaches from the first local midnight to the last', () => {
    const times = windowTimes(at('2026-06-10T09:00'), 'America/New_York', days, null);
    expect(iso(times.opensAt)).toBe('2026-06-08T04:00');
    expect(iso(times.dueSoonAt)).toBe('2026-06-09T04:00');
    expect(iso(times.dueAt)).toBe('2026-06-10T13:00');
    expect(iso(times.closesAt)).toBe('2026-06-13T04:00');
    expect(iso(times.lapsesAt)).toBe('2026-06-20T04:00');
    expect([times.dueOn, times.closesOn]).toEqual(['2026-06-10', '2026-06-12']);
  });

  // RFC 5545, 3.3.5, for the midnights: New York changes its clocks on 8 March 2026.
  it('counts calendar days, not hours, across a change of the clocks', () => {
    const times = windowTimes(at('2026-03-08T02:30'), 'America/New_York', days, null);
    expect(iso(times.opensAt)).toBe('2026-03-06T05:00');
    expect(iso(times.closesAt)).toBe('2026-03-11T04:00');
  });

  it('lapses when the next occurrence opens where no number of days is set', () => {
    const open = { ...days, late: null };
    const next = windowOpensAt(at('2026-07-10T09:00'), 'America/New_York', open);
    const times = windowTimes(at('2026-06-10T09:00'), 'America/New_York', open, next);
    expect(iso(times.lapsesAt)).toBe('2026-07-08T04:00');
    expect(windowTimes(at('2026-06-10T09:00'), 'UTC', open, null).lapsesAt).toBe(NEVER_LAPSES);
  });

  it('does not lapse before it closes, even where windows overlap', () => {
    const open = { ...days, late: null };
    const times = windowTimes(at('2026-06-10T09:00'), 'UTC', open, Date.UTC(2026, 5, 11));
    expect(times.lapsesAt).toBe(times.closesAt);
  });
});

describe('window in hours', () => {
  it('counts elapsed hours either side of the due time', () => {
    const plan: WindowPlan = { kind: 'hours', before: 1, after: 2, late: 4, dueSoon: 0.5 };
    const times = windowTimes(at('2026-06-10T06:00'), 'America/Phoenix', plan, null);
    expect(iso(times.opensAt)).toBe('2026-06-10T12:00');
    expect(iso(times.dueSoonAt)).toBe('2026-06-10T12:30');
    expect(iso(times.closesAt)).toBe('2026-06-10T15:00');
    expect(iso(times.lapsesAt)).toBe('2026-06-10T19:00');
    expect(times.closesOn).toBe('2026-06-10');
  });
});

describe('every window', () => {
  const plan: fc.Arbitrary<WindowPlan> = fc.record({
    kind: fc.constantFrom('days' as const, 'hours' as const),
    before: fc.nat(40),
    after: fc.nat(40),
    late: fc.option(fc.nat(40)),
    dueSoon: fc.nat(40),
  });
  const zone = fc.constantFrom('America/New_York', 'Africa/Cairo', 'Australia/Lord_Howe', 'UTC');

  it('opens, is due soon, closes and lapses in this order, and is due in between', () => {
    fc.assert(
      fc.property(anyStart, zone, plan, (local, tzid, any) => {
        const times = windowTimes(local, tzid, any, null);
        expect(times.opensAt).toBeLessThanOrEqual(times.dueSoonAt);
        expect(times.dueSoonAt).toBeLessThanOrEqual(times.closesAt);
        expect(times.closesAt).toBeLessThanOrEqual(times.lapsesAt);
        expect(times.opensAt).toBeLessThanOrEqual(times.dueAt);
        expect(times.dueAt).toBeLessThanOrEqual(times.closesAt);
        expect(windowOpensAt(local, tzid, any)).toBe(times.opensAt);
      }),
    );
  });
});
