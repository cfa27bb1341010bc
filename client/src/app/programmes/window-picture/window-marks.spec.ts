import { windowMarks } from './window-marks';

describe('marks of a window', () => {
  it('stand in their order on the line', () => {
    const plans = [
      { kind: 'days', before: 7, after: 7, late: null, dueSoon: 3 },
      { kind: 'days', before: 0, after: 0, late: 0, dueSoon: 0 },
      { kind: 'hours', before: 2, after: 1, late: 1, dueSoon: 1 },
      { kind: 'hours', before: 0, after: 0, late: 200, dueSoon: 5 },
    ] as const;
    for (const plan of plans) {
      const { opens, dueSoon, due, closes, lapses } = windowMarks(plan, 0.4);
      expect(opens).toBe(4);
      expect(dueSoon).toBeGreaterThanOrEqual(opens);
      expect(due).toBeGreaterThanOrEqual(dueSoon);
      expect(closes).toBeGreaterThanOrEqual(due);
      if (lapses !== null) expect(lapses).toBeGreaterThanOrEqual(closes);
      expect(Math.max(closes, lapses ?? 0)).toBeLessThanOrEqual(96);
    }
  });

  it('put the due time within its day', () => {
    const noon = windowMarks({ kind: 'days', before: 0, after: 0, late: null, dueSoon: 0 }, 0.5);
    expect(noon.due - noon.opens).toBeCloseTo((noon.closes - noon.opens) / 2);
  });
});
