import type { ImportKind } from '@quarterpoise/dto';
import { isZip } from './content-type.js';
import { readCsv } from './csv.reader.js';
import type { ByteSource, ImportBatch } from './import-batch.js';
import { readXlsx } from './xlsx.reader.js';

/**
 * Reads an uploaded file, CSV or XLSX: its content decides which, whatever its name ends in; the name is for the sentences only.
 * @throws UnreadableFile when the file as a whole is not to be read, at the latest at its end: nothing is final before the last batch.
 */
export async function* readImportFile(
  source: ByteSource,
  kind: ImportKind,
  fileName: string,
): AsyncGenerator<ImportBatch> {
  const options = { kind, name: `“${fileName}”` };
  const pieces = toIterator(source);
  const start: Uint8Array[] = [];
  let size = 0;
  while (size < 4) {
    const next = await pieces.next();
    if (next.done) break;
    start.push(next.value);
    size += next.value.length;
  }
  const read = isZip(Buffer.concat(start)) ? readXlsx : readCsv;
  yield* read(whole(start, pieces), options);
}

const toIterator = (source: ByteSource): AsyncIterator<Uint8Array> | Iterator<Uint8Array> =>
  Symbol.asyncIterator in source ? source[Symbol.asyncIterator]() : source[Symbol.iterator]();

/** The pieces that were looked at and those still to come. Whoever stops early lets go of the source. */
async function* whole(
  start: readonly Uint8Array[],
  pieces: AsyncIterator<Uint8Array> | Iterator<Uint8Array>,
): AsyncGenerator<Uint8Array> {
  try {
    yield* start;
    for (let next = await pieces.next(); !next.done; next = await pieces.next()) yield next.value;
  } finally {
    await pieces.return?.();
  }
}
