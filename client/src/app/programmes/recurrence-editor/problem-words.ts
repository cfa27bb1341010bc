import type { RecurrenceProblem } from '@shared/programmes/recurrence-problems';

/** What is wrong with a recurrence in the reader's language; names the part of the rule at fault. */
export function recurrenceProblemWords({ part, code, params, message }: RecurrenceProblem): string {
  const value = String(params['value'] ?? params['text'] ?? '');
  // The engine words ranges in English: "1 to 31 and -31 to -1".
  const range = String(params['range'] ?? '')
    .replace(/ to /g, '…')
    .replace(' and ', ', ');
  switch (code) {
    case 'empty':
      return $localize`:@@programmes.problem.empty:The rule is empty.`;
    case 'missing-frequency':
      return $localize`:@@programmes.problem.missing-frequency:FREQ is missing: a rule must say how often it recurs.`;
    case 'malformed-part':
      return $localize`:@@programmes.problem.malformed-part:“${value}:value:” is not of the form NAME=VALUE.`;
    case 'unknown-part':
      return $localize`:@@programmes.problem.unknown-part:${part}:part: is not a part of a recurrence rule.`;
    case 'repeated-part':
      return $localize`:@@programmes.problem.repeated-part:${part}:part: is given more than once.`;
    case 'empty-value':
      return $localize`:@@programmes.problem.empty-value:${part}:part: has no value.`;
    case 'unknown-frequency':
      return $localize`:@@programmes.problem.unknown-frequency:FREQ cannot be “${value}:value:”; it is DAILY, WEEKLY, MONTHLY or YEARLY, or one of the faster ones.`;
    case 'not-a-number':
      return $localize`:@@programmes.problem.not-a-number:${part}:part:: “${value}:value:” is not a whole number.`;
    case 'out-of-range':
      return $localize`:@@programmes.problem.out-of-range:${part}:part:: ${value}:value: is outside ${range}:range:.`;
    case 'not-a-weekday':
      return $localize`:@@programmes.problem.not-a-weekday:${part}:part:: “${value}:value:” is not a weekday; they are MO, TU, WE, TH, FR, SA and SU.`;
    case 'not-a-date':
      return $localize`:@@programmes.problem.not-a-date:UNTIL: “${value}:value:” is not a date such as 20261231.`;
    case 'not-with-frequency':
      return $localize`:@@programmes.problem.not-with-frequency:${part}:part: cannot be used with FREQ=${params['frequency']}:frequency:.`;
    case 'ordinal-not-with-frequency':
      return $localize`:@@programmes.problem.ordinal-frequency:BYDAY: a numbered weekday such as ${value}:value: needs FREQ=MONTHLY or FREQ=YEARLY.`;
    case 'ordinal-not-with-week-numbers':
      return $localize`:@@programmes.problem.ordinal-weeks:BYDAY: a numbered weekday such as ${value}:value: cannot be combined with BYWEEKNO.`;
    case 'needs-another-part':
      return $localize`:@@programmes.problem.needs-another:BYSETPOS picks from what other BY-parts give, and there is none.`;
    case 'count-and-until':
      return $localize`:@@programmes.problem.count-and-until:COUNT and UNTIL cannot both end a rule.`;
    case 'never-occurs':
      return neverWords(part, String(params['because'] ?? ''));
    case 'too-often':
      return $localize`:@@programmes.problem.too-often:This occurs ${params['perDay']}:count: times in one day; at most ${params['most']}:most: are allowed.`;
    default:
      return message;
  }
}

function neverWords(part: string, because: string): string {
  switch (because) {
    case 'until-too-early':
      return $localize`:@@programmes.problem.until-too-early:UNTIL: the rule ends before it first occurs.`;
    case 'no-such-day':
      return $localize`:@@programmes.problem.no-such-day:BYMONTHDAY: these months never have so many days.`;
    case 'excluded-by-the-others':
      return $localize`:@@programmes.problem.excluded:${part}:part:: nothing matches both it and the rest of the rule.`;
    case 'interval-misses':
      return $localize`:@@programmes.problem.interval-misses:INTERVAL: counting from the start, the rule never meets its other parts.`;
    default:
      return $localize`:@@programmes.problem.never:The parts of this rule exclude one another: it can never occur.`;
  }
}
