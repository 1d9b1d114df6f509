import { type SaxesOptions, SaxesParser, type SaxesTagPlain } from 'saxes';
import { type Entry, fromBufferPromise, type ZipFile } from 'yauzl';
import { UnreadableFile } from './unreadable-file.js';

/** The parts of a workbook by their path in the archive. */
export interface XlsxArchive {
  readonly zip: ZipFile;
  readonly parts: ReadonlyMap<string, Entry>;
}

/** What a reader of XML wants to be told; names come without their prefix. */
export interface XmlHandlers {
  readonly open: (name: string, attributes: Readonly<Record<string, string>>) => void;
  readonly text?: (text: string) => void;
  readonly close?: (name: string) => void;
}

/** A part that unpacks to more than this was not made for us. */
const LARGEST_PART_BYTES = 2 ** 31;

export async function openArchive(bytes: Buffer): Promise<XlsxArchive> {
  const zip = await fromBufferPromise(bytes);
  const parts = new Map<string, Entry>();
  for await (const entry of zip.eachEntry()) parts.set(entry.fileName, entry);
  return { zip, parts };
}

/**
 * Parses a part as it is unpacked and stops after each piece, so that what a piece brought can be handed on.
 * Yields the share of the part that has been read. Entities beyond XML's own five are not expanded.
 */
export async function* parsePart(
  { zip, parts }: XlsxArchive,
  path: string,
  handlers: XmlHandlers,
): AsyncGenerator<number> {
  const entry = parts.get(path);
  if (!entry) throw new Error(`The workbook has no part ${path}`);
  if (entry.uncompressedSize > LARGEST_PART_BYTES) {
    throw new UnreadableFile('import-too-large', 'The workbook unpacks to more than 2 GB; send it as CSV.');
  }
  const options: SaxesOptions & { xmlns: false } = { xmlns: false, position: false };
  const parser = new SaxesParser(options);
  parser.on('opentag', (tag: SaxesTagPlain) => handlers.open(localName(tag.name), tag.attributes));
  if (handlers.text) {
    const { text } = handlers;
    parser.on('text', text);
    parser.on('cdata', text);
  }
  if (handlers.close) {
    const { close } = handlers;
    parser.on('closetag', (tag: SaxesTagPlain) => close(localName(tag.name)));
  }
  const stream = await zip.openReadStreamPromise(entry);
  const decoder = new TextDecoder('utf-8', { fatal: true });
  let read = 0;
  for await (const chunk of stream as AsyncIterable<Buffer>) {
    read += chunk.length;
    parser.write(decoder.decode(chunk, { stream: true }));
    yield read / Math.max(entry.uncompressedSize, 1);
  }
  parser.write(decoder.decode()).close();
}

/** Parses a whole part at once. */
export async function readPart(archive: XlsxArchive, path: string, handlers: XmlHandlers): Promise<void> {
  const pieces = parsePart(archive, path, handlers);
  while (!(await pieces.next()).done);
}

const localName = (name: string): string => name.slice(name.indexOf(':') + 1);
