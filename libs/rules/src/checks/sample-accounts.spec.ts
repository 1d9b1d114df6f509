import { createHash } from 'node:crypto';
import { expect, it } from 'vitest';
import { sampleAccounts, xoshiro128StarStar } from './sample-accounts.js';

const digest = (text: string) => createHash('sha256').update(text).digest('hex');
const ids = Array.from({ length: 2400 }, (_, index) => `account-${String(index).padStart(4, '0')}`);

it('draws the same accounts from the same results, whatever the order of the list', () => {
  const sample = sampleAccounts(digest('run'), ids, 10);
  expect(new Set(sample).size).toBe(10);
  expect(sampleAccounts(digest('run'), ids.toReversed(), 10)).toEqual(sample);
  expect(sampleAccounts(digest('another run'), ids, 10)).not.toEqual(sample);
});

it('gives every account the same chance', () => {
  const few = ids.slice(0, 20);
  const drawn = new Map(few.map((id) => [id, 0]));
  for (let run = 0; run < 4000; run += 1) {
    for (const id of sampleAccounts(digest(`run ${run}`), few, 5)) drawn.set(id, drawn.get(id)! + 1);
  }
  // 1000 each are expected; five standard deviations are 137
  for (const count of drawn.values()) expect(Math.abs(count - 1000)).toBeLessThan(137);
});

it('takes all when there are no more than asked for, and works from a digest of zeros', () => {
  expect(sampleAccounts('0'.repeat(64), ids.slice(0, 3), 10).toSorted()).toEqual(ids.slice(0, 3));
  expect(sampleAccounts(digest('run'), [], 10)).toEqual([]);
});

it('refuses what is no digest', () => {
  expect(() => sampleAccounts('run', ids, 10)).toThrow(RangeError);
});

it('the generator gives the numbers of its authors’ program from the state 1, 2, 3, 4 (from memory)', () => {
  const next = xoshiro128StarStar([1, 2, 3, 4]);
  expect([next(), next(), next(), next()]).toEqual([11520, 0, 5927040, 70819200]);
});
