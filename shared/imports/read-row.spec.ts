import { guessDateOrder, guessFields } from './guess-fields';
import {
  type ImportField,
  fieldsOf,
  importFieldNames,
  importFields,
  importKinds,
} from './import-fields';
import { problemInWords, problemReasons } from './problem-words';
import { calendarDate, figure, rushSpans, timeOfDay } from './read-cell';
import { readRow } from './read-row';

describe('reading cells', () => {
  it('reads dates by their order, and no day that never was', () => {
    expect(calendarDate('5/31/26', 'mdy')).toEqual({ value: '2026-05-31' });
    expect(calendarDate('31.5.2026', 'dmy')).toEqual({ value: '2026-05-31' });
    expect(calendarDate('2026-05-31 00:00', 'dmy')).toEqual({ value: '2026-05-31' });
    for (const bad of ['2/30/2024', '31/5/2026', 'soon', '46173', '1/1/1900']) {
      expect(calendarDate(bad, 'mdy')).toEqual({ reason: 'not-a-date' });
    }
  });

  it('reads figures of both worlds', () => {
    expect(figure(0, 10_000)('1,725')).toEqual({ value: 1725 });
    expect(figure(0, 9_999)('50,5')).toEqual({ value: 50.5 });
    expect(figure(-180, 180, { commaIsDecimal: true })('-87,629')).toEqual({ value: -87.629 });
    expect(figure(1, 12, { whole: true })('2.5')).toEqual({ reason: 'not-whole' });
    for (const bad of ['1e3', '0x10', 'Infinity', '1 2', '--1']) {
      expect(figure(0, 9_999)(bad)).toEqual({ reason: 'not-a-number' });
    }
  });

  it('reads times of day and rush hours', () => {
    expect(timeOfDay('6:30 PM')).toEqual({ value: '18:30' });
    expect(timeOfDay('12:00 a.m.')).toEqual({ value: '00:00' });
    expect(timeOfDay('25:00')).toEqual({ reason: 'not-a-time' });
    expect(rushSpans('11:00-13:30; 5pm – 7pm')).toEqual({
      value: [
        { from: '11:00', to: '13:30' },
        { from: '17:00', to: '19:00' },
      ],
    });
    expect(rushSpans('13:00-11:00')).toEqual({ reason: 'rush-unreadable' });
  });

  it('reads a row, blanks as nothing said, and tells every fault at once', () => {
    const fields: (ImportField | null)[] = ['storeNumber', 'vats', 'pumpFace', null, 'postalCode'];
    expect(readRow(2, ['7', '', 'Ranura', 'ignored', '2134'], fields, 'mdy')).toEqual({
      number: 2,
      values: { storeNumber: '7', pumpFace: 'drain-slot', postalCode: '02134' },
      problems: [],
    });
    const { problems } = readRow(3, ['x'.repeat(41), '0', 'round'], fields, 'mdy');
    expect(problems.map(({ reason }) => reason)).toEqual([
      'too-long',
      'out-of-range',
      'unknown-word',
    ]);
  });
});

describe('guessing', () => {
  it.each(['en', 'es'] as const)('knows all headings of our own files: %s', (locale) => {
    for (const kind of importKinds) {
      const own = fieldsOf[kind].map((field) => importFields[field][locale]);
      expect(guessFields(kind, own)).toEqual(fieldsOf[kind]);
    }
  });

  it('knows headings that people use, each field once', () => {
    expect(guessFields('units', ['STORE #', 'Nº DE TIENDA', 'Asset tag', 'Colour', 'Zip'])).toEqual(
      ['storeNumber', null, 'unitTag', null, 'postalCode'],
    );
  });

  it('tells the order of dates by what can be no month', () => {
    expect(guessDateOrder(['1/2/2026', '31/05/2026'], 'mdy')).toBe('dmy');
    expect(guessDateOrder(['05/31/2026'], 'dmy')).toBe('mdy');
    expect(guessDateOrder(['1/2/2026'], 'dmy')).toBe('dmy');
  });
});

describe('problems', () => {
  it('have words in both languages, without gaps', () => {
    const params = { min: 1, max: 2, row: 3, known: 'S', choices: 'a, b' };
    for (const reason of problemReasons) {
      for (const locale of ['en', 'es'] as const) {
        const field = importFieldNames[0];
        const words = problemInWords({ field, reason, value: 'x', params }, locale);
        expect(words).toMatch(/[.]$/);
        expect(words).not.toContain('undefined');
      }
    }
  });
});
