import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { decodeCursor, encodeCursor, pageOfRows } from './cursor.js';

const key = z.tuple([z.string(), z.int()]);

describe('cursors', () => {
  it('come back as they were made', () => {
    expect(decodeCursor(encodeCursor(['Łukasz', 7]), key)).toEqual(['Łukasz', 7]);
  });

  it('mean the first page when absent', () => {
    expect(decodeCursor(undefined, key)).toBeNull();
  });

  it.each(['', 'nonsense', encodeCursor(['only one']), encodeCursor([1, 1])])(
    'are refused when not ours: %s',
    (text) => {
      expect(() => decodeCursor(text, key)).toThrow(expect.objectContaining({ code: 'validation-failed' }));
    },
  );
});

describe('pageOfRows', () => {
  const rows = [1, 2, 3].map((n) => ({ n }));
  const page = (limit: number) =>
    pageOfRows(
      rows,
      limit,
      (row) => [row.n],
      (row) => row.n,
    );

  it('says that there is more when a row too many came', () => {
    expect(page(2).items).toEqual([1, 2]);
    expect(decodeCursor(page(2).nextCursor!, z.tuple([z.int()]))).toEqual([2]);
  });

  it('says that this was all otherwise', () => {
    expect(page(3)).toEqual({ items: [1, 2, 3], nextCursor: null });
  });
});
