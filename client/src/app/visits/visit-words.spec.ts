import { hoursText, milesText, minutesText } from './visit-words';

describe('words of visits', () => {
  it('gives miles with a decimal while it matters', () => {
    // One mile is 1,609.344 m exactly (15 U.S.C. § 205).
    expect(milesText(1609.344, 'en')).toBe('1 mi');
    expect(milesText(8414, 'en')).toBe('5.2 mi');
    expect(milesText(16_000, 'en')).toBe('9.9 mi');
    expect(milesText(61_155, 'en')).toBe('38 mi');
  });

  it.each([
    [0, '0 min'],
    [50, '50 min'],
    [120, '2 h'],
    [170, '2 h 50 min'],
  ])('says %i minutes as %s', (minutes, text) => {
    expect(minutesText(minutes)).toBe(text);
  });

  it('says when the line is busy, or the store closed', () => {
    const rush = [{ from: '11:30', to: '13:30' }];
    expect(hoursText({ open: '10:00', close: '22:00', rush }, 'en')).toMatch(
      /^no line work 11:30.AM – 1:30.PM$/,
    );
    expect(hoursText({ open: '10:00', close: '22:00', rush: [] }, 'en')).toBe('');
    expect(hoursText(null, 'en')).toBe('closed that day');
  });
});
