import { onTimeRate } from './on-time-rate';

const none = { onTime: 0, late: 0, notDone: 0, excused: 0, covered: 0 };

describe('on-time rate', () => {
  // Palmer's case, plantservices.com 11299398: 100 scheduled, 50 of them done, 150 others done.
  it('counts only what was scheduled', () => {
    expect(onTimeRate({ ...none, onTime: 50, notDone: 50 })).toBe(0.5);
  });

  it('leaves excused and covered tasks out on both sides', () => {
    expect(onTimeRate({ ...none, onTime: 3, late: 1, excused: 7, covered: 9 })).toBe(0.75);
  });

  it('is nothing, not zero, where no window counted', () => {
    expect(onTimeRate({ ...none, excused: 2 })).toBeNull();
  });
});
