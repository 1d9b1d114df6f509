import type { ImportKind, ImportRowError } from '@quarterpoise/dto';
import type { RawRow } from '@quarterpoise/rules';
import type { ImportNotice } from '../import-batch.js';
import { readImportFile } from '../import-file.reader.js';

export interface WholeFile {
  rows: RawRow[];
  errors: ImportRowError[];
  notices: ImportNotice[];
  bytesRead: number;
}

/** Reads a small file to its end, given to the reader in pieces of the wanted size. */
export async function readAll(file: string | Uint8Array, kind: ImportKind, pieceBytes = 64 * 1024): Promise<WholeFile> {
  const bytes = Buffer.from(file);
  const pieces: Buffer[] = [];
  for (let start = 0; start < bytes.length; start += pieceBytes) pieces.push(bytes.subarray(start, start + pieceBytes));
  const whole: WholeFile = { rows: [], errors: [], notices: [], bytesRead: 0 };
  for await (const batch of readImportFile(pieces, kind, 'upload')) {
    whole.rows.push(...batch.rows);
    whole.errors.push(...batch.errors);
    whole.notices.push(...batch.notices);
    whole.bytesRead = batch.bytesRead;
  }
  return whole;
}
