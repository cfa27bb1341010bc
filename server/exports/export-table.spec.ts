import { readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { readTable } from '../imports/read-table';
import { type ExportColumn, date, figure, instant, text } from './export-column';
import { asPlainText, writeCsv } from './write-csv';
import { serialOf, writeXlsx } from './write-xlsx';

interface Row {
  readonly name: string;
  readonly degrees: number | null;
  readonly on: string | null;
  readonly at: Date | null;
}

const columns: readonly ExportColumn<Row>[] = [
  text({ en: 'Name', es: 'Nombre' }, (row) => row.name),
  figure({ en: 'Degrees', es: 'Grados' }, (row) => row.degrees),
  date({ en: 'On', es: 'El' }, (row) => row.on),
  instant({ en: 'At', es: 'Cuándo' }, (row) => row.at),
];
const reader = { locale: 'es', timeZone: 'America/Phoenix' } as const;
const path = (ending: string) => join(tmpdir(), `export-spec-${process.pid}.${ending}`);

async function* batchesOf(rows: readonly Row[]) {
  for (const row of rows) yield [row];
}
const row = (name: string, more: Partial<Row> = {}): Row => ({
  name,
  degrees: null,
  on: null,
  at: null,
  ...more,
});

describe('exported files', () => {
  afterAll(() => Promise.all(['csv', 'xlsx'].map((ending) => rm(path(ending), { force: true }))));

  it('lead text that would run as a formula with an apostrophe, and leave figures alone', async () => {
    const dangerous = ['=1+1', '+1', '-1', '@SUM(A1)', '\t=1', '\r=1', ' =1', '＝1', '＠x'];
    for (const sign of dangerous) expect(asPlainText(sign)).toBe(`'${sign}`);
    for (const plain of ['Mill Pond', '1-2', 'a=b', '']) expect(asPlainText(plain)).toBe(plain);
    await writeCsv(
      path('csv'),
      columns,
      batchesOf([row('=HYPERLINK("x")', { degrees: -87.6 })]),
      reader,
    );
    const file = await readFile(path('csv'), 'utf8');
    expect(file.split('\r\n')[1]).toBe('"\'=HYPERLINK(""x"")",-87.6,,');
  });

  it('are CSV as RFC 4180 has it, with a byte order mark and headings in the reader’s language', async () => {
    const rows = [
      row('Peña, "La"\nde aquí', { on: '2026-05-31', at: new Date('2026-06-01T01:30:00Z') }),
    ];
    await writeCsv(path('csv'), columns, batchesOf(rows), reader);
    const bytes = await readFile(path('csv'));
    expect(bytes.subarray(0, 3).toString('hex')).toBe('efbbbf');
    expect(bytes.subarray(3).toString('utf8')).toBe(
      'Nombre,Grados,El,"Cuándo (America/Phoenix)"\r\n' +
        '"Peña, ""La""\nde aquí",,2026-05-31,"2026-05-31 18:30"\r\n',
    );
  });

  it('are workbooks with real dates and figures, and text that is no formula', async () => {
    const rows = [
      row('=1+1 <&> "\u0007\ud800', {
        degrees: -0.5,
        on: '2024-02-29',
        at: new Date('2026-01-01T07:05:00Z'),
      }),
      row('second'),
    ];
    await writeXlsx(path('xlsx'), columns, batchesOf(rows), reader);
    const read: (readonly string[])[] = [];
    for await (const { cells } of readTable(await readFile(path('xlsx')), 'xlsx')) read.push(cells);
    expect(read).toEqual([
      ['Nombre', 'Grados', 'El', 'Cuándo (America/Phoenix)'],
      ['=1+1 <&> "', '-0.5', '2024-02-29', '2026-01-01 00:05'],
      ['second'],
    ]);
    expect(serialOf('2026-05-31 12:00')).toBe(46173.5);
  });

  it.each([
    ['csv', writeCsv],
    ['xlsx', writeXlsx],
  ] as const)(
    'report a fault among the rows instead of ending early: %s',
    async (ending, write) => {
      async function* failing() {
        yield [row('first')];
        throw new Error('lost the database');
      }
      await expect(write(path(ending), columns, failing(), reader)).rejects.toThrow(
        'lost the database',
      );
    },
  );
});
