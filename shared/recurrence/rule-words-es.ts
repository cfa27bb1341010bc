import type { Frequency } from './rule';
import type { RuleWords } from './rule-words';

const UNITS: Readonly<Record<Frequency, readonly [one: string, several: string]>> = {
  SECONDLY: ['segundo', 'segundos'],
  MINUTELY: ['minuto', 'minutos'],
  HOURLY: ['hora', 'horas'],
  DAILY: ['día', 'días'],
  WEEKLY: ['semana', 'semanas'],
  MONTHLY: ['mes', 'meses'],
  YEARLY: ['año', 'años'],
};

const MONTHS =
  'enero febrero marzo abril mayo junio julio agosto septiembre octubre noviembre diciembre'.split(
    ' ',
  );
const WEEKDAYS = 'lunes martes miércoles jueves viernes sábado domingo'.split(' ');
const SMALL_ORDINALS = ['', 'primer', 'segundo', 'tercer', 'cuarto', 'quinto'];
const SMALL_FEMININE = ['', 'primera', 'segunda', 'tercera', 'cuarta', 'quinta'];

/** Spanish for rules. */
export const spanishRuleWords: RuleWords = {
  every: (interval, frequency) =>
    interval === 1 ? `cada ${UNITS[frequency][0]}` : `cada ${interval} ${UNITS[frequency][1]}`,
  and: ' y ',
  or: ' o ',
  month: (month) => MONTHS[month - 1] ?? '',
  weekday: (weekday) => WEEKDAYS[weekday] ?? '',
  ruleDay: ({ weekday, ordinal }, ofYear, limiting) => {
    const name = WEEKDAYS[weekday] ?? '';
    if (ordinal === 0) return limiting ? name : `el ${name}`;
    const within = ofYear ? ' del año' : '';
    const word = masculine(ordinal);
    if (word) return `el ${word} ${name}${within}`;
    return `el ${name} n.º ${Math.abs(ordinal)}${fromTheEnd(ordinal)}${within}`;
  },
  mondayToFriday: 'de lunes a viernes',
  anyDay: 'cualquier día',
  monthDay: dayNumbered,
  yearDay: (day) => `${dayNumbered(day)} del año`,
  weekNo: (week) =>
    week === -1
      ? 'la última semana'
      : week === -2
        ? 'la penúltima semana'
        : `la semana ${Math.abs(week)}${fromTheEnd(week)}`,
  position: (position) => {
    if (position === -1) return 'la última';
    if (position === -2) return 'la penúltima';
    const size = Math.abs(position);
    return `la ${SMALL_FEMININE[size] ?? `${size}.ª`}${fromTheEnd(position)}`;
  },
  leads: {
    months: [' en {list}', ' en {list}'],
    weekNos: [' en {list}', ' en {list}'],
    yearDays: [' {list}', ' {list}'],
    monthDays: [' {list}', ' {list}'],
    days: [' {list}', ' {list}'],
    daysLimiting: [', si es {list}', ', si es {list}'],
    clock: [' a las {list}', ' a las {list}'],
    hours: [' en la hora {list}', ' en las horas {list}'],
    minutes: [' en el minuto {list}', ' en los minutos {list}'],
    seconds: [' en el segundo {list}', ' en los segundos {list}'],
    positions: [', solo {list} de esas fechas', ', solo {list} de esas fechas'],
  },
  once: ', una vez',
  times: ', {count} veces',
  weeksFrom: ', con semanas desde el {weekday}',
  until: ', hasta el {day} de {month} de {year}',
  untilTime: ' a las {time}',
};

function dayNumbered(day: number): string {
  if (day === -1) return 'el último día';
  if (day === -2) return 'el penúltimo día';
  return `el día ${Math.abs(day)}${fromTheEnd(day)}`;
}

function masculine(ordinal: number): string | undefined {
  if (ordinal === -1) return 'último';
  if (ordinal === -2) return 'penúltimo';
  return ordinal > 0 ? SMALL_ORDINALS[ordinal] : undefined;
}

function fromTheEnd(n: number): string {
  return n < 0 ? ' desde el final' : '';
}
