import { returnPolicy } from '@quarterpoise/dto';
import { expect, it } from 'vitest';
import { extremeReturnCheck } from './extreme-return.check.js';
import { accountCheckInput } from './testing/account-check-input.js';

const earning = (closing: number, extremeReturnPercent = 25) =>
  accountCheckInput({
    balances: { '2026-06-30': 1_000_000, '2026-09-30': closing },
    policy: { checks: returnPolicy.parse({ checks: { extremeReturnPercent } }).checks },
  });

it('fires beyond the threshold on either side', () => {
  expect(extremeReturnCheck.check(earning(1_250_100))).toEqual({ periodReturnPct: '25.01', thresholdPercent: 25 });
  expect(extremeReturnCheck.check(earning(749_900))).toEqual({ periodReturnPct: '-25.01', thresholdPercent: 25 });
  expect(extremeReturnCheck.check(earning(1_110_000, 10))).toEqual({ periodReturnPct: '11.00', thresholdPercent: 10 });
});

it('does not fire at the threshold, nor on a total loss, which has a check of its own', () => {
  expect(extremeReturnCheck.check(earning(1_250_000))).toBeNull();
  expect(extremeReturnCheck.check(earning(0))).toBeNull();
});
