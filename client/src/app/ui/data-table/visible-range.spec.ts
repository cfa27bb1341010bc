import { visibleRange } from './visible-range';

describe('visibleRange', () => {
  it('draws what can be seen and some more on either side', () => {
    expect(visibleRange(4400, 600, 44, 1000, 10)).toEqual({ start: 90, end: 124 });
  });

  it('stops at both ends', () => {
    expect(visibleRange(0, 600, 44, 1000, 10)).toEqual({ start: 0, end: 24 });
    expect(visibleRange(43_500, 600, 44, 1000, 10)).toEqual({ start: 978, end: 1000 });
  });

  it('draws nothing of nothing, and copes with a list that became shorter', () => {
    expect(visibleRange(0, 600, 44, 0, 10)).toEqual({ start: 0, end: 0 });
    expect(visibleRange(90_000, 600, 44, 20, 10)).toEqual({ start: 20, end: 20 });
  });
});
