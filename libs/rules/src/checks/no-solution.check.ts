import type { AccountCheck } from './check.js';

/** No rate can explain the balances and flows; most often a flow has the wrong kind or sign. */
export const noSolutionCheck: AccountCheck = {
  code: 'no-solution',
  severity: 'review',
  thresholds: [],
  check: ({ result: { status, openingCents, closingCents } }) =>
    status === 'no-solution' ? { openingCents, closingCents } : null,
};
