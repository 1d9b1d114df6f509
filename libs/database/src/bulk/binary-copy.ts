/**
 * PostgreSQL's binary COPY format (PostgreSQL documentation, "COPY", section "Binary Format"): a signature, then per row a field count and
 * per field a byte length (−1 for null) and the type's binary form, big-endian; a field count of −1 ends it.
 */
const SIGNATURE = Buffer.from('PGCOPY\n\xff\r\n\0', 'latin1');
const HEADER_LENGTH = SIGNATURE.length + 8;

/** Reads the fields of each row; the buffers are views of what came in, good until the next row is asked for. */
export async function* readBinaryRows(source: AsyncIterable<Buffer>): AsyncGenerator<(Buffer | null)[]> {
  let pending: Buffer = Buffer.alloc(0);
  let headerRead = false;
  for await (const chunk of source) {
    pending = pending.length === 0 ? chunk : Buffer.concat([pending, chunk]);
    let offset = 0;
    if (!headerRead) {
      if (pending.length < HEADER_LENGTH) continue;
      if (!pending.subarray(0, SIGNATURE.length).equals(SIGNATURE)) throw new Error('not a binary COPY stream');
      offset = HEADER_LENGTH + pending.readInt32BE(SIGNATURE.length + 4);
      headerRead = true;
    }
    for (;;) {
      const row = readRow(pending, offset);
      if (row === 'end') return;
      if (row === 'incomplete') break;
      offset = row.end;
      yield row.fields;
    }
    pending = pending.subarray(offset);
  }
  throw new Error('the binary COPY stream ended in the middle of a row');
}

function readRow(buffer: Buffer, start: number): { fields: (Buffer | null)[]; end: number } | 'incomplete' | 'end' {
  if (buffer.length < start + 2) return 'incomplete';
  const count = buffer.readInt16BE(start);
  if (count === -1) return 'end';
  const fields: (Buffer | null)[] = [];
  let offset = start + 2;
  for (let field = 0; field < count; field += 1) {
    if (buffer.length < offset + 4) return 'incomplete';
    const length = buffer.readInt32BE(offset);
    offset += 4;
    if (length === -1) {
      fields.push(null);
      continue;
    }
    if (buffer.length < offset + length) return 'incomplete';
    fields.push(buffer.subarray(offset, offset + length));
    offset += length;
  }
  return { fields, end: offset };
}

/** Elements of a one-dimensional array field without nulls. */
export class BinaryArray {
  readonly length: number;
  constructor(private readonly field: Buffer) {
    // dimensions, has-nulls flag, element type, then length and lower bound of the one dimension
    this.length = field.readInt32BE(0) === 0 ? 0 : field.readInt32BE(12);
  }

  int16(into: Uint8Array): Uint8Array {
    for (let i = 0, at = 24; i < this.length; i += 1, at += 6) into[i] = this.field.readInt16BE(at);
    return into;
  }

  int32(): Int32Array {
    const values = new Int32Array(this.length);
    for (let i = 0, at = 24; i < this.length; i += 1, at += 8) values[i] = this.field.readInt32BE(at);
    return values;
  }

  /** Whole cents. The database's checks keep single amounts within the safe integers. */
  int64AsCents(): Float64Array {
    const values = new Float64Array(this.length);
    for (let i = 0, at = 24; i < this.length; i += 1, at += 12) {
      values[i] = this.field.readInt32BE(at) * 4294967296 + this.field.readUInt32BE(at + 4);
    }
    return values;
  }
}

export function uuidOf(field: Buffer): string {
  const hex = field.toString('hex');
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-${hex.slice(12, 16)}-${hex.slice(16, 20)}-${hex.slice(20)}`;
}

/** What each column of a row written by {@link binaryRows} is. */
export type BinaryColumn = 'uuid' | 'text' | 'bigint' | 'int' | 'smallint' | 'date' | 'bytea' | 'jsonb';

/** Encodes rows for `copy … from stdin (format binary)`. Dates are days since 1970-01-01. */
export function* binaryRows(
  columns: readonly BinaryColumn[],
  rows: Iterable<readonly (string | number | Uint8Array | object | null)[]>,
): Generator<Buffer> {
  yield Buffer.concat([SIGNATURE, Buffer.alloc(8)]);
  for (const row of rows) {
    const parts: Buffer[] = [int16(columns.length)];
    columns.forEach((column, index) => {
      const value = row[index];
      if (value === null || value === undefined) parts.push(int32(-1));
      else {
        const encoded = encode(column, value);
        parts.push(int32(encoded.length), encoded);
      }
    });
    yield Buffer.concat(parts);
  }
  yield int16(-1);
}

/** PostgreSQL counts days from 2000-01-01. */
const DAYS_TO_2000 = 10957;

function encode(column: BinaryColumn, value: string | number | Uint8Array | object): Buffer {
  switch (column) {
    case 'uuid':
      return Buffer.from(String(value).replaceAll('-', ''), 'hex');
    case 'text':
      return Buffer.from(String(value), 'utf8');
    case 'bigint': {
      const buffer = Buffer.alloc(8);
      buffer.writeBigInt64BE(BigInt(value as number));
      return buffer;
    }
    case 'int':
      return int32(value as number);
    case 'smallint':
      return int16(value as number);
    case 'date':
      return int32((value as number) - DAYS_TO_2000);
    case 'bytea':
      return Buffer.from(value as Uint8Array);
    case 'jsonb':
      return Buffer.concat([Buffer.of(1), Buffer.from(JSON.stringify(value), 'utf8')]);
  }
}

function int16(value: number): Buffer {
  const buffer = Buffer.alloc(2);
  buffer.writeInt16BE(value);
  return buffer;
}

function int32(value: number): Buffer {
  const buffer = Buffer.alloc(4);
  buffer.writeInt32BE(value);
  return buffer;
}
