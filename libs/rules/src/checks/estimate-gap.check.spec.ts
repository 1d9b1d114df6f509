import { returnPolicy } from '@quarterpoise/dto';
import { expect, it } from 'vitest';
import { estimateGapCheck } from './estimate-gap.check.js';
import { accountCheckInput } from './testing/account-check-input.js';

// ten times the opening balance comes in half-way through a quarter of strong growth
const sketch = {
  balances: { '2026-06-30': 100_000, '2026-09-30': 1_350_000 },
  activity: [['2026-08-15', 'rollover_in', 1_000_000]],
} as const;

const withThreshold = (estimateGapBasisPoints: number) =>
  accountCheckInput({
    ...sketch,
    policy: { checks: returnPolicy.parse({ checks: { estimateGapBasisPoints } }).checks },
  });

it('fires when estimate and solved rate lie further apart than the policy takes', () => {
  const figures = estimateGapCheck.check(accountCheckInput(sketch));
  expect(figures).toMatchObject({ thresholdBasisPoints: 50, firstEstimatePct: '41.67' });
  expect(Number(figures?.['gapBasisPoints'])).toBe(Math.round(Number(figures?.['periodReturnPct']) * 100) - 4167);
});

it('does not fire at the threshold, and does one below', () => {
  const gap = Number(estimateGapCheck.check(accountCheckInput(sketch))?.['gapBasisPoints']);
  expect(estimateGapCheck.check(withThreshold(gap))).toBeNull();
  expect(estimateGapCheck.check(withThreshold(gap - 1))).not.toBeNull();
});

it('does not fire without flows, where both are the same', () => {
  expect(estimateGapCheck.check(accountCheckInput())).toBeNull();
});
