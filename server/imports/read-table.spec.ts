import { Buffer } from 'node:buffer';
import { buffer } from 'node:stream/consumers';
import type { Readable } from 'node:stream';
import { ZipFile } from 'yazl';
import { bookParts } from '../exports/xlsx-parts';
import { delimiterOf, encodingOf } from './read-csv';
import { formatOf, readTable } from './read-table';
import { dateText } from './read-xlsx';
import { XlsxArchive } from './xlsx-archive';
import { isDateFormat } from './xlsx-book';

async function rowsOf(bytes: Buffer) {
  const rows: { number: number; cells: readonly string[] }[] = [];
  for await (const row of readTable(bytes, formatOf(bytes))) rows.push(row);
  return rows;
}

/** A workbook whose sheet holds this XML, with more parts or other ones. */
async function book(sheetData: string, parts: Record<string, string | Buffer> = {}) {
  const zip = new ZipFile();
  const sheet = `<worksheet><sheetData>${sheetData}</sheetData></worksheet>`;
  const all = { ...bookParts, 'xl/worksheets/sheet1.xml': sheet, ...parts };
  for (const [name, content] of Object.entries(all)) zip.addBuffer(Buffer.from(content), name);
  zip.end();
  return buffer(zip.outputStream as Readable);
}

describe('reading CSV', () => {
  const both = [
    { number: 1, cells: ['Región', 'Nº'] },
    { number: 2, cells: ['Peñón', '7'] },
  ];

  it.each([
    ['UTF-8', Buffer.from('Región,Nº\r\nPeñón,7\r\n')],
    ['UTF-8 with a byte order mark', Buffer.from('\ufeffRegión,Nº\nPeñón,7')],
    ['Latin-1 and semicolons', Buffer.from('Región;Nº\r\nPeñón;7\r\n', 'latin1')],
    ['UTF-16 and tabs', Buffer.from('\ufeffRegión\tNº\r\nPeñón\t7\r\n', 'utf16le')],
    ['bars and quotes', Buffer.from('"Región"|"Nº"\n"Peñón"|7\n')],
  ])('understands %s', async (_, bytes) => {
    expect(await rowsOf(bytes)).toEqual(both);
  });

  it('keeps numbering over blank rows and line ends in quotes', async () => {
    const rows = await rowsOf(Buffer.from('a,b\n\n"x\ny",1\n,\nz,2\n'));
    expect(rows.map(({ number, cells }) => [number, cells[0]])).toEqual([
      [1, 'a'],
      [2, ''],
      [3, 'x\ny'],
      [4, ''],
      [5, 'z'],
    ]);
  });

  it('takes off the apostrophe with which an export made text of a formula', async () => {
    const [row] = await rowsOf(Buffer.from(`'=A1,'+1,O'Hara,'tis\n`));
    expect(row?.cells).toEqual(['=A1', '+1', "O'Hara", "'tis"]);
  });

  it('tells encoding and delimiter', () => {
    expect(encodingOf(Buffer.from('Ñ', 'latin1'))).toBe('windows-1252');
    expect(encodingOf(Buffer.from(`${'é'.repeat(40_000)}x`))).toBe('utf-8');
    expect(delimiterOf('a;b\n1,5;2,5\n1,5;2,5\n')).toBe(';');
    expect(delimiterOf('one column\n1,5\n')).toBe(',');
  });
});

describe('reading XLSX', () => {
  it('reads dates, times, figures, shared and inline strings, gaps and truth', async () => {
    const bytes = await book(
      `<row r="1"><c r="A1" t="s"><v>0</v></c><c r="C1" t="inlineStr"><is><t>c</t></is></c></row>
       <row r="3"><c r="A3" s="2"><v>46173</v></c><c r="B3" s="3"><v>46173.75</v></c>
       <c r="C3" s="3"><v>0.27083333333333331</v></c><c r="D3"><v>41.880000000000003</v></c>
       <c r="E3" t="b"><v>1</v></c><c r="F3" t="str"><f>1+1</f><v>two</v></c></row>`,
      {
        'xl/_rels/workbook.xml.rels': bookParts['xl/_rels/workbook.xml.rels']!.replace(
          '</Relationships>',
          '<Relationship Id="rId9" Type="x/sharedStrings" Target="/xl/sharedStrings.xml"/></Relationships>',
        ),
        'xl/sharedStrings.xml':
          '<sst><si><r><t>sha</t></r><r><t>red</t></r><rPh><t>no</t></rPh></si></sst>',
      },
    );
    expect(await rowsOf(bytes)).toEqual([
      { number: 1, cells: ['shared', '', 'c'] },
      { number: 3, cells: ['2026-05-31', '2026-05-31 18:00', '06:30', '41.88', 'TRUE', 'two'] },
    ]);
  });

  it('knows both epochs and the day that 1900 never had', () => {
    expect(dateText(1, false)).toBe('1900-01-01');
    expect(dateText(61, false)).toBe('1900-03-01');
    expect(dateText(44_711, true)).toBe('2026-05-31');
  });

  it('tells date formats from others', () => {
    for (const code of ['m/d/yy', 'dd\\.mm\\.yyyy', '[$-409]h:mm AM/PM', '[h]:mm']) {
      expect(isDateFormat(code)).toBe(true);
    }
    for (const code of ['General', '0.00', '0" days"', '[Red]0.0', '#,##0\\ \\m']) {
      expect(isDateFormat(code)).toBe(false);
    }
  });

  it('refuses a file that unpacks to too much, whatever it says of itself', async () => {
    const bomb = await book('', { 'xl/styles.xml': Buffer.alloc(70_000_000) });
    expect(bomb.length).toBeLessThan(100_000);
    const archive = await XlsxArchive.open(bomb);
    let unpacked = 0;
    const unpack = async () => {
      for await (const chunk of archive.chunks('xl/styles.xml')) unpacked += chunk.length;
    };
    await expect(unpack()).rejects.toMatchObject({
      status: 422,
      more: { errors: [{ message: expect.stringContaining('too large') }] },
    });
    expect(unpacked).toBeLessThanOrEqual(64_000_000);
    await expect(rowsOf(bomb)).rejects.toMatchObject({ status: 422 });
  });

  it('refuses document types, text without end, and what is no workbook', async () => {
    const refused = { status: 422 };
    const entities = '<!DOCTYPE x [<!ENTITY a "aaaa">]><worksheet><sheetData/></worksheet>';
    await expect(
      rowsOf(await book('', { 'xl/worksheets/sheet1.xml': entities })),
    ).rejects.toMatchObject(refused);
    const endless = `<row><c t="str"><v>${'x'.repeat(3_000_000)}</v></c></row>`;
    await expect(rowsOf(await book(endless))).rejects.toMatchObject(refused);
    await expect(rowsOf(await book('<row>'))).rejects.toMatchObject(refused);
    await expect(rowsOf(Buffer.from('PK\u0003\u0004 no'))).rejects.toMatchObject(refused);
    expect(() => formatOf(Buffer.from([0xd0, 0xcf, 0x11, 0xe0]))).toThrow();
  });
});
