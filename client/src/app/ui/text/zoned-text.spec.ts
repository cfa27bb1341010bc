import { zonedText } from './zoned-text';

// Node writes a narrow no-break space before AM and PM.
const plain = (text: string): string => text.replace(/\s/g, ' ');

describe('zonedText', () => {
  // 2026-07-01 17:00 UTC: 12:00 in Chicago (CDT, UTC-5), 10:00 in Phoenix (MST, UTC-7 all year).
  const summer = '2026-07-01T17:00:00Z';

  it('names the zone when the viewer has another time', () => {
    expect(plain(zonedText(summer, 'America/Phoenix', 'America/Chicago', 'en', 'time'))).toBe(
      '10:00 AM MST',
    );
  });

  it('leaves the name out where both clocks agree, whatever the zones are called', () => {
    expect(plain(zonedText(summer, 'America/Chicago', 'America/Chicago', 'en', 'time'))).toBe(
      '12:00 PM',
    );
    expect(plain(zonedText(summer, 'America/Detroit', 'America/New_York', 'en', 'time'))).toBe(
      '1:00 PM',
    );
  });

  it('sees that Phoenix and Denver agree in winter and not in summer', () => {
    const winter = '2026-01-15T17:00:00Z';
    expect(zonedText(winter, 'America/Phoenix', 'America/Denver', 'en', 'time')).not.toMatch(/MST/);
    expect(zonedText(summer, 'America/Phoenix', 'America/Denver', 'en', 'time')).toMatch(/MST/);
  });

  it('gives the date of the place, not of the reader', () => {
    const late = '2026-03-09T03:30:00Z';
    expect(zonedText(late, 'America/Chicago', 'UTC', 'en', 'date')).toBe('Mar 8, 2026');
  });

  it('makes a dash of nothing', () => {
    expect(zonedText(null, 'America/Chicago', 'UTC', 'en', 'date')).toBe('–');
    expect(zonedText('soon', 'America/Chicago', 'UTC', 'en', 'date')).toBe('–');
  });
});
