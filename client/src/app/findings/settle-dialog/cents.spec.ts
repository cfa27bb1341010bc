import { centsOf } from './cents';

describe('centsOf', () => {
  it.each([
    ['', 0],
    ['84', 8400],
    ['84.5', 8450],
    ['84.05', 8405],
    ['84,05', 8405],
    [' $12 ', 1200],
    ['0.29', 29],
  ])('reads %j', (typed, cents) => expect(centsOf(typed)).toBe(cents));

  it.each(['-3', '1.234', '1,000.00', 'ten', '1234567', '.'])('refuses %j', (typed) =>
    expect(centsOf(typed)).toBeNull(),
  );
});
