import type { AccountCheck } from './check.js';

/**
 * The account stood empty and money came back in this quarter: windows that span the gap take the time without money for time at
 * work. Told once, in the quarter of the return.
 */
export const emptiedAndRefilledCheck: AccountCheck = {
  code: 'emptied-and-refilled',
  severity: 'notice',
  thresholds: [],
  check: ({ result: { rejoinedOn }, opensOn, closesOn }) =>
    rejoinedOn !== null && rejoinedOn > opensOn && rejoinedOn <= closesOn ? { rejoinedOn } : null,
};
