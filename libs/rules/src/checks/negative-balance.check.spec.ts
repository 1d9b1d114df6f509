import { expect, it } from 'vitest';
import { negativeBalanceCheck } from './negative-balance.check.js';
import { accountCheckInput } from './testing/account-check-input.js';

const between = (opening: number, closing: number) =>
  accountCheckInput({ balances: { '2026-06-30': opening, '2026-09-30': closing } });

it('fires on a closing or an opening balance below zero', () => {
  expect(negativeBalanceCheck.check(between(5000, -1))).toEqual({ balanceCents: -1, asOf: '2026-09-30' });
  expect(negativeBalanceCheck.check(between(-1250, 5000))).toEqual({ balanceCents: -1250, asOf: '2026-06-30' });
});

it('does not fire at zero or above', () => {
  expect(negativeBalanceCheck.check(between(0, 0))).toBeNull();
  expect(negativeBalanceCheck.check(accountCheckInput())).toBeNull();
});
