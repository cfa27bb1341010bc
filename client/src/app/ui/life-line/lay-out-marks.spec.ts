import type { LifeMark } from './lay-out-marks';
import { axisTicks, layOutMarks } from './lay-out-marks';

const at = (id: string, time: number): LifeMark => ({ id, kind: 'inspected', at: time });

describe('layOutMarks', () => {
  it('places by time whatever the order given', () => {
    const placed = layOutMarks([at('b', 50), at('a', 0), at('c', 100)], 0, 100);
    expect(placed.map((p) => [p.mark.id, p.percent, p.lane])).toEqual([
      ['a', 0, 0],
      ['b', 50, 0],
      ['c', 100, 0],
    ]);
  });

  it('lets close neighbours climb, and come down again', () => {
    const placed = layOutMarks([at('a', 10), at('b', 11), at('c', 12), at('d', 13)], 0, 100);
    expect(placed.map((p) => p.lane)).toEqual([0, 1, 2, 0]);
  });

  it('keeps what lies outside at the ends', () => {
    const placed = layOutMarks([at('a', -5), at('b', 500)], 0, 100);
    expect(placed.map((p) => p.percent)).toEqual([0, 100]);
  });
});

describe('axisTicks', () => {
  it('ticks months on a short axis and marks the turn of the year', () => {
    const ticks = axisTicks(Date.UTC(2025, 10, 15), Date.UTC(2026, 1, 20));
    expect(ticks.map((t) => [new Date(t.at).toISOString().slice(0, 10), t.year])).toEqual([
      ['2025-12-01', false],
      ['2026-01-01', true],
      ['2026-02-01', false],
    ]);
  });

  it('ticks years on a long one', () => {
    const ticks = axisTicks(Date.UTC(2019, 5, 1), Date.UTC(2026, 1, 20));
    expect(ticks).toHaveLength(7);
    expect(ticks.every((t) => t.year)).toBe(true);
  });
});
