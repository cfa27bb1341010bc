import type { TaskSheet } from '../findings-api';
import { readingLines } from './reading-line';

const both = (text: string) => ({ en: text, es: `${text} (es)` });

const sheet = {
  procedure: {
    steps: [
      {
        kind: 'number',
        key: 'amps',
        text: both('Running amperes'),
        required: true,
        number: { unit: 'A' },
      },
      {
        kind: 'choice',
        key: 'seal',
        text: both('Oil at the slot'),
        required: true,
        choices: [{ key: 'dry', text: both('dry') }],
      },
      { kind: 'check', key: 'paper', text: both('Paper seated'), required: true },
    ],
  },
  limits: { amps: { low: null, high: 9.8 } },
  inspection: {
    readings: [
      { reading: { step: 'amps', kind: 'number', value: 11.2 }, withinLimits: false },
      { reading: { step: 'seal', kind: 'choice', choice: 'dry' }, withinLimits: true },
      { reading: { step: 'paper', kind: 'check', ok: false }, withinLimits: false },
      { reading: { step: 'gone', kind: 'text', text: 'as before' }, withinLimits: null },
    ],
  },
} as unknown as TaskSheet;

describe('readingLines', () => {
  const lines = readingLines(
    sheet,
    ({ es }) => es,
    (value) => value.toFixed(1),
  );

  it('puts the value and its limit side by side, with the unit', () => {
    expect(lines[0]).toEqual({
      key: 'amps',
      step: 'Running amperes (es)',
      entered: '11.2 A',
      limit: 'at most 9.8 A',
      withinLimits: false,
    });
  });

  it('writes choices and ticks in words', () => {
    expect(lines.slice(1, 3).map(({ entered }) => entered)).toEqual(['dry (es)', 'not in order']);
  });

  it('keeps a reading whose step is no longer there', () => {
    expect(lines[3]).toMatchObject({ step: 'gone', entered: 'as before', limit: '' });
  });

  it('is empty where the inspection was taken back', () => {
    expect(readingLines({ ...sheet, inspection: null }, both as never, String)).toEqual([]);
  });
});
