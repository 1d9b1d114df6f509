import type { CheckThresholds } from '@quarterpoise/dto';
import type { CheckedFlag } from './check.js';

/** Returns of the quarter over all accounts of a run, in hundredths of a percent; NaN where an account has none. */
export interface PlanReturns {
  readonly basisPoints: Float64Array;
}

export interface OutlierFlag extends CheckedFlag {
  /** Place of the account in the column. */
  readonly index: number;
}

/** With fewer returns than this, the middle of them says little. */
const FEWEST_RETURNS = 10;
/** Where nearly everyone has the same return, a small difference has a large score; below this it is nobody's error. */
const SMALLEST_DISTANCE_BASIS_POINTS = 100;

/**
 * A return far from everyone else's in the plan. The modified z-score 0.6745 (x − median) / MAD of Iglewicz and Hoaglin, "How to
 * detect and handle outliers" (1993; from memory) is not drawn along by the outliers that it looks for; where more than half of the
 * returns are the same and MAD is 0, their mean absolute deviation takes its place: (x − median) / (1.2533 MeanAD).
 */
export const outlierCheck = {
  code: 'outlier',
  severity: 'review',
  thresholds: ['outlierScore'],
  check({ basisPoints }: PlanReturns, { outlierScore }: Pick<CheckThresholds, 'outlierScore'>): OutlierFlag[] {
    const returns = basisPoints.filter((value) => !Number.isNaN(value));
    if (returns.length < FEWEST_RETURNS) return [];
    const median = medianOf(returns);
    const distances = returns.map((value) => Math.abs(value - median));
    const mad = medianOf(distances);
    const unit = mad > 0 ? mad / 0.6745 : 1.2533 * (distances.reduce((sum, value) => sum + value, 0) / returns.length);
    const flags: OutlierFlag[] = [];
    basisPoints.forEach((value, index) => {
      const distance = Math.abs(value - median);
      if (!(distance >= SMALLEST_DISTANCE_BASIS_POINTS) || distance / unit <= outlierScore) return;
      const figures = {
        periodReturnPct: (value / 100).toFixed(2),
        medianPct: (median / 100).toFixed(2),
        score: Number(((value - median) / unit).toFixed(1)),
      };
      flags.push({ code: 'outlier', severity: 'review', figures, index });
    });
    return flags;
  },
} as const;

function medianOf(values: Float64Array): number {
  const sorted = values.toSorted();
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle]! : (sorted[middle - 1]! + sorted[middle]!) / 2;
}
