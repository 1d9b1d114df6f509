import { isUtf8 } from 'node:buffer';
import type { ByteSource } from './import-batch.js';
import { UnreadableFile } from './unreadable-file.js';

/** Whole rows of a CSV file: it ends at the end of a line that is outside quotes, or at the end of the file. */
export interface TextBlock {
  readonly text: string;
  /** Number of its first line in the file; 1 is the first. */
  readonly line: number;
  readonly hasQuotes: boolean;
  readonly isFirst: boolean;
  /** Set where more than a row may hold was read without an end of a row. */
  readonly isCutOff: boolean;
  /** Bytes of the file read so far. */
  readonly bytesRead: number;
}

/** No row of our files comes near this; what does is a quote that is never closed, or no CSV. */
const LONGEST_ROW_BYTES = 1 << 20;
const PIECE_BYTES = 256 * 1024;
const LINE_FEED = 0x0a;
const CARRIAGE_RETURN = 0x0d;
const QUOTE = 0x22;

/**
 * Cuts a stream of bytes into blocks of whole rows, checked to be UTF-8 text. In RFC 4180 a line break ends a row just when the quotes
 * before it are even in number, so that no more than one row and one piece of the stream is ever held.
 * @throws UnreadableFile naming the line where the bytes are not UTF-8 or not text.
 */
export async function* textBlocks(source: ByteSource): AsyncGenerator<TextBlock> {
  let rest: Buffer = Buffer.alloc(0);
  let line = 1;
  let bytesRead = 0;
  let isFirst = true;
  let lineEnd: number | null = null;

  const blockOf = (bytes: Buffer, isCutOff: boolean): TextBlock => {
    const hasQuotes = bytes.includes(QUOTE);
    const block = { text: decode(bytes, line, isCutOff), line, hasQuotes, isFirst, isCutOff, bytesRead };
    isFirst = false;
    line += countLines(bytes, lineEnd ?? LINE_FEED);
    return block;
  };

  for await (const chunk of source) {
    for (let start = 0; start < chunk.length; start += PIECE_BYTES) {
      const piece = chunk.subarray(start, start + PIECE_BYTES);
      bytesRead += piece.length;
      const bytes =
        rest.length === 0 ? Buffer.from(piece.buffer, piece.byteOffset, piece.length) : Buffer.concat([rest, piece]);
      lineEnd ??= lineEndOf(bytes, PIECE_BYTES);
      const end = lineEnd === null ? -1 : endOfRows(bytes, lineEnd);
      if (end > 0) yield blockOf(bytes.subarray(0, end), false);
      rest = end > 0 ? bytes.subarray(end) : bytes;
      if (rest.length > LONGEST_ROW_BYTES) {
        yield blockOf(rest, true);
        return;
      }
    }
  }
  lineEnd ??= lineEndOf(rest, 0);
  if (rest.length > 0) yield blockOf(rest, false);
}

/** Lines end with a line feed; files of very old programs end them with a carriage return alone. Null: not to be told yet. */
function lineEndOf(bytes: Buffer, enough: number): number | null {
  if (bytes.includes(LINE_FEED)) return LINE_FEED;
  return bytes.length >= enough && bytes.includes(CARRIAGE_RETURN) ? CARRIAGE_RETURN : null;
}

/** Just behind the last line break that is outside quotes; 0 when there is none. */
function endOfRows(bytes: Buffer, lineEnd: number): number {
  let end = bytes.lastIndexOf(lineEnd);
  if (end < 0) return 0;
  let quotes = count(bytes, QUOTE, 0, end);
  while (quotes % 2 === 1) {
    const previous = end === 0 ? -1 : bytes.lastIndexOf(lineEnd, end - 1);
    if (previous < 0) return 0;
    quotes -= count(bytes, QUOTE, previous, end);
    end = previous;
  }
  return end + 1;
}

function count(bytes: Buffer, byte: number, start: number, end: number): number {
  let found = 0;
  for (let at = bytes.indexOf(byte, start); at !== -1 && at < end; at = bytes.indexOf(byte, at + 1)) found += 1;
  return found;
}

const countLines = (bytes: Buffer, lineEnd: number): number => count(bytes, lineEnd, 0, bytes.length);

function decode(bytes: Buffer, firstLine: number, isCutOff: boolean): string {
  const zero = bytes.indexOf(0);
  if (zero !== -1) {
    const line = firstLine + count(bytes, LINE_FEED, 0, zero);
    throw new UnreadableFile('import-not-text', `Line ${line} holds bytes that stand in no text file.`, line);
  }
  // a block that was cut off may end within a character
  if (!isUtf8(bytes) && !isCutOff) {
    const line = firstLine + linesBeforeFault(bytes);
    throw new UnreadableFile('import-not-text', `Line ${line} holds characters that are not UTF-8.`, line);
  }
  return bytes.toString('utf8');
}

function linesBeforeFault(bytes: Buffer): number {
  let start = 0;
  for (let lines = 0; ; lines += 1) {
    const end = bytes.indexOf(LINE_FEED, start);
    if (end === -1 || !isUtf8(bytes.subarray(start, end))) return lines;
    start = end + 1;
  }
}
