import type { Readable } from 'node:stream';
import { type Entry, type ZipFile, fromBuffer } from 'yauzl';
import { importLimits } from '@shared/imports/import-limits';
import { unreadable } from './table-row';

const damaged = () =>
  unreadable('It is no spreadsheet, or it is damaged. Save it again as XLSX or as CSV.');

/** Parts of a real workbook number in the dozens. */
const ENTRIES = 2_000;

/** Bytes of a part that is kept in memory while the sheet is read. */
const KEPT = 64_000_000;

/**
 * The parts of an XLSX file. What comes out is counted as it is unpacked, so that a file that blows up
 * is refused whatever it says of itself.
 */
export class XlsxArchive {
  private unpacked = 0;

  private constructor(
    private readonly zip: ZipFile,
    private readonly entries: ReadonlyMap<string, Entry>,
  ) {}

  /** @throws Problem 422 when the bytes are no archive */
  static async open(bytes: Buffer): Promise<XlsxArchive> {
    try {
      const zip = await new Promise<ZipFile>((done, fail) =>
        fromBuffer(bytes, { lazyEntries: true, autoClose: false }, (error, opened) =>
          error ? fail(error) : done(opened),
        ),
      );
      if (zip.entryCount > ENTRIES) throw damaged();
      return new XlsxArchive(zip, await entriesOf(zip));
    } catch {
      throw damaged();
    }
  }

  has(name: string): boolean {
    return this.entries.has(name);
  }

  /**
   * A part's bytes, chunk by chunk.
   * @throws Problem 422 when the part is missing, damaged, or more than is taken in
   */
  async *chunks(name: string, maxBytes = KEPT): AsyncGenerator<Buffer> {
    let ofPart = 0;
    const entry = this.entries.get(name);
    if (!entry) throw damaged();
    const stream = await new Promise<Readable>((done, fail) =>
      this.zip.openReadStream(entry, (error, opened) => (error ? fail(damaged()) : done(opened))),
    );
    try {
      for await (const chunk of stream) {
        this.unpacked += (chunk as Buffer).length;
        ofPart += (chunk as Buffer).length;
        if (this.unpacked > importLimits.unpackedBytes || ofPart > maxBytes) {
          throw unreadable('It is too large once unpacked. Split it, or save it as CSV.');
        }
        yield chunk as Buffer;
      }
    } catch (error) {
      throw error instanceof Error && 'status' in error ? error : damaged();
    } finally {
      stream.destroy();
    }
  }
}

function entriesOf(zip: ZipFile): Promise<Map<string, Entry>> {
  const entries = new Map<string, Entry>();
  return new Promise((done, fail) => {
    zip.on('entry', (entry: Entry) => {
      entries.set(entry.fileName.replace(/^\//, ''), entry);
      zip.readEntry();
    });
    zip.on('end', () => done(entries));
    zip.on('error', fail);
    zip.readEntry();
  });
}
