import type { RuleDefinition } from '@shared/programmes/rule-definition';
import { definitionChanges, definitionLines } from './definition-lines';

const rule: RuleDefinition = {
  procedureId: 'b6a0f0a2-6f5c-4d8e-9a54-6f6a3c0b7d11',
  name: 'Pump seal',
  audience: 'technician',
  appliesTo: 'unit',
  unitKind: null,
  pumpFace: null,
  recurrence: {
    startsLocal: '2026-01-05T09:00:00',
    rrules: ['FREQ=MONTHLY;BYDAY=2WE'],
    rdates: [],
    exdates: [],
  },
  window: { kind: 'days', before: 3, after: 3, late: null, dueSoon: 3 },
  horizonDays: 90,
  rank: 1,
};
const words = { language: 'en', locale: 'en-US', procedure: () => 'Seal at the drain' } as const;

describe('what a rule says', () => {
  it('is told in words, the recurrence too', () => {
    const told = Object.fromEntries(
      definitionLines(rule, words).map(({ key, value }) => [key, value]),
    );
    expect(told['often']).toBe('Every month on the second Wednesday at 09:00.');
    expect(told['procedure']).toBe('Seal at the drain');
  });

  it('differs only where something was changed, old beside new', () => {
    expect(definitionChanges(rule, rule, words)).toEqual([]);
    const later = { ...rule, horizonDays: 120, window: { ...rule.window, late: 4 } };
    expect(definitionChanges(rule, later, words).map(({ key }) => key)).toEqual([
      'window',
      'horizon',
    ]);
    const [change] = definitionChanges(rule, { ...rule, name: 'Seal' }, words);
    expect(change).toMatchObject({ key: 'name', before: 'Pump seal', value: 'Seal' });
  });

  it('tells one start from another where the words are the same', () => {
    const moved = { ...rule.recurrence, startsLocal: '2026-02-05T09:00:00' };
    expect(
      definitionChanges(rule, { ...rule, recurrence: moved }, words).map(({ key }) => key),
    ).toEqual(['starts']);
  });
});
