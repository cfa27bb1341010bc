import { NEVER_LAPSES } from '../recurrence/window';
import { type WhyFacts, whySentences } from './why-words';

const facts: WhyFacts = {
  ruleName: 'Pump seal',
  programmeName: 'Filter care',
  recurrence: 'Every month on the 2nd Wednesday at 09:00.',
  place: 'F-1 in 0114 Cedar Falls Rd',
  timeZone: 'America/Chicago',
  scheduleFrom: '2026-03-01',
  occursLocal: '2026-06-10T09:00:00',
  window: { kind: 'days', before: 3, after: 1, late: 10, dueSoon: 3 },
  opensAt: Date.parse('2026-06-07T05:00:00Z'),
  closesAt: Date.parse('2026-06-12T05:00:00Z'),
  lapsesAt: Date.parse('2026-06-22T05:00:00Z'),
  revision: 1,
  currentRevision: 1,
  deferredFrom: null,
  dueOn: '2026-06-10',
  endedAt: null,
};
const plain = (text: string) => text.replace(/\u202f/g, ' ');

describe('why a task is there', () => {
  it('goes from the rule to the window, in the store’s time', () => {
    expect(whySentences(facts, 'en').map(plain)).toEqual([
      'The rule “Pump seal” of the programme “Filter care” says: Every month on the 2nd Wednesday at 09:00.',
      'F-1 in 0114 Cedar Falls Rd stands under this rule from Sunday, March 1, 2026 on.',
      'So it falls on Wednesday, June 10, 2026 at 9:00 AM, by the store’s clock (America/Chicago).',
      'The rule allows 3 days before and 1 day after: it is on time from Sunday, June 7, 2026 at 12:00 AM until Friday, June 12, 2026 at 12:00 AM.',
      'After that it can still be done late until Monday, June 22, 2026 at 12:00 AM.',
    ]);
  });

  it('says what was changed since, in both languages', () => {
    const later = {
      ...facts,
      currentRevision: 3,
      deferredFrom: '2026-06-03',
      endedAt: Date.parse('2026-06-09T15:00:00Z'),
      lapsesAt: NEVER_LAPSES,
    };
    for (const language of ['en', 'es'] as const) {
      const all = whySentences(later, language);
      expect(all).toHaveLength(8);
      expect(all.join(' ')).toMatch(language === 'en' ? /put off to .*June 10/ : /10 de junio/);
    }
    expect(whySentences({ ...facts, lapsesAt: facts.closesAt }, 'en').at(-1)).toContain('missed');
  });
});
