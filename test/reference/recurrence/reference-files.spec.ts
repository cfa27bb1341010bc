import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { checkExample, checkRecurrenceFile } from './check-recurrence-file';
import type { RfcExamples } from './recurrence-file';

const read = (name: string): unknown =>
  JSON.parse(readFileSync(join(__dirname, '../data/recurrence', name), 'utf8'));

// Sources of the files: see README.md beside them.
describe('reference files for recurrence', () => {
  const { examples } = read('rfc5545-examples.json') as RfcExamples;

  // RFC 5545, 3.8.5.3, the 39 worked examples, with erratum 3883 in the hourly one.
  it.each(examples.map((example) => [example.section, example.title, example] as const))(
    '%s: %s',
    (_section, _title, example) => {
      expect(checkExample(example)).toMatchObject({ right: true });
    },
  );

  it.each([
    ['rfc5545-examples.json', 52], // with 3.3.5 and erratum 4271
    ['rules.json', 1200], // three engines agree
    ['disputed.json', 182], // decided from the text of 3.3.10
    ['zones.json', 180], // python zoneinfo and ICU
  ])('%s passes whole', (name, cases) => {
    const { occurrences, ...report } = checkRecurrenceFile(read(name));
    expect(report).toEqual({ cases, failed: 0, failures: [] });
    expect(occurrences).toBeGreaterThan(cases);
  });

  it('notices a wrong date, a missing one and one too many', () => {
    const vector = { id: 'v', dtstart: '2026-01-01T09:00:00', rrule: 'FREQ=DAILY;COUNT=2' };
    const right = ['2026-01-01T09:00:00', '2026-01-02T09:00:00'];
    const failures = (occurrences: string[], complete = true) =>
      checkRecurrenceFile({ vectors: [{ ...vector, occurrences, complete }] }).failures;
    expect(failures(right)).toEqual([]);
    expect(failures(right.slice(0, 1), false)).toEqual([]);
    expect(failures(right.slice(0, 1))).toEqual(['v']);
    expect(failures([...right, '2026-01-03T09:00:00'])).toEqual(['v']);
    expect(failures(['2026-01-01T09:00:00', '2026-01-03T09:00:00'])).toEqual(['v']);
  });

  it('refuses a file of another form', () => {
    expect(() => checkRecurrenceFile({ schedules: [] })).toThrow(/neither examples nor vectors/);
  });
});
