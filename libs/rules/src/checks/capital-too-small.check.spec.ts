import { expect, it } from 'vitest';
import { capitalTooSmallCheck } from './capital-too-small.check.js';
import { accountCheckInput } from './testing/account-check-input.js';

// half of the quarter's 92 days: $20 opening and $9 at work for 46 days are $24.50 on average
const sketch = {
  balances: { '2026-06-30': 2000, '2026-09-30': 2950 },
  activity: [['2026-08-15', 'employee_contribution', 900]],
} as const;

it('fires with the average capital below the smallest of the policy', () => {
  expect(capitalTooSmallCheck.check(accountCheckInput(sketch))).toEqual({
    averageCapitalCents: 2450,
    smallestCents: 2500,
  });
});

it('does not fire at the smallest capital or above', () => {
  const policy = { smallestAverageCapitalCents: 2450 };
  expect(capitalTooSmallCheck.check(accountCheckInput({ ...sketch, policy }))).toBeNull();
});
