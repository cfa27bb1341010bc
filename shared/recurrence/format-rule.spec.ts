import { anyRule } from '@test/reference/recurrence/rule-arbitrary';
import * as fc from 'fast-check';
import { formatRule } from './format-rule';
import { readRule } from './parse-rule';

describe('writing a rule', () => {
  it('writes the parts in one order and leaves out what says nothing', () => {
    const text = 'WKST=MO;INTERVAL=1;BYDAY=FR,MO;FREQ=WEEKLY;UNTIL=20261231T235959';
    expect(formatRule(readRule(text))).toBe('FREQ=WEEKLY;UNTIL=20261231T235959;BYDAY=MO,FR');
  });

  it('gives the same rule when it is read again', () => {
    fc.assert(
      fc.property(anyRule, (rule) => {
        expect(readRule(formatRule(rule))).toEqual(rule);
      }),
    );
  });
});
