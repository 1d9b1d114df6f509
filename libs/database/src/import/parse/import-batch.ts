import type { ImportKind, ImportRowError, importNotice } from '@quarterpoise/dto';
import type { RawRow } from '@quarterpoise/rules';
import type { z } from 'zod';

export type ImportNotice = z.infer<typeof importNotice>;

/** The next rows of a file, in its order. */
export interface ImportBatch {
  readonly rows: readonly RawRow[];
  /** Rows that have the wrong number of values; they are not among `rows`. */
  readonly errors: readonly ImportRowError[];
  /** What was noticed about the whole file; only the first batch has any. */
  readonly notices: readonly ImportNotice[];
  /** Bytes of the file that have been read. */
  readonly bytesRead: number;
}

/** Bytes in pieces of any size, as they lie in the database or come from a stream. */
export type ByteSource = AsyncIterable<Uint8Array> | Iterable<Uint8Array>;

export interface ReadOptions {
  readonly kind: ImportKind;
  /** What the sentences call the file. */
  readonly name: string;
}
