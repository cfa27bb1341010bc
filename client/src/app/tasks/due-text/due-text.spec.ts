import { dayText, dueClock, urgencyText, windowLeft } from './due-text';

const task = {
  state: 'open' as const,
  closesOn: '2026-03-08',
  outcomeAt: null,
  deferredFrom: null,
};

describe('dayText', () => {
  it('writes the date itself, whatever zone the machine is in', () => {
    expect(dayText('2026-12-01', 'en-US')).toBe('Tue, Dec 1');
  });
});

describe('dueClock', () => {
  it('writes what the clock in the store shows, even an hour that ours skips', () => {
    expect(dueClock({ dueLocal: '2026-03-08T02:30:00' }, 'en-US')).toMatch(/Mar 8, 2026, 2:30\sAM/);
  });
});

describe('urgencyText', () => {
  it('says until which day it is on time', () => {
    expect(urgencyText(task, '2026-03-01', 'en-US')).toBe('to Sun, Mar 8');
  });

  it('counts the days it is over, over the change of clocks', () => {
    const late = { ...task, state: 'overdue' as const };
    expect(urgencyText(late, '2026-03-09', 'en-US')).toBe('1 day over');
    expect(urgencyText(late, '2026-03-17', 'en-US')).toBe('9 days over');
  });
});

describe('windowLeft', () => {
  const window = { opensAt: '2026-03-01T00:00:00Z', closesAt: '2026-03-11T00:00:00Z' };

  it.each([
    ['2026-02-01T00:00:00Z', 1],
    ['2026-03-06T00:00:00Z', 0.5],
    ['2026-03-20T00:00:00Z', 0],
  ])('at %s', (now, share) => expect(windowLeft(window, Date.parse(now))).toBe(share));

  it('is empty where the window has no length', () => {
    expect(windowLeft({ opensAt: window.opensAt, closesAt: window.opensAt }, 0)).toBe(0);
  });
});
