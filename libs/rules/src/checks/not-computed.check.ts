import type { AccountCheck } from './check.js';

/** The data did not allow the question to be put; an average capital that is too small has a check of its own. */
export const notComputedCheck: AccountCheck = {
  code: 'not-computed',
  severity: 'blocking',
  thresholds: [],
  check: ({ result: { status, reason } }) =>
    status === 'not-computed' && reason !== 'capital-too-small' ? { reason } : null,
};
