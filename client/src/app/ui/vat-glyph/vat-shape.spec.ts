import { oilPath, VAT, wallPoint } from './vat-shape';

describe('oilPath', () => {
  it('is nothing in an empty vat', () => {
    expect(oilPath(0)).toBe('');
    expect(oilPath(-2)).toBe('');
  });

  it('fills to the rim and no further', () => {
    expect(oilPath(1)).toBe('M3 4.5L4.6 13 10 17 15.4 13L17 4.5Z');
    expect(oilPath(1.4)).toBe(oilPath(1));
  });

  it('stays in the point of the floor when low', () => {
    // A tenth of the height: y = 17 - 1.25 = 15.75, half width 1.25 / 4 × 5.4 = 1.69.
    expect(oilPath(0.1)).toBe('M8.31 15.75L10 17L11.69 15.75Z');
  });
});

describe('wallPoint', () => {
  it('runs from the floor along the wall to the rim', () => {
    expect(wallPoint(0)).toEqual({ x: 10, y: 17 });
    expect(wallPoint(1)).toEqual({ x: 17, y: 4.5 });
  });

  it('knows the same walls as the drawing', () => {
    expect(VAT.walls).toContain('17 4.5');
  });
});
