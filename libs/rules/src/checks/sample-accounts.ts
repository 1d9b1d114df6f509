/**
 * Accounts to look at before signing: drawn without replacement by a generator that starts from the digest of the run's results, so
 * that nobody chooses the sample and anybody can draw it again.
 * @param resultsSha256 64 hexadecimal digits.
 * @param accountIds In any order: the draw is over the sorted ids.
 * @returns The sample in the order drawn; all accounts when there are no more than asked for.
 */
export function sampleAccounts(resultsSha256: string, accountIds: readonly string[], size: number): string[] {
  const ids = accountIds.toSorted();
  const next = xoshiro128StarStar(seedOf(resultsSha256));
  const wanted = Math.min(size, ids.length);
  for (let index = 0; index < wanted; index += 1) {
    const drawn = index + below(ids.length - index, next);
    [ids[index], ids[drawn]] = [ids[drawn]!, ids[index]!];
  }
  return ids.slice(0, wanted);
}

function seedOf(digest: string): number[] {
  if (!/^[0-9a-f]{64}$/i.test(digest)) throw new RangeError('A SHA-256 digest has 64 hexadecimal digits');
  const words = Array.from({ length: 8 }, (_, index) => parseInt(digest.slice(index * 8, index * 8 + 8), 16));
  const seed = [0, 1, 2, 3].map((index) => (words[index]! ^ words[index + 4]!) >>> 0);
  // the generator stands still at zero
  return seed.every((word) => word === 0) ? [1, 0, 0, 0] : seed;
}

/** A whole number from 0 to limit − 1, each as likely as the others. */
function below(limit: number, next: () => number): number {
  const most = 2 ** 32 - (2 ** 32 % limit);
  for (;;) {
    const value = next();
    if (value < most) return value % limit;
  }
}

/** xoshiro128** 1.1 of Blackman and Vigna (2018): 32 bits at a time. Four words of state, not all zero. */
export function xoshiro128StarStar(seed: readonly number[]): () => number {
  const state = Uint32Array.from(seed);
  const rotate = (value: number, by: number) => ((value << by) | (value >>> (32 - by))) >>> 0;
  return () => {
    const result = Math.imul(rotate(Math.imul(state[1]!, 5) >>> 0, 7), 9) >>> 0;
    const shifted = state[1]! << 9;
    state[2]! ^= state[0]!;
    state[3]! ^= state[1]!;
    state[1]! ^= state[2]!;
    state[0]! ^= state[3]!;
    state[2]! ^= shifted;
    state[3] = rotate(state[3]!, 11);
    return result;
  };
}
