import type { CalendarDate } from '../calendar/calendar-date';
import { localAt } from '../calendar/instant-of';
import type { LocalDateTime } from '../calendar/local-date-time';
import { NEVER_LAPSES, windowTimes } from '../recurrence/window';
import { deferredTimes } from './defer-task';

const plan = { kind: 'days', before: 2, after: 2, late: 3, dueSoon: 1 } as const;
const day = (text: string) => text as CalendarDate;

describe('deferred times', () => {
  it('moves all but the opening by calendar days, across a change of clocks', () => {
    const tzid = 'America/Chicago';
    const before = windowTimes('2026-10-28T09:00:00' as LocalDateTime, tzid, plan, null);
    const after = deferredTimes(before, tzid, day('2026-11-04'));
    expect(after.opensAt).toBe(before.opensAt);
    expect(localAt(after.dueSoonAt, tzid)).toBe('2026-11-03T00:00:00');
    expect(localAt(after.dueAt, tzid)).toBe('2026-11-04T09:00:00');
    expect(localAt(after.closesAt, tzid)).toBe('2026-11-07T00:00:00');
    expect(localAt(after.lapsesAt, tzid)).toBe('2026-11-10T00:00:00');
    expect(after.closesOn).toBe('2026-11-06');
  });

  it('gives the window that the rule would give on that day, but for the opening', () => {
    const tzid = 'America/Phoenix';
    const from = windowTimes('2026-03-02T21:00:00' as LocalDateTime, tzid, plan, null);
    const there = windowTimes('2026-03-09T21:00:00' as LocalDateTime, tzid, plan, null);
    expect(deferredTimes(from, tzid, day('2026-03-09'))).toEqual({
      ...there,
      opensAt: from.opensAt,
    });
  });

  it('keeps what never lapses so, and days without a midnight in order', () => {
    // In Santiago the clocks skip midnight at the start of 6 September 2026.
    const tzid = 'America/Santiago';
    const forever = { ...plan, after: 0, late: null };
    const before = windowTimes('2026-08-30T09:00:00' as LocalDateTime, tzid, forever, null);
    const after = deferredTimes(before, tzid, day('2026-09-05'));
    expect(after.lapsesAt).toBe(NEVER_LAPSES);
    expect(localAt(after.closesAt, tzid)).toBe('2026-09-06T01:00:00');
    const back = deferredTimes(after, tzid, day('2026-09-07'));
    expect(localAt(back.closesAt, tzid)).toBe('2026-09-08T00:00:00');
  });
});
