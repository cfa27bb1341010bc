import { formatCents, formatDay, formatMoment, formatMonth, formatRate } from './format-moment';

describe('words for moments and amounts', () => {
  const instant = Date.UTC(2026, 5, 13, 4, 59);

  it('tells a moment in the reader’s zone, named', () => {
    expect(formatMoment(instant, 'America/Chicago', 'en')).toBe('Fri, Jun 12, 11:59 PM CDT');
    expect(formatMoment(instant, 'America/Phoenix', 'en')).toContain('9:59 PM');
    expect(formatMoment(instant, 'America/Chicago', 'es')).toMatch(/^vie, 12 (de )?jun/);
  });

  it('keeps to spaces that every mail program knows', () => {
    expect(formatMoment(instant, 'America/Chicago', 'es')).not.toMatch(/[\u202f\u00a0]/);
  });

  it('writes days, months, money and rates in both languages', () => {
    expect(formatDay('2026-06-12', 'en')).toBe('Jun 12, 2026');
    expect(formatMonth('2026-11', 'es')).toBe('noviembre de 2026');
    expect(formatCents(123_400, 'en')).toBe('$1,234');
    expect(formatCents(123_456, 'en')).toBe('$1,234.56');
    expect(formatRate(0.91444, 'en')).toBe('91.4%');
    expect(formatRate(null, 'en')).toBe('–');
  });
});
