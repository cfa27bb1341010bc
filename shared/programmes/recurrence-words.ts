import { type LocalDateTime, toWallSeconds } from '../calendar/local-date-time';
import { describeRule } from '../recurrence/describe-rule';
import { resolveParts } from '../recurrence/implied-parts';
import { isProblems, parseRule } from '../recurrence/parse-rule';
import type { Rule } from '../recurrence/rule';
import type { RuleLanguage } from '../recurrence/rule-words';
import type { Recurrence } from './recurrence-set';

/**
 * A recurrence in words, with what its start implies said aloud: a plain monthly rule from the 3rd at
 * nine reads "Every month on the 3rd at 09:00." A rule that cannot be read stands as it was written.
 */
export function recurrenceWords(recurrence: Recurrence): Readonly<Record<RuleLanguage, string>> {
  return { en: inLanguage(recurrence, 'en'), es: inLanguage(recurrence, 'es') };
}

function inLanguage({ startsLocal, rrules, rdates, exdates }: Recurrence, language: RuleLanguage) {
  const start = toWallSeconds(startsLocal as LocalDateTime);
  const sentences = rrules.map((text) => {
    const rule = parseRule(text);
    return isProblems(rule) ? text : describeRule(sayingAll(rule, start), language);
  });
  const { once, more, except } = extras[language];
  const days = (texts: readonly string[]) =>
    texts.map((text) => dayWords(text, language)).join('; ');
  if (rrules.length === 0) return `${once} ${days([startsLocal, ...rdates])}.`;
  if (rdates.length > 0) sentences.push(`${more} ${days(rdates)}.`);
  if (exdates.length > 0) sentences.push(`${except} ${days(exdates)}.`);
  return sentences.join(' ');
}

const extras = {
  en: { once: 'On', more: 'Also on', except: 'Not on' },
  es: { once: 'El', more: 'También el', except: 'Excepto el' },
} as const;

/** The rule with the day and time of day that its start implies. */
function sayingAll(rule: Rule, start: number): Rule {
  const parts = resolveParts(rule, start);
  const onTheMinute = parts.bySecond.length === 1 && parts.bySecond[0] === 0;
  return { ...rule, ...parts, bySecond: onTheMinute ? [] : parts.bySecond };
}

/** "March 8, 2026 at 6:00 AM": a wall clock's own day and time, whatever the zone. */
function dayWords(local: string, language: RuleLanguage): string {
  return new Intl.DateTimeFormat(language === 'es' ? 'es-US' : 'en-US', {
    dateStyle: 'long',
    timeStyle: 'short',
    timeZone: 'UTC',
  }).format(new Date(`${local}Z`));
}
