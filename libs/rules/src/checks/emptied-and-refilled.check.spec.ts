import { expect, it } from 'vitest';
import { emptiedAndRefilledCheck } from './emptied-and-refilled.check.js';
import { accountCheckInput } from './testing/account-check-input.js';

it('fires in the quarter in which money came back', () => {
  const rejoined = accountCheckInput({
    balances: { '2025-12-31': 700_000, '2026-06-30': 0, '2026-09-30': 50_400 },
    activity: [
      ['2026-03-10', 'distribution', 705_000],
      ['2026-07-20', 'employee_contribution', 50_000],
    ],
  });
  expect(emptiedAndRefilledCheck.check(rejoined)).toEqual({ rejoinedOn: '2026-07-20' });
});

it('does not fire in a later quarter, nor on a first joining', () => {
  const earlier = accountCheckInput({
    balances: { '2025-12-31': 700_000, '2026-03-31': 0, '2026-06-30': 50_400, '2026-09-30': 51_000 },
    activity: [
      ['2026-03-10', 'distribution', 705_000],
      ['2026-04-20', 'employee_contribution', 50_000],
    ],
  });
  expect(earlier.result.rejoinedOn).toBe('2026-04-20');
  expect(emptiedAndRefilledCheck.check(earlier)).toBeNull();
  const joined = accountCheckInput({
    balances: { '2026-09-30': 50_400 },
    activity: [['2026-07-20', 'employee_contribution', 50_000]],
  });
  expect(emptiedAndRefilledCheck.check(joined)).toBeNull();
});
