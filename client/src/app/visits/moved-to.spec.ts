import { movedTo } from './moved-to';

describe('movedTo', () => {
  it.each([
    [2, 0, 'cab'],
    [0, 2, 'bca'],
    [1, 1, 'abc'],
  ])('moves %i to %i', (from, to, order) => {
    const given = ['a', 'b', 'c'];
    expect(movedTo(given, from, to).join('')).toBe(order);
    expect(given.join('')).toBe('abc');
  });
});
