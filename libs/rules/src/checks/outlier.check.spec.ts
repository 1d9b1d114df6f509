import { expect, it } from 'vitest';
import { outlierCheck } from './outlier.check.js';

/** Nineteen returns from 1.10 % to 2.90 % in steps of 0.10: median 2.00, MAD 0.50. */
const plan = Array.from({ length: 19 }, (_, index) => 110 + index * 10);
const flagged = (returns: number[], outlierScore = 6) =>
  outlierCheck.check({ basisPoints: Float64Array.from(returns) }, { outlierScore });

it('fires on a return far from the others, on either side, and tells the place', () => {
  expect(flagged([...plan, NaN, 900])).toEqual([
    {
      code: 'outlier',
      severity: 'review',
      index: 20,
      figures: { periodReturnPct: '9.00', medianPct: '2.05', score: 9.4 },
    },
  ]);
  expect(flagged([-700, ...plan]).map(({ index }) => index)).toEqual([0]);
});

it('is not drawn along by the outliers themselves', () => {
  expect(flagged([...plan, 5000, 6000, 7000]).map(({ index }) => index)).toEqual([19, 20, 21]);
});

it('does not fire on a spread that is the plan’s own, nor beyond a wider threshold', () => {
  expect(flagged(plan)).toEqual([]);
  expect(flagged([...plan, 900], 10)).toEqual([]);
});

it('finds the one that differs where all others are the same, but not a small difference', () => {
  const same = Array.from({ length: 50 }, () => 200);
  expect(flagged([...same, 900]).map(({ index }) => index)).toEqual([50]);
  expect(flagged([...same, 250])).toEqual([]);
  expect(flagged(same)).toEqual([]);
});

it('does not judge by fewer than ten returns', () => {
  expect(flagged([...plan.slice(0, 8), 9000])).toEqual([]);
});
