import { locales } from '../mail/locale';
import { digestBlocks } from './digest-blocks';
import type { DigestContent } from './digest-content';
import { digestSample } from './digest-sample';
import { formatChange } from './format-change';

const write = (content: DigestContent, mostRows = 100) =>
  digestBlocks({ content, locale: 'en', baseUrl: 'https://v.example', mostRows });

const empty: DigestContent = {
  ...digestSample,
  counts: { onTime: 0, late: 0, notDone: 0, excused: 2, covered: 0 },
  rate: null,
  previousRate: null,
  change: null,
  months: [],
  stores: [],
  overdue: { count: 0, stores: [] },
  findings: { count: 0, unsettled: 0, byCause: [] },
  repairs: { count: 0, partsCents: 0, labourCents: 0 },
  stopped: [],
};

describe('the digest in blocks', () => {
  it('leads with the rate, its change, what is overdue, found and paid', () => {
    expect(write(digestSample)[0]).toEqual({
      kind: 'figures',
      figures: [
        { value: '85.7%', label: 'on time', tone: 'plain' },
        { value: '−2.5 points', label: 'against the month before', tone: 'alert' },
        { value: '3', label: 'overdue at the month’s end', tone: 'alert' },
        { value: '5', label: 'findings', tone: 'plain' },
        { value: '$279.50', label: 'parts and labor', tone: 'plain' },
      ],
    });
  });

  it('puts stopped units and low stores before the reader, with the way there', () => {
    const lists = write(digestSample).filter((block) => block.kind === 'list');
    expect(lists.map(({ lines }) => lines.map(({ href }) => href))).toEqual([
      [expect.stringContaining('https://v.example/findings/')],
      [expect.stringMatching(/\/compliance\?by=rule&store=.+&from=2026-11&to=2026-11$/)],
    ]);
  });

  it('says what is not there in words, never as zero per cent', () => {
    const text = JSON.stringify(write(empty));
    expect(text).toContain('there is no rate');
    expect(text).toContain('Nothing waits for a decision');
    expect(text).not.toContain('0.0%');
  });

  it('counts the rows that it leaves out', () => {
    expect(JSON.stringify(write(digestSample, 1))).toContain('and 1 more');
    expect(JSON.stringify(write(digestSample, 2))).not.toContain('more');
  });

  it('has as many blocks and columns in each language', () => {
    const shapes = locales.map((locale) =>
      digestBlocks({ content: digestSample, locale, baseUrl: '', mostRows: 9 }).map((block) =>
        block.kind === 'table' ? [block.columns.length, block.rows.length] : block.kind,
      ),
    );
    expect(shapes[0]).toEqual(shapes[1]);
  });

  it('writes a change with its sign, and none as a dash', () => {
    expect(formatChange(2, 'en')).toBe('+2.0 points');
    expect(formatChange(0, 'es')).toBe('sin cambio');
    expect(formatChange(null, 'en')).toBe('–');
  });
});
