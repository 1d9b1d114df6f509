import { z } from 'zod';
import { ProblemException } from './problems/problem.exception.js';

/** Makes the opaque cursor of the next page out of the sort key of the last row shown. */
export function encodeCursor(key: readonly unknown[]): string {
  return Buffer.from(JSON.stringify(key)).toString('base64url');
}

/**
 * Reads a cursor back.
 * @param key The schema of the sort key: a cursor comes from outside and is not to be believed.
 * @returns null for the first page.
 * @throws ProblemException validation-failed when it is not one of ours.
 */
export function decodeCursor<K extends z.ZodType>(cursor: string | undefined, key: K): z.output<K> | null {
  if (cursor === undefined) return null;
  try {
    return key.parse(JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8')));
  } catch {
    throw new ProblemException('validation-failed', undefined, {
      errors: [
        { pointer: '/query/cursor', code: 'not-a-cursor', detail: 'Take it from nextCursor of the page before.' },
      ],
    });
  }
}

/**
 * Cuts a page out of rows that were asked for with `limit + 1`: the one too many tells that there is a next page.
 * @param keyOf The sort key of a row, the way `decodeCursor` will read it.
 */
export function pageOfRows<Row, Item>(
  rows: readonly Row[],
  limit: number,
  keyOf: (row: Row) => readonly unknown[],
  present: (row: Row) => Item,
): { items: Item[]; nextCursor: string | null } {
  const shown = rows.slice(0, limit);
  const last = shown.at(-1);
  return {
    items: shown.map(present),
    nextCursor: rows.length > limit && last !== undefined ? encodeCursor(keyOf(last)) : null,
  };
}
