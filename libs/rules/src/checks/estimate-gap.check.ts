import { type AccountCheck, basisPoints } from './check.js';

/**
 * First estimate and solved rate lie far apart, though within what theory allows: the figure hangs on the method and its dates.
 * Thresholds: common practice, no source.
 */
export const estimateGapCheck: AccountCheck = {
  code: 'estimate-gap',
  severity: 'review',
  thresholds: ['estimateGapBasisPoints'],
  check: ({ result: { status, periodReturn, firstEstimate }, policy }) => {
    if (status !== 'solved' || periodReturn === null || firstEstimate === null) return null;
    const gapBasisPoints = Math.abs(basisPoints(periodReturn) - basisPoints(firstEstimate));
    const thresholdBasisPoints = policy.checks.estimateGapBasisPoints;
    return gapBasisPoints > thresholdBasisPoints
      ? { gapBasisPoints, thresholdBasisPoints, periodReturnPct: periodReturn, firstEstimatePct: firstEstimate }
      : null;
  },
};
