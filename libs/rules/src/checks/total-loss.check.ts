import type { AccountCheck } from './check.js';

/** Money went in, none came out and nothing is left: far more often a missing payout or balance than a loss. */
export const totalLossCheck: AccountCheck = {
  code: 'total-loss',
  severity: 'review',
  thresholds: [],
  check: ({ result: { status, openingCents, gainCents } }) =>
    status === 'total-loss' ? { openingCents, gainCents } : null,
};
