import type { ProcedureStep } from './procedure-content';
import { type MotorNameplate, findingOf, limitOf, withinLimit } from './within-limit';

const unknown: MotorNameplate = { volts: null, amps: null };
const text = { en: 'A step', es: 'Un paso' };
const every = { key: 'a', text, required: true } as const;
const number = (limit: object, more: object = {}): ProcedureStep => ({
  kind: 'number',
  ...every,
  ...more,
  number: { unit: 'A', ...limit },
});
const value = (it: number) => ({ kind: 'number', value: it }) as const;

describe('limit of a number', () => {
  // NEMA MG 1-12.44: ±10 % of rated volts. The values of 230 V are in the condensed MG 1 (2011),
  // page 13; those of 115 V follow from the same percentage.
  it.each([
    [230, 207, 253],
    [115, 103.5, 126.5],
    [208, 187.2, 228.8],
  ])('at %d V rated runs from %d to %d V', (volts, low, high) => {
    expect(limitOf({ unit: 'V', limitFrom: 'nameplate-volts' }, { volts, amps: null })).toEqual({
      low,
      high,
    });
  });

  // NEC Table 430.248 gives 9.8 A for ½ hp at 115 V and 4.9 A at 230 V: nameplates of such motors
  // carry values of that size. That the nameplate is the limit, not the table: NEC 430.6(A), quoted
  // second-hand.
  it.each([9.8, 4.9])('of running amperes is the nameplate, %d A included', (amps) => {
    const step = number({ limitFrom: 'nameplate-amps' });
    const plate = { volts: null, amps };
    expect(withinLimit(step, value(amps), plate)).toBe(true);
    expect(withinLimit(step, value(amps + 0.1), plate)).toBe(false);
  });

  it('judges nothing while the nameplate is not recorded', () => {
    expect(withinLimit(number({ limitFrom: 'nameplate-amps' }), value(99), unknown)).toBeNull();
    expect(withinLimit(number({ limitFrom: 'nameplate-volts' }), value(99), unknown)).toBeNull();
    expect(withinLimit(number({}), value(99), unknown)).toBeNull();
  });

  it('includes both of its ends', () => {
    const step = number({ low: 330, high: 375 });
    const judged = [329.9, 330, 375, 375.1].map((it) => withinLimit(step, value(it), unknown));
    expect(judged).toEqual([false, true, true, false]);
  });
});

describe('finding of a reading', () => {
  it('carries the step’s component, cause and severity', () => {
    const step = number({ high: 1 }, { component: 'pump', cause: 'worn-seal', severity: 'plan' });
    expect(findingOf(step, value(2), unknown)).toEqual({
      component: 'pump',
      cause: 'worn-seal',
      severity: 'plan',
    });
    expect(findingOf(step, value(1), unknown)).toBeNull();
  });

  it('takes an answer’s own cause and severity first', () => {
    const step: ProcedureStep = {
      kind: 'choice',
      ...every,
      component: 'pump',
      cause: 'worn-seal',
      severity: 'watch',
      choices: [
        { key: 'dry', text },
        { key: 'wet', text, outOfLimit: true },
        { key: 'rust', text, outOfLimit: true, cause: 'water-corrosion', severity: 'stop' },
      ],
    };
    const of = (choice: string) => findingOf(step, { kind: 'choice', choice }, unknown);
    expect(of('dry')).toBeNull();
    expect(of('wet')).toMatchObject({ cause: 'worn-seal', severity: 'watch' });
    expect(of('rust')).toMatchObject({ cause: 'water-corrosion', severity: 'stop' });
    expect(of('no such answer')).toBeNull();
  });

  it('is none where the step names no severity', () => {
    const step: ProcedureStep = { kind: 'check', ...every };
    expect(withinLimit(step, { kind: 'check', ok: false }, unknown)).toBe(false);
    expect(findingOf(step, { kind: 'check', ok: false }, unknown)).toBeNull();
  });

  it('never judges words and pictures', () => {
    const words: ProcedureStep = { kind: 'text', ...every, severity: 'stop' };
    const photo: ProcedureStep = { kind: 'photo', ...every, severity: 'stop' };
    expect(findingOf(words, { kind: 'text', text: '' }, unknown)).toBeNull();
    expect(findingOf(photo, { kind: 'photo', photoIds: [] }, unknown)).toBeNull();
  });
});
