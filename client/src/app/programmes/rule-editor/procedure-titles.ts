import type { Language } from '../../session/language-choice';
import type { ProcedureChoice, Rule } from '../programmes-api';

/** Titles of procedures by id; that of the rule's own even before the others have come. */
export function procedureTitles(
  procedures: readonly ProcedureChoice[],
  rule: Rule | null,
  language: Language,
): ReadonlyMap<string, string> {
  return new Map([
    ...(rule ? [[rule.procedureId, rule.procedureTitle[language]] as const] : []),
    ...procedures.map(({ id, title }) => [id, title[language]] as const),
  ]);
}
