import { describeRule } from './describe-rule';
import { readRule } from './parse-rule';

describe('a rule in words', () => {
  it.each([
    ['FREQ=DAILY', 'Every day.', 'Cada día.'],
    [
      'FREQ=WEEKLY;INTERVAL=2;BYDAY=MO,FR',
      'Every 2 weeks on Monday and Friday.',
      'Cada 2 semanas el lunes y el viernes.',
    ],
    ['FREQ=MONTHLY;BYDAY=1MO', 'Every month on the first Monday.', 'Cada mes el primer lunes.'],
    [
      'FREQ=MONTHLY;INTERVAL=3;BYDAY=MO,TU,WE,TH,FR;BYSETPOS=-1',
      'Every 3 months on Monday to Friday, only the last of these.',
      'Cada 3 meses de lunes a viernes, solo la última de esas fechas.',
    ],
    [
      'FREQ=MONTHLY;BYMONTHDAY=1,15,-1',
      'Every month on the 1st, the 15th and the last day.',
      'Cada mes el día 1, el día 15 y el último día.',
    ],
    [
      'FREQ=MONTHLY;BYMONTHDAY=13;BYDAY=FR,SA;COUNT=10',
      'Every month on the 13th, if it is Friday or Saturday, 10 times.',
      'Cada mes el día 13, si es viernes o sábado, 10 veces.',
    ],
    [
      'FREQ=YEARLY;BYDAY=20MO,-1FR',
      'Every year on the 20th Monday of the year and the last Friday of the year.',
      'Cada año el lunes n.º 20 del año y el último viernes del año.',
    ],
    [
      'FREQ=YEARLY;BYMONTH=3,9;UNTIL=20301231',
      'Every year in March and September, until 31 December 2030.',
      'Cada año en marzo y septiembre, hasta el 31 de diciembre de 2030.',
    ],
    [
      'FREQ=DAILY;BYHOUR=6,14,22;BYMINUTE=0',
      'Every day at 06:00, 14:00 and 22:00.',
      'Cada día a las 06:00, 14:00 y 22:00.',
    ],
  ])('%s', (rrule, english, spanish) => {
    expect(describeRule(readRule(rrule), 'en')).toBe(english);
    expect(describeRule(readRule(rrule), 'es')).toBe(spanish);
  });
});
