import { dayInWindow } from './day-in-window';
import { routeState } from './route-state';

describe('routeState', () => {
  it.each([
    [0, null, 'draft'],
    [7, null, 'draft'],
    [3, 3, 'published'],
    [4, 3, 'changed'],
  ] as const)('version %s, told %s: %s', (version, told, state) => {
    expect(routeState(version, told)).toBe(state);
  });
});

describe('dayInWindow', () => {
  const window = { opensOn: '2026-06-08', closesOn: '2026-06-12' };

  it.each([
    ['2026-06-07', 'early'],
    ['2026-06-08', 'in-window'],
    ['2026-06-12', 'in-window'],
    ['2026-06-13', 'late'],
  ])('%s is %s', (day, fit) => {
    expect(dayInWindow(day, window)).toBe(fit);
  });
});
