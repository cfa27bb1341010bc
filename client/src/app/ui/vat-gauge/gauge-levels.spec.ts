import { gaugeLevels } from './gauge-levels';

const times = { startedAt: 0, opensAt: 20, dueAt: 25, closesAt: 30 };

describe('gaugeLevels', () => {
  it('falls as the interval runs out', () => {
    expect(gaugeLevels(times, 15)).toEqual({ level: 0.5, opens: 1 / 3, due: 1 / 6 });
  });

  it('is empty once the window has closed', () => {
    expect(gaugeLevels(times, 31).level).toBe(0);
  });

  it('is full before the interval began', () => {
    expect(gaugeLevels(times, -5).level).toBe(1);
  });

  it('is empty where the interval has no length', () => {
    expect(gaugeLevels({ startedAt: 9, opensAt: 9, dueAt: 9, closesAt: 9 }, 9)).toEqual({
      level: 0,
      opens: 0,
      due: 0,
    });
  });
});
