import { expect, it } from 'vitest';
import { notComputedCheck } from './not-computed.check.js';
import { accountCheckInput } from './testing/account-check-input.js';

it('fires with the reason when a balance is missing', () => {
  expect(notComputedCheck.check(accountCheckInput({ balances: { '2026-06-30': 1_000_000 } }))).toEqual({
    reason: 'closing-balance-missing',
  });
  expect(notComputedCheck.check(accountCheckInput({ balances: { '2026-05-31': 5, '2026-09-30': 1_000_000 } }))).toEqual(
    {
      reason: 'opening-balance-missing',
    },
  );
});

it('does not fire on a computed account, nor on one with too little capital', () => {
  expect(notComputedCheck.check(accountCheckInput())).toBeNull();
  const tiny = accountCheckInput({ balances: { '2026-06-30': 100, '2026-09-30': 101 } });
  expect(tiny.result.status).toBe('not-computed');
  expect(notComputedCheck.check(tiny)).toBeNull();
});
