import { anyRule } from '@test/reference/recurrence/rule-arbitrary';
import * as fc from 'fast-check';
import { describeRule } from './describe-rule';
import { formatRule } from './format-rule';
import { readRuleWords } from './read-rule-words';
import type { RuleLanguage } from './rule-words';

describe('reading a rule from words', () => {
  it.each<RuleLanguage>(['en', 'es'])('reads every sentence that it writes (%s)', (language) => {
    fc.assert(
      fc.property(anyRule, (rule) => {
        const read = readRuleWords(describeRule(rule, language), language);
        expect(read && formatRule(read)).toBe(formatRule(rule));
      }),
      { numRuns: 500 },
    );
  });

  it('does not mind capitals, spacing or a missing full stop', () => {
    const read = readRuleWords('  every 2 WEEKS on monday  and friday ', 'en');
    expect(read && formatRule(read)).toBe('FREQ=WEEKLY;INTERVAL=2;BYDAY=MO,FR');
  });

  it.each(['', 'Every.', 'Every day on the 31st of never.', 'every week on the 15th', 'Cada día.'])(
    'guesses nothing from %p',
    (text) => {
      expect(readRuleWords(text, 'en')).toBeNull();
    },
  );
});
