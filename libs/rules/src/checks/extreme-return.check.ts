import type { AccountCheck } from './check.js';

/** A return beyond what a quarter ordinarily brings. Threshold: common practice, no source. */
export const extremeReturnCheck: AccountCheck = {
  code: 'extreme-return',
  severity: 'review',
  thresholds: ['extremeReturnPercent'],
  check: ({ result: { status, periodReturn }, policy }) => {
    if (status !== 'solved' || periodReturn === null) return null;
    const thresholdPercent = policy.checks.extremeReturnPercent;
    return Math.abs(Number(periodReturn)) > thresholdPercent
      ? { periodReturnPct: periodReturn, thresholdPercent }
      : null;
  },
};
