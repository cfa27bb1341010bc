import { isTimeZone, matchingZones } from './time-zones';

describe('isTimeZone', () => {
  it.each([
    ['America/Chicago', true],
    ['Pacific/Honolulu', true],
    ['Chicago', false],
    ['', false],
  ])('%p: %p', (name, expected) => expect(isTimeZone(name)).toBe(expected));
});

describe('matchingZones', () => {
  it('finds a zone by part of its name, with a space for the underscore', () => {
    expect(matchingZones('new york')).toEqual(['America/New_York']);
  });

  it('offers the near zones before anything is typed or once one is chosen', () => {
    expect(matchingZones('')).toContain('America/Phoenix');
    expect(matchingZones('America/Chicago').length).toBeGreaterThan(4);
  });
});
