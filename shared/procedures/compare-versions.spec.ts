import { compareVersions } from './compare-versions';
import type { ProcedureContent, ProcedureStep } from './procedure-content';
import { publishFaults } from './publish-faults';

const text = (it: string) => ({ en: it, es: it });
const step = (key: string, more: object = {}): ProcedureStep => ({
  kind: 'check',
  key,
  text: text(key),
  required: true,
  ...more,
});
const content = (steps: ProcedureStep[], more: object = {}): ProcedureContent => ({
  title: text('Title'),
  purpose: text('Purpose'),
  minutes: 5,
  tools: [],
  parts: [],
  cautions: [text('Hot oil')],
  steps,
  ...more,
});

describe('comparing versions', () => {
  it('finds nothing between equals, whatever the order of fields', () => {
    const { title, ...rest } = content([step('a')]);
    expect(compareVersions(content([step('a')]), { ...rest, title })).toEqual([]);
  });

  it('tells added, removed and changed steps by key', () => {
    const from = content([step('a'), step('b')]);
    const to = content([step('a', { required: false }), step('c')]);
    expect(compareVersions(from, to)).toMatchObject([
      { kind: 'removed', step: 'b' },
      { kind: 'changed', step: 'a', field: 'required', before: true, after: false },
      { kind: 'added', step: 'c' },
    ]);
  });

  it('calls moved only what changed its place among the others', () => {
    const from = content(['a', 'b', 'c', 'd'].map((key) => step(key)));
    const to = content(['d', 'a', 'b', 'c'].map((key) => step(key)));
    expect(compareVersions(from, to)).toMatchObject([
      { kind: 'moved', step: 'd', before: 4, after: 1 },
    ]);
  });

  it('tells what changed outside the steps', () => {
    const to = content([], { minutes: 7, cautions: [text('Hotter oil')] });
    expect(compareVersions(content([]), to).map(({ part, kind }) => `${part} ${kind}`)).toEqual([
      'minutes changed',
      'cautions removed',
      'cautions added',
    ]);
  });
});

describe('what keeps a draft from publication', () => {
  const fields = (it: ProcedureContent) => publishFaults(it).map(({ field }) => field);

  it('is nothing for a whole one', () => {
    expect(publishFaults(content([step('a')]))).toEqual([]);
  });

  it('names every missing text and thing at once', () => {
    const draft = content(
      [
        step('a', { text: { en: 'Look', es: '' } }),
        step('a', { severity: 'plan' }),
        { ...step('c'), kind: 'choice', choices: [] },
        { ...step('d'), kind: 'number', number: { unit: '', low: 2, high: 1 } },
      ],
      { title: { en: '', es: 'Título' } },
    );
    expect(fields(draft)).toEqual([
      'title.en',
      'steps.0.text.es',
      'steps.1.key',
      'steps.1.cause',
      'steps.2.choices',
      'steps.3.number.unit',
      'steps.3.number.high',
    ]);
    expect(fields(content([]))).toEqual(['steps']);
  });
});
