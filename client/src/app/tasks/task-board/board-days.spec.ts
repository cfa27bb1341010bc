import { boardDays, turnBoard } from './board-days';

describe('boardDays', () => {
  it('gives five weeks with their weekends at rest, over the end of a year', () => {
    const days = boardDays('2026-12-14');
    expect(days).toHaveLength(35);
    expect(days.at(-1)?.date).toBe('2027-01-17');
    expect(days.filter(({ rest }) => rest).map(({ date }) => date)).toEqual([
      '2026-12-19',
      '2026-12-20',
      '2026-12-26',
      '2026-12-27',
      '2027-01-02',
      '2027-01-03',
      '2027-01-09',
      '2027-01-10',
      '2027-01-16',
      '2027-01-17',
    ]);
  });
});

describe('turnBoard', () => {
  it('goes five weeks on and back', () => {
    expect(turnBoard('2026-11-16', 1)).toBe('2026-12-21');
    expect(turnBoard('2026-12-21', -1)).toBe('2026-11-16');
  });
});
