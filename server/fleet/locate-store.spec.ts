import { distanceMetres, isTimeZone, placeOfZip, timeZoneAt } from './locate-store';

/** Degrees, minutes and seconds as degrees. */
const dms = (degrees: number, minutes: number, seconds: number) =>
  Math.sign(degrees) * (Math.abs(degrees) + minutes / 60 + seconds / 3600);

describe('distanceMetres', () => {
  // Vincenty on WGS 84, as published with his formulae's implementations; Flinders Peak–Buninyong is
  // the worked example of the Geocentric Datum of Australia Technical Manual.
  it.each([
    ['Boston–New York', 42.3541165, -71.0693514, 40.7791472, -73.9680804, 298_396.057],
    [
      'Flinders Peak–Buninyong',
      dms(-37, 57, 3.7203),
      dms(144, 25, 29.5244),
      dms(-37, 39, 10.1561),
      dms(143, 55, 35.3839),
      54_972.271,
    ],
    ['Land’s End–John o’ Groats', 50.06632, -5.71475, 58.64402, -3.07009, 969_954.166],
  ])('gives %s to the millimetre', (_name, fromNorth, fromEast, toNorth, toEast, metres) => {
    const from = { latitude: fromNorth, longitude: fromEast };
    const to = { latitude: toNorth, longitude: toEast };
    expect(Math.abs(distanceMetres(from, to) - metres)).toBeLessThan(0.001);
    expect(Math.abs(distanceMetres(to, from) - metres)).toBeLessThan(0.001);
  });

  it('is nothing to the same place', () => {
    const here = { latitude: 41.88, longitude: -87.63 };
    expect(distanceMetres(here, here)).toBe(0);
  });
});

describe('placeOfZip', () => {
  // Internal points of the US Census Bureau's ZCTA gazetteer, from memory; the package's centroids
  // are of delivery areas, so a few kilometres of difference are expected.
  it.each([
    ['10001', 40.7506, -73.9972, 'New York', 'NY'],
    ['60601', 41.8853, -87.622, 'Chicago', 'IL'],
    ['85004', 33.4515, -112.0697, 'Phoenix', 'AZ'],
    ['90210', 34.1005, -118.4147, 'Beverly Hills', 'CA'],
    ['96813', 21.3138, -157.8474, 'Honolulu', 'HI'],
  ])('puts %s where the gazetteer does', (zip, latitude, longitude, city, usState) => {
    const place = placeOfZip(zip);
    expect(place).toMatchObject({ city, usState });
    expect(distanceMetres(place!, { latitude, longitude })).toBeLessThan(3_000);
  });

  it('reads ZIP+4 and keeps leading zeros', () => {
    expect(placeOfZip('60601-1234')?.city).toBe('Chicago');
    expect(placeOfZip(' 02108 ')?.usState).toBe('MA');
  });

  it.each(['', '2108', '99999', 'K1A 0B1', '__proto__', 'toString'])(
    'knows nothing of %p',
    (text) => {
      expect(placeOfZip(text)).toBeUndefined();
    },
  );
});

describe('timeZoneAt', () => {
  // 49 CFR Part 71 sets the zones; which towns keep which is public knowledge, from memory here.
  it.each([
    ['43215', 'America/New_York'],
    ['60601', 'America/Chicago'],
    ['42101', 'America/Chicago'],
    ['79901', 'America/Denver'],
    ['85004', 'America/Phoenix'],
    ['86515', 'America/Denver'],
    ['90210', 'America/Los_Angeles'],
    ['99501', 'America/Anchorage'],
    ['96813', 'Pacific/Honolulu'],
    ['46201', 'America/Indiana/Indianapolis'],
  ])('gives %s the zone %s', (zip, zone) => {
    expect(timeZoneAt(placeOfZip(zip)!)).toBe(zone);
  });

  it('leaves Phoenix out of summer time, and Window Rock in', () => {
    const july = (zip: string) =>
      new Intl.DateTimeFormat('en', {
        timeZone: timeZoneAt(placeOfZip(zip)!),
        timeZoneName: 'longOffset',
      })
        .formatToParts(new Date('2026-07-01T12:00:00Z'))
        .find(({ type }) => type === 'timeZoneName')?.value;
    expect(july('85004')).toBe('GMT-07:00');
    expect(july('86515')).toBe('GMT-06:00');
  });
});

describe('isTimeZone', () => {
  it('tells zones from other words', () => {
    expect(isTimeZone('America/Phoenix')).toBe(true);
    expect(isTimeZone('America/Nowhere')).toBe(false);
    expect(isTimeZone('')).toBe(false);
  });
});
