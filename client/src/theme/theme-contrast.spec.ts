import { readFileSync } from 'node:fs';
import { join } from 'node:path';

const source = readFileSync(join(__dirname, '_tokens.scss'), 'utf8');
const tokens = new Map(
  [...source.matchAll(/^ {2}([a-z0-9-]+): \(\s*(#[0-9a-f]{6}),\s*(#[0-9a-f]{6}),?\s*\)/gm)].map(
    (match) => [match[1], [match[2], match[3]]],
  ),
);

/** Relative luminance of a colour: WCAG 2.2, definition "relative luminance". */
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const part = parseInt(hex.slice(at, at + 2), 16) / 255;
    return part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

/** WCAG 2.2, definition "contrast ratio". */
function contrast(one: string, other: string): number {
  const [light = 0, dark = 0] = [luminance(one), luminance(other)].sort((a, b) => b - a);
  return (light + 0.05) / (dark + 0.05);
}

function pair(name: string, theme: 0 | 1): string {
  const colour = tokens.get(name)?.[theme];
  if (!colour) throw new Error(`No token ${name}`);
  return colour;
}

// Text on its grounds: WCAG 2.2 success criterion 1.4.3, 4.5 to 1.
const text: [string, string[]][] = [
  ['ink', ['surface', 'card', 'rest', 'hover', 'kelp-tint', 'amber-tint', 'vermilion-tint']],
  ['ink-2', ['surface', 'card', 'rest', 'hover', 'kelp-tint']],
  ['kelp', ['surface', 'card', 'kelp-tint']],
  ['kelp-deep', ['card', 'kelp-tint']],
  ['on-kelp', ['kelp']],
  ['amber-ink', ['surface', 'card', 'amber-tint']],
  ['vermilion', ['surface', 'card', 'rest', 'vermilion-tint']],
  ['on-vermilion', ['vermilion']],
  ['steel', ['surface', 'card']],
  ['mute', ['surface', 'card', 'rest']],
];
// Marks and edges that carry meaning: success criterion 1.4.11, 3 to 1.
const marks: [string, string[]][] = [
  ['edge', ['surface', 'card']],
  ['steel', ['rest', 'kelp-tint', 'hover']],
  ['mute', ['kelp-tint', 'hover']],
  ['vermilion', ['kelp-tint', 'hover']],
  ['amber-ink', ['rest', 'kelp-tint', 'hover']],
  ['kelp', ['rest', 'hover']],
];

describe.each([
  ['light', 0],
  ['dark', 1],
] as const)('the %s theme', (_, theme) => {
  it.each(text.flatMap(([ink, grounds]) => grounds.map((ground) => [ink, ground] as const)))(
    'reads %s on %s',
    (ink, ground) => {
      expect(contrast(pair(ink, theme), pair(ground, theme))).toBeGreaterThanOrEqual(4.5);
    },
  );

  it.each(marks.flatMap(([ink, grounds]) => grounds.map((ground) => [ink, ground] as const)))(
    'sees %s on %s',
    (ink, ground) => {
      expect(contrast(pair(ink, theme), pair(ground, theme))).toBeGreaterThanOrEqual(3);
    },
  );
});

describe('contrast', () => {
  it('is 21 to 1 for black on white', () => expect(contrast('#000000', '#ffffff')).toBeCloseTo(21));
});
