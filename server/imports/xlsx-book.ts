import { posix } from 'node:path';
import { importLimits } from '@shared/imports/import-limits';
import type { XlsxArchive } from './xlsx-archive';
import { readXml } from './xml-events';
import { unreadable } from './table-row';

/** What must be known of a workbook before its first sheet can be read (ECMA-376 part 1, 18.2–18.8). */
export interface XlsxBook {
  /** The part that holds the first sheet. */
  readonly sheet: string;
  /** Days count from 1904 instead of 1900. */
  readonly from1904: boolean;
  /** Whether a cell format, by its number, shows figures as date or time. */
  readonly showsDate: readonly boolean[];
  readonly sharedStrings: readonly string[];
}

export async function readBook(archive: XlsxArchive): Promise<XlsxBook> {
  let firstSheet = '';
  let from1904 = false;
  await readXml(archive.chunks('xl/workbook.xml'), {
    open: (name, attributes) => {
      if (name === 'workbookPr') from1904 = /^(1|true)$/.test(attributes['date1904'] ?? '');
      if (name === 'sheet') firstSheet ||= idOf(attributes);
    },
  });
  const targets = new Map<string, { type: string; part: string }>();
  await readXml(archive.chunks('xl/_rels/workbook.xml.rels'), {
    open: (name, { Id = '', Type = '', Target = '' }) => {
      if (name !== 'Relationship') return;
      const part = Target.startsWith('/') ? Target.slice(1) : posix.join('xl', Target);
      targets.set(Id, { type: Type.slice(Type.lastIndexOf('/') + 1), part });
    },
  });
  const sheet = targets.get(firstSheet)?.part;
  if (!sheet) throw unreadable('It has no sheet. Save it again as XLSX or as CSV.');
  const partOf = (type: string) =>
    [...targets.values()].find((it) => it.type === type && archive.has(it.part))?.part;
  return {
    sheet,
    from1904,
    showsDate: await readFormats(archive, partOf('styles')),
    sharedStrings: await readStrings(archive, partOf('sharedStrings')),
  };
}

function idOf(attributes: Readonly<Record<string, string>>): string {
  return Object.entries(attributes).find(([name]) => /:id$/.test(name))?.[1] ?? '';
}

/** Numbers of the built-in formats for dates and times (18.8.30). */
const builtIn = (id: number) =>
  (id >= 14 && id <= 22) ||
  (id >= 27 && id <= 36) ||
  (id >= 45 && id <= 47) ||
  (id >= 50 && id <= 58);

/** @example isDateFormat('yyyy\\-mm\\-dd') // true; isDateFormat('0.00" days"') // false */
export function isDateFormat(code: string): boolean {
  const first = code.split(';')[0] ?? '';
  const bare = first.replace(/"[^"]*"|\\.|_.|\*.|\[(?!h+\]|m+\]|s+\])[^\]]*\]/gi, '');
  return /[ymdhs]/i.test(bare) && !/general/i.test(bare);
}

async function readFormats(archive: XlsxArchive, part: string | undefined): Promise<boolean[]> {
  const showsDate: boolean[] = [];
  if (!part) return showsDate;
  const own = new Map<number, boolean>();
  let inside = '';
  await readXml(archive.chunks(part), {
    open: (name, attributes) => {
      if (name === 'numFmt') {
        own.set(Number(attributes['numFmtId']), isDateFormat(attributes['formatCode'] ?? ''));
      }
      if (name === 'cellXfs' || name === 'cellStyleXfs') inside = name;
      if (name === 'xf' && inside === 'cellXfs') {
        const id = Number(attributes['numFmtId'] ?? 0);
        showsDate.push(own.get(id) ?? builtIn(id));
      }
    },
    close: (name) => {
      if (name === inside) inside = '';
    },
  });
  return showsDate;
}

async function readStrings(archive: XlsxArchive, part: string | undefined): Promise<string[]> {
  const strings: string[] = [];
  if (!part) return strings;
  let text = '';
  let inText = false;
  let phonetic = false;
  await readXml(archive.chunks(part), {
    open: (name) => {
      if (name === 'si') text = '';
      if (name === 'rPh') phonetic = true;
      inText = name === 't' && !phonetic;
    },
    text: (more) => {
      if (inText && text.length <= importLimits.cell) text += more;
    },
    close: (name) => {
      inText = false;
      if (name === 'rPh') phonetic = false;
      if (name === 'si') strings.push(text.slice(0, importLimits.cell + 1));
    },
  });
  return strings;
}
