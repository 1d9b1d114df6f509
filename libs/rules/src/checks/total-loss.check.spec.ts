import { expect, it } from 'vitest';
import { accountCheckInput } from './testing/account-check-input.js';
import { totalLossCheck } from './total-loss.check.js';

it('fires when everything is gone and nothing was paid out', () => {
  expect(totalLossCheck.check(accountCheckInput({ balances: { '2026-06-30': 90_000, '2026-09-30': 0 } }))).toEqual({
    openingCents: 90_000,
    gainCents: -90_000,
  });
});

it('does not fire when the money was paid out', () => {
  const paidOut = accountCheckInput({
    balances: { '2026-06-30': 90_000, '2026-09-30': 0 },
    activity: [['2026-08-20', 'distribution', 91_000]],
  });
  expect(totalLossCheck.check(paidOut)).toBeNull();
});
