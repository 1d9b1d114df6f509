import type { AccountCheck } from './check.js';

/** An account below zero at either end of the quarter. The closing balance is told first: the opening one was there last quarter. */
export const negativeBalanceCheck: AccountCheck = {
  code: 'negative-balance',
  severity: 'review',
  thresholds: [],
  check: ({ result: { openingCents, closingCents }, opensOn, closesOn }) => {
    if (closingCents !== null && closingCents < 0) return { balanceCents: closingCents, asOf: closesOn };
    if (openingCents !== null && openingCents < 0) return { balanceCents: openingCents, asOf: opensOn };
    return null;
  },
};
