import { SaxesParser } from 'saxes';
import { unreadable } from './table-row';

export interface XmlHandlers {
  open?(name: string, attributes: Readonly<Record<string, string>>): void;
  text?(text: string): void;
  close?(name: string): void;
}

/** Characters between two tags: no cell, attribute or name of an honest file is longer. */
const BETWEEN_TAGS = 1_000_000;

const damaged = () => unreadable('Its contents are damaged. Save it again as XLSX or as CSV.');

/**
 * Reads XML as its bytes come and tells what it meets, names without prefix. After each chunk it gives
 * control back, so that whoever collects can pass things on. A document type is refused: with it come
 * entities that grow (XML bombs) or point elsewhere.
 * @throws Problem 422 when it is no well-formed XML
 */
export async function* xmlEvents(
  chunks: AsyncIterable<Buffer>,
  handlers: XmlHandlers,
): AsyncGenerator<void> {
  const parser = new SaxesParser();
  const decoder = new TextDecoder('utf-8');
  let sinceTag = 0;
  const local = (name: string) => name.slice(name.indexOf(':') + 1);
  parser.on('doctype', () => {
    throw damaged();
  });
  parser.on('error', () => {
    throw damaged();
  });
  parser.on('opentag', ({ name, attributes }) => {
    sinceTag = 0;
    handlers.open?.(local(name), attributes);
  });
  parser.on('closetag', ({ name }) => {
    sinceTag = 0;
    handlers.close?.(local(name));
  });
  parser.on('text', (text) => handlers.text?.(text));
  parser.on('cdata', (text) => handlers.text?.(text));
  for await (const chunk of chunks) {
    sinceTag += chunk.length;
    if (sinceTag > BETWEEN_TAGS) throw damaged();
    parser.write(decoder.decode(chunk, { stream: true }));
    yield;
  }
  parser.write(decoder.decode());
  parser.close();
  yield;
}

/** Reads a small document whole. */
export async function readXml(chunks: AsyncIterable<Buffer>, handlers: XmlHandlers): Promise<void> {
  for await (const _ of xmlEvents(chunks, handlers)) void _;
}
