import { recurrenceWords } from '@shared/programmes/recurrence-words';
import type { RuleDefinition } from '@shared/programmes/rule-definition';
import type { Language } from '../../session/language-choice';
import { audienceWord, placesWords, wallText } from '../programme-words';
import { windowWords } from '../window-picture/window-lines';

/** One thing that a rule says, in words. */
export interface DefinitionLine {
  readonly key: string;
  readonly label: string;
  readonly value: string;
}

/** What two definitions say differently. */
export interface DefinitionChange extends DefinitionLine {
  readonly before: string;
}

export interface LineWords {
  readonly language: Language;
  readonly locale: string;
  /** Title of a procedure, or its id where it is not known. */
  readonly procedure: (id: string) => string;
}

/** Everything that a rule says, one line each, in the order of its form. */
export function definitionLines(
  rule: RuleDefinition,
  { language, locale, procedure }: LineWords,
): readonly DefinitionLine[] {
  const { recurrence, window, horizonDays, rank } = rule;
  const lines: readonly (readonly [key: string, label: string, value: string])[] = [
    ['name', $localize`:@@programmes.rule-name:Name of the rule`, rule.name],
    ['procedure', $localize`:@@programmes.procedure:Procedure`, procedure(rule.procedureId)],
    ['audience', $localize`:@@programmes.whose-hands:Whose hands`, audienceWord(rule.audience)],
    ['places', $localize`:@@programmes.where:Where`, placesWords(rule)],
    ['often', $localize`:@@programmes.how-often:How often`, recurrenceWords(recurrence)[language]],
    ['starts', $localize`:@@programmes.starts:Starts`, wallText(recurrence.startsLocal, locale)],
    ['rrule', 'RRULE', recurrence.rrules.join('\n')],
    [
      'window',
      $localize`:@@programmes.window:Window`,
      windowWords(window, recurrence.startsLocal.slice(11, 16)),
    ],
    [
      'horizon',
      $localize`:@@programmes.horizon:Days written ahead`,
      $localize`:@@programmes.horizon-days:${horizonDays}:days: days`,
    ],
    ['rank', $localize`:@@programmes.rank:Rank`, String(rank)],
  ];
  return lines.map(([key, label, value]) => ({ key, label, value }));
}

/** What changed from one definition to another, in the order of the form; empty when nothing did. */
export function definitionChanges(
  from: RuleDefinition,
  to: RuleDefinition,
  words: LineWords,
): readonly DefinitionChange[] {
  const before = new Map(definitionLines(from, words).map(({ key, value }) => [key, value]));
  return definitionLines(to, words)
    .map((line) => ({ ...line, before: before.get(line.key) ?? '' }))
    .filter(({ before: was, value }) => was !== value);
}
