/** What can be wrong with a rule; stable, so that screens can word and translate it. */
export type RuleProblemCode =
  | 'empty'
  | 'missing-frequency'
  | 'malformed-part'
  | 'unknown-part'
  | 'repeated-part'
  | 'empty-value'
  | 'unknown-frequency'
  | 'not-a-number'
  | 'out-of-range'
  | 'not-a-weekday'
  | 'not-a-date'
  | 'not-with-frequency'
  | 'ordinal-not-with-frequency'
  | 'ordinal-not-with-week-numbers'
  | 'needs-another-part'
  | 'count-and-until'
  | 'until-form'
  | 'time-part-on-date'
  | 'never-occurs'
  | 'too-often';

/** One fault of a rule: the part at fault, what is wrong with it, and the same in English. */
export interface RuleProblem {
  /** The RFC's name of the part, such as BYMONTHDAY; RRULE for the rule as a whole. */
  readonly part: string;
  readonly code: RuleProblemCode;
  readonly params: Readonly<Record<string, string | number>>;
  readonly message: string;
}

const MESSAGES: Readonly<Record<RuleProblemCode, string>> = {
  empty: 'The rule is empty.',
  'missing-frequency': 'FREQ is missing: a rule must say how often it recurs.',
  'malformed-part': '“{text}” is not of the form NAME=VALUE.',
  'unknown-part': '{part} is not a part of a recurrence rule.',
  'repeated-part': '{part} is given more than once.',
  'empty-value': '{part} has no value.',
  'unknown-frequency':
    'FREQ cannot be “{value}”; it is SECONDLY, MINUTELY, HOURLY, DAILY, WEEKLY, MONTHLY or YEARLY.',
  'not-a-number': '{part}: “{value}” is not a whole number.',
  'out-of-range': '{part}: {value} is outside {range}.',
  'not-a-weekday':
    '{part}: “{value}” is not a weekday; they are MO, TU, WE, TH, FR, SA and SU, in BYDAY with an ordinal before them where one is meant.',
  'not-a-date':
    'UNTIL: “{value}” is neither a date (20261231) nor a date with a time (20261231T235959, or with a Z for UTC).',
  'not-with-frequency': '{part} cannot be used with FREQ={frequency}.',
  'ordinal-not-with-frequency':
    'BYDAY: a numbered weekday such as {value} needs FREQ=MONTHLY or FREQ=YEARLY, not {frequency}.',
  'ordinal-not-with-week-numbers':
    'BYDAY: a numbered weekday such as {value} cannot be combined with BYWEEKNO.',
  'needs-another-part': 'BYSETPOS picks from what other BY-parts give, and there is none.',
  'count-and-until': 'COUNT and UNTIL cannot both end a rule.',
  'until-form': 'UNTIL must be {expected}, as the start is {start}.',
  'time-part-on-date': '{part} cannot be used where the start is a date without a time.',
  'never-occurs': 'This rule can never occur: {reason}',
  'too-often': 'This rule occurs {perDay} times in one day; at most {most} are allowed.',
};

/** Builds a problem; `{part}` and the parameters are filled into the English message. */
export function ruleProblem(
  part: string,
  code: RuleProblemCode,
  params: Readonly<Record<string, string | number>> = {},
): RuleProblem {
  const words: Readonly<Record<string, string | number>> = { part, ...params };
  const message = MESSAGES[code].replace(/\{(\w+)\}/g, (_, name: string) =>
    String(words[name] ?? ''),
  );
  return { part, code, params, message };
}
