import { patternFrom, toPattern, toRuleText } from './plain-pattern';

// A Monday.
const start = '2026-01-05T09:00:00';

describe('plain pattern of a recurrence', () => {
  it.each([
    'FREQ=DAILY',
    'FREQ=DAILY;INTERVAL=3;COUNT=10',
    'FREQ=WEEKLY;BYDAY=MO,FR',
    'FREQ=WEEKLY;INTERVAL=2;UNTIL=20271231;BYDAY=SU',
    'FREQ=MONTHLY;BYMONTHDAY=5',
    'FREQ=MONTHLY;BYMONTHDAY=-1',
    'FREQ=MONTHLY;INTERVAL=3;BYDAY=2TU',
    'FREQ=MONTHLY;BYDAY=-1FR',
    'FREQ=YEARLY;BYMONTH=3;BYMONTHDAY=8',
    'FREQ=YEARLY;BYMONTH=11;BYDAY=1MO',
    'FREQ=DAILY;BYHOUR=9,14,21',
  ])('keeps %s as it is', (text) => {
    const pattern = toPattern(text, start);
    expect(pattern && toRuleText(pattern, start)).toBe(text);
  });

  it('says aloud what a rule leaves to its start', () => {
    const said = (text: string) => {
      const pattern = toPattern(text, start);
      return pattern && toRuleText(pattern, start);
    };
    expect(said('FREQ=WEEKLY')).toBe('FREQ=WEEKLY;BYDAY=MO');
    expect(said('FREQ=MONTHLY')).toBe('FREQ=MONTHLY;BYMONTHDAY=5');
    expect(said('FREQ=DAILY;BYHOUR=9,22;BYMINUTE=0;BYSECOND=0')).toBe('FREQ=DAILY;BYHOUR=9,22');
    expect(said('FREQ=YEARLY;BYMONTH=3')).toBe('FREQ=YEARLY;BYMONTH=3;BYMONTHDAY=5');
    expect(said('FREQ=YEARLY')).toBe('FREQ=YEARLY;BYMONTH=1;BYMONTHDAY=5');
  });

  it.each([
    'FREQ=HOURLY;INTERVAL=6',
    'FREQ=MONTHLY;BYMONTHDAY=1,15',
    'FREQ=MONTHLY;BYDAY=MO,TU,WE,TH,FR;BYSETPOS=-1',
    'FREQ=YEARLY;BYDAY=20MO',
    'FREQ=YEARLY;BYMONTHDAY=5',
    'FREQ=MONTHLY;BYDAY=MO',
    'FREQ=MONTHLY;BYDAY=1MO,3MO',
    'FREQ=YEARLY;BYWEEKNO=20',
    'FREQ=DAILY;BYMONTH=1',
    'FREQ=DAILY;BYHOUR=14',
    'FREQ=DAILY;BYMINUTE=30',
    'FREQ=WEEKLY;WKST=SU;BYDAY=MO',
    'FREQ=DAILY;UNTIL=20271231T120000Z',
    'FREQ=MONTHLY;BYMONTHDAY=-2',
    'not a rule',
  ])('leaves %s to the text field', (text) => {
    expect(toPattern(text, start)).toBeNull();
  });

  it('begins with the day of the start', () => {
    expect(toRuleText(patternFrom(start), start)).toBe('FREQ=MONTHLY;BYMONTHDAY=5');
  });
});
