import { returnPolicy } from '@quarterpoise/dto';
import { expect, it } from 'vitest';
import { largeFlowOnLastDaysCheck } from './large-flow-on-last-days.check.js';
import { accountCheckInput } from './testing/account-check-input.js';

const withFlow = (on: string, cents: number, checks = {}) =>
  accountCheckInput({
    balances: { '2026-06-30': 1_000_000, '2026-09-30': 1_000_000 },
    activity: [[on, 'withdrawal', cents]],
    policy: { checks: returnPolicy.parse({ checks }).checks },
  });

it('fires on a large flow of the last three days', () => {
  expect(largeFlowOnLastDaysCheck.check(withFlow('2026-09-28', 300_000))).toEqual({
    flowCents: -300_000,
    flowOn: '2026-09-28',
    sharePct: '30.0',
  });
});

it('does not fire on an earlier or a smaller one', () => {
  expect(largeFlowOnLastDaysCheck.check(withFlow('2026-09-27', 300_000))).toBeNull();
  expect(largeFlowOnLastDaysCheck.check(withFlow('2026-09-28', 250_000))).toBeNull();
  expect(largeFlowOnLastDaysCheck.check(accountCheckInput())).toBeNull();
});

it('takes days and share from the policy', () => {
  expect(largeFlowOnLastDaysCheck.check(withFlow('2026-09-27', 300_000, { lastDays: 4 }))).not.toBeNull();
  expect(largeFlowOnLastDaysCheck.check(withFlow('2026-09-28', 250_000, { lastDaysFlowPercent: 20 }))).not.toBeNull();
});
