import type { AccountCheck } from './check.js';

/** No money was at work for any time, as in an account that is empty or was opened on the last day. */
export const noCapitalCheck: AccountCheck = {
  code: 'no-capital',
  severity: 'notice',
  thresholds: [],
  check: ({ result: { status, reason } }) => (status === 'no-capital' ? { reason } : null),
};
