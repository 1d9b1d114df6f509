import { expect, it } from 'vitest';
import { noSolutionCheck } from './no-solution.check.js';
import { accountCheckInput } from './testing/account-check-input.js';

it('fires when no rate can explain the figures', () => {
  // an empty account pays out and still holds money at the end
  const wrongKind = accountCheckInput({
    balances: { '2026-06-30': 0, '2026-09-30': 50_000 },
    activity: [['2026-07-15', 'withdrawal', 50_000]],
  });
  expect(noSolutionCheck.check(wrongKind)).toEqual({ openingCents: 0, closingCents: 50_000 });
});

it('does not fire when the same flow is a contribution', () => {
  const rightKind = accountCheckInput({
    balances: { '2026-06-30': 0, '2026-09-30': 50_500 },
    activity: [['2026-07-15', 'employee_contribution', 50_000]],
  });
  expect(noSolutionCheck.check(rightKind)).toBeNull();
});
