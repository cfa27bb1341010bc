import type { Frequency } from './rule';
import type { RuleWords } from './rule-words';

const UNITS: Readonly<Record<Frequency, string>> = {
  SECONDLY: 'second',
  MINUTELY: 'minute',
  HOURLY: 'hour',
  DAILY: 'day',
  WEEKLY: 'week',
  MONTHLY: 'month',
  YEARLY: 'year',
};

const MONTHS =
  'January February March April May June July August September October November December'.split(
    ' ',
  );
const WEEKDAYS = 'Monday Tuesday Wednesday Thursday Friday Saturday Sunday'.split(' ');
const SMALL_ORDINALS = ['', 'first', 'second', 'third', 'fourth', 'fifth'];

/** English for rules. */
export const englishRuleWords: RuleWords = {
  every: (interval, frequency) =>
    interval === 1 ? `every ${UNITS[frequency]}` : `every ${interval} ${UNITS[frequency]}s`,
  and: ' and ',
  or: ' or ',
  month: (month) => MONTHS[month - 1] ?? '',
  weekday: (weekday) => WEEKDAYS[weekday] ?? '',
  ruleDay: ({ weekday, ordinal }, ofYear) => {
    const name = WEEKDAYS[weekday] ?? '';
    return ordinal === 0 ? name : `the ${nth(ordinal)} ${name}${ofYear ? ' of the year' : ''}`;
  },
  mondayToFriday: 'Monday to Friday',
  anyDay: 'any day',
  monthDay: (day) => (day > 0 ? `the ${numeral(day)}` : `the ${nth(day)} day`),
  yearDay: (day) => (day > 0 ? `day ${day} of the year` : `the ${nth(day)} day of the year`),
  weekNo: (week) => (week > 0 ? `week ${week}` : `the ${nth(week)} week`),
  position: (position) => `the ${nth(position)}`,
  leads: {
    months: [' in {list}', ' in {list}'],
    weekNos: [' in {list}', ' in {list}'],
    yearDays: [' on {list}', ' on {list}'],
    monthDays: [' on {list}', ' on {list}'],
    days: [' on {list}', ' on {list}'],
    daysLimiting: [', if it is {list}', ', if it is {list}'],
    clock: [' at {list}', ' at {list}'],
    hours: [' in hour {list}', ' in hours {list}'],
    minutes: [' at minute {list}', ' at minutes {list}'],
    seconds: [' at second {list}', ' at seconds {list}'],
    positions: [', only {list} of these', ', only {list} of these'],
  },
  once: ', once',
  times: ', {count} times',
  weeksFrom: ', with weeks from {weekday}',
  until: ', until {day} {month} {year}',
  untilTime: ' at {time}',
};

/** In words up to the fifth, then in figures; from the end when negative. */
function nth(ordinal: number): string {
  if (ordinal === -1) return 'last';
  const size = Math.abs(ordinal);
  const word = SMALL_ORDINALS[size] ?? numeral(size);
  return ordinal > 0 ? word : `${word}-to-last`;
}

function numeral(n: number): string {
  const teen = n % 100 >= 11 && n % 100 <= 13;
  const ending = teen ? 'th' : (['th', 'st', 'nd', 'rd'][n % 10] ?? 'th');
  return `${n}${ending}`;
}
