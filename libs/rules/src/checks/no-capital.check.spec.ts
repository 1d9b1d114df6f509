import { expect, it } from 'vitest';
import { noCapitalCheck } from './no-capital.check.js';
import { accountCheckInput } from './testing/account-check-input.js';

it('fires on an account that is empty throughout', () => {
  expect(noCapitalCheck.check(accountCheckInput({ balances: { '2026-06-30': 0, '2026-09-30': 0 } }))).toEqual({
    reason: 'no-money',
  });
});

it('does not fire when money was at work', () => {
  expect(noCapitalCheck.check(accountCheckInput())).toBeNull();
});
