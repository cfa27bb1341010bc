import { clockWords, openWords, runsOfDays, weekdayName } from './hours-words';

describe('the words of hours', () => {
  it('name days and times in the reader’s language', () => {
    expect(weekdayName('MO', 'en', 'long')).toBe('Monday');
    expect(weekdayName('SU', 'es', 'short')).toBe('dom');
    expect(clockWords('13:30', 'en-US').replace(/\s/g, ' ')).toBe('1:30 PM');
  });

  it('tell a closed day from one that is not known', () => {
    expect(openWords(null, 'en')).toBe('closed');
    expect(openWords({ open: null, close: null, rush: [] }, 'en')).toBe('not known');
  });
});

describe('runsOfDays', () => {
  const usual = { open: '06:00', close: '23:00', rush: [] };

  it('makes one run of a week without differences', () => {
    expect(runsOfDays(usual)).toMatchObject([{ first: 'MO', last: 'SU' }]);
  });

  it('parts the week where the hours differ', () => {
    const runs = runsOfDays({ ...usual, byDay: { WE: null, SU: { ...usual, open: '08:00' } } });
    expect(runs.map(({ first, last }) => `${first}-${last}`)).toEqual([
      'MO-TU',
      'WE-WE',
      'TH-SA',
      'SU-SU',
    ]);
  });
});
