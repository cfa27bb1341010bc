import type { ProcedureContent } from '@shared/procedures/procedure-content';
import { contentOf, draftForm, emptyContent, stepForm } from './draft-form';
import { uniqueKey } from './unique-key';

const text = (it: string) => ({ en: it, es: `${it} (es)` });
const content: ProcedureContent = {
  title: text('Title'),
  purpose: text('Purpose'),
  minutes: 7,
  tools: [text('Brush')],
  parts: [],
  cautions: [text('Hot oil')],
  steps: [
    { kind: 'check', key: 'a', text: text('A'), required: false, help: text('Look') },
    {
      kind: 'number',
      key: 'b',
      text: text('B'),
      required: true,
      cause: 'winding',
      severity: 'plan',
      number: { unit: 'A', low: 0, limitFrom: 'nameplate-amps', basis: text('Plate') },
    },
    {
      kind: 'choice',
      key: 'c',
      text: text('C'),
      required: true,
      component: 'pump',
      choices: [
        { key: 'x', text: text('X') },
        { key: 'y', text: text('Y'), outOfLimit: true, cause: 'worn-seal', severity: 'stop' },
      ],
    },
  ],
};

describe('form of a draft', () => {
  it('gives back what it was given', () => {
    expect(contentOf(draftForm('code', content))).toEqual(content);
  });

  it('names new steps once and keeps their names when the text changes', () => {
    const form = draftForm('code', emptyContent);
    const step = stepForm({ kind: 'check' });
    step.controls.text.setValue({ en: 'Paper lies flat', es: '' });
    form.controls.content.controls.steps.push(step);
    expect(contentOf(form).steps[0]?.key).toBe('paper-lies-flat');
    step.controls.text.setValue({ en: 'Paper is straight', es: '' });
    expect(contentOf(form).steps[0]?.key).toBe('paper-lies-flat');
  });

  it('drops what belongs to another kind of step', () => {
    const form = draftForm('code', content);
    form.controls.content.controls.steps.controls[1]?.controls.kind.setValue('text');
    expect(contentOf(form).steps[1]).not.toHaveProperty('number');
  });
});

describe('key from a text', () => {
  it('keeps clear of those taken', () => {
    expect(uniqueKey('¿Válvula cerrada?', new Set(['valvula-cerrada']))).toBe('valvula-cerrada-2');
    expect(uniqueKey('¿?', new Set())).toBe('step');
  });
});
