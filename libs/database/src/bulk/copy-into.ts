import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { EntityManager } from '@mikro-orm/postgresql';
import { from as copyFrom } from 'pg-copy-streams';
import { type BinaryColumn, binaryRows } from './binary-copy.js';
import { rawClient } from './raw-client.js';

/**
 * Streams rows into a temporary staging table of the transaction. Tables with policies refuse COPY, so what goes to one of them is staged
 * and then inserted in one statement, where the policies hold.
 */
export async function copyInto(
  tx: EntityManager,
  table: string,
  columns: Readonly<Record<string, BinaryColumn>>,
  rows: Iterable<readonly (string | number | Uint8Array | object | null)[]>,
): Promise<void> {
  const client = await rawClient(tx);
  const names = Object.keys(columns);
  const sink = client.query(copyFrom(`copy ${table} (${names.join(', ')}) from stdin (format binary)`));
  await pipeline(Readable.from(binaryRows(Object.values(columns), rows)), sink);
}
