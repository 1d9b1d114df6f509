import { expect, it } from 'vitest';
import { ambiguousCheck } from './ambiguous.check.js';
import { accountCheckInput } from './testing/account-check-input.js';

it('fires with the rates that fit', () => {
  // Lorie and Savage (1955; figures from memory): 1600 in, 10000 out and 10000 in at equal distances, 25% and 400% a period; here two periods of 46 days
  const pump = accountCheckInput({
    balances: { '2026-06-30': 160_000, '2026-09-30': 0 },
    activity: [
      ['2026-08-15', 'withdrawal', 1_000_000],
      ['2026-09-30', 'employee_contribution', 1_000_000],
    ],
  });
  // growth of 1.25² and 5² over the quarter
  expect(ambiguousCheck.check(pump)).toEqual({ roots: '56.25%, 2400.00%' });
});

it('does not fire when one rate fits', () => {
  expect(ambiguousCheck.check(accountCheckInput())).toBeNull();
});
