import type { ProcedureStep } from '@shared/procedures/procedure-content';
import {
  findingAhead,
  isAnswered,
  judged,
  missingSteps,
  readNumber,
  sentReadings,
} from './answers';

const text = { en: 'Step', es: 'Paso' };
const amps: ProcedureStep = {
  kind: 'number',
  key: 'amps',
  text,
  required: true,
  component: 'motor',
  cause: 'bearing',
  severity: 'plan',
  number: { unit: 'A', limitFrom: 'nameplate-amps' },
};
const seal: ProcedureStep = {
  kind: 'choice',
  key: 'seal',
  text,
  required: false,
  component: 'pump',
  cause: 'worn-seal',
  choices: [
    { key: 'dry', text },
    { key: 'drips', text, outOfLimit: true, severity: 'stop' },
    { key: 'damp', text, outOfLimit: true },
  ],
};
const limits = { amps: { low: null, high: 9.8 } };

describe('answers', () => {
  it('hold a number against the limit of this unit, its end within', () => {
    expect(judged(amps, { kind: 'number', value: 9.8 }, limits)).toBe(true);
    expect(judged(amps, { kind: 'number', value: 9.81 }, limits)).toBe(false);
    expect(judged(amps, { kind: 'number', value: 99 }, {})).toBeNull();
    expect(judged(amps, undefined, limits)).toBeNull();
  });

  it('say what a reading out of limit will be written down as', () => {
    expect(findingAhead(amps, { kind: 'number', value: 12 }, limits)).toEqual({
      severity: 'plan',
      cause: 'bearing',
      component: 'motor',
    });
    expect(findingAhead(seal, { kind: 'choice', choice: 'drips' }, {})).toEqual({
      severity: 'stop',
      cause: 'worn-seal',
      component: 'pump',
    });
    expect(findingAhead(seal, { kind: 'choice', choice: 'damp' }, {})).toBeNull();
    expect(findingAhead(seal, { kind: 'choice', choice: 'dry' }, {})).toBeNull();
  });

  it('do not count while they are empty', () => {
    expect(isAnswered({ kind: 'text', text: '  ' })).toBe(false);
    expect(isAnswered({ kind: 'photo', photoIds: [] })).toBe(false);
    expect(isAnswered({ kind: 'check', ok: false })).toBe(true);
    expect(missingSteps([amps, seal], {})).toEqual([amps]);
  });

  it('are sent in the order of the steps, without empty ones', () => {
    const answers = {
      seal: { kind: 'choice', choice: 'dry' },
      amps: { kind: 'number', value: 5 },
      gone: { kind: 'text', text: 'of a step that is no more' },
    } as const;
    expect(sentReadings([amps, seal], answers)).toEqual([
      { step: 'amps', kind: 'number', value: 5 },
      { step: 'seal', kind: 'choice', choice: 'dry' },
    ]);
  });

  it.each([
    ['9.8', 9.8],
    ['9,8', 9.8],
    [' -4 ', -4],
    ['.5', 0.5],
    ['', null],
    ['9.8.1', null],
    ['nine', null],
    ['1e3', null],
  ])('reads %j as %j', (typed, value) => expect(readNumber(typed)).toBe(value));
});
