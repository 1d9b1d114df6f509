import { describe, expect, it } from 'vitest';
import { evaluate, signChanges } from './evaluate.js';
import { isolateRoots } from './isolate.js';

/** The polynomial with the given roots, highest power first, times whatever makes its amounts whole. */
function fromRoots(roots: readonly number[], factor = 1): { exponents: Float64Array; amounts: Float64Array } {
  let amounts = [factor];
  for (const root of roots) {
    const next = [...amounts, 0];
    amounts.forEach((amount, index) => {
      next[index + 1]! -= amount * root;
    });
    amounts = next;
  }
  return {
    exponents: Float64Array.from(amounts, (_, index) => amounts.length - 1 - index),
    amounts: Float64Array.from(amounts),
  };
}

const rootsOf = (roots: readonly number[], factor?: number): number[] =>
  isolateRoots(fromRoots(roots, factor)).map(({ z }) => z.hi);

describe('isolation of every root', () => {
  it.each([[[2, 3]], [[1, 2, 3, 4, 5]], [[0.5, 0.25, 8]], [[1, 1.0001, 1.0002]], [[3, 4, 5, 6, 7, 8, 9]]])(
    'finds simple roots %j',
    (roots) => {
      const sorted = roots.toSorted((a, b) => a - b);
      const found = rootsOf(roots, 2 ** 20);
      expect(found.length).toBe(roots.length);
      found.forEach((root, index) => expect(root / sorted[index]! - 1).toBeCloseTo(0, 6));
    },
  );

  it('counts a multiple root once', () => {
    expect(rootsOf([2, 2])).toEqual([2]);
    expect(rootsOf([3, 3, 3])).toEqual([3]);
    expect(rootsOf([2, 2, 5])).toEqual([2, 5]);
    expect(rootsOf([2, 2, 5, 5])).toEqual([2, 5]);
  });

  it('tells a near miss from a touch', () => {
    const exponents = Float64Array.of(2, 1, 0);
    const near = 94_906_265;
    const count = (constant: number) =>
      isolateRoots({ exponents, amounts: Float64Array.of(1, -2 * near, constant) }).length;
    expect(count(near * near)).toBe(1);
    expect(count(near * near + 1)).toBe(0);
    expect(count(near * near - 1)).toBe(2);
  });

  it('finds both roots of a pump over long spans', () => {
    const roots = isolateRoots({
      exponents: Float64Array.of(1460, 730, 0),
      amounts: Float64Array.of(1600, -10000, 10000),
    });
    expect(roots.map(({ z }) => z.hi ** 730)).toEqual([expect.closeTo(1.25, 12), expect.closeTo(5, 12)]);
  });

  it('is quick and right with many changes of sign', () => {
    const amounts = Float64Array.from(
      { length: 60 },
      (_, index) => (index % 2 === 0 ? 1 : -1) * (1000 + ((index * 7919) % 613)),
    );
    const exponents = Float64Array.from(amounts, (_, index) => 28 * (amounts.length - 1 - index));
    expect(signChanges(amounts)).toBe(59);
    const roots = isolateRoots({ exponents, amounts });
    expect(roots.length % 2).toBe(1);
    for (const { z } of roots) {
      const { value, size } = evaluate({ exponents, amounts }, Math.log(z.hi));
      expect(Math.abs(value / size)).toBeLessThan(1e-12);
    }
  });
});

describe('the derivative', () => {
  it('agrees with differences', () => {
    const terms = { exponents: Float64Array.of(180, 120, 33, 0), amounts: Float64Array.of(5000, -1200, 700, -4300) };
    // Forwards and backwards both; below 0 values are not rescaled, above they are divided by z^180.
    const plain = (v: number) => evaluate(terms, v).value * (v > 0 ? Math.exp(180 * v) : 1);
    for (const v of [-0.01, 0.002]) {
      const step = 1e-6;
      const slope = evaluate(terms, v).slope * (v > 0 ? Math.exp(180 * v) : 1);
      expect((plain(v + step) - plain(v - step)) / (2 * step) / slope).toBeCloseTo(1, 6);
    }
  });
});
