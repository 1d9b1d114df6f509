import { dayNumber, isoDate } from '@quarterpoise/returns';
import type { AccountCheck } from './check.js';

/**
 * Much moved in the quarter's last days: if the closing balance does not hold it yet, the whole of it looks like a gain or a loss.
 * The largest such flow is told. Thresholds: common practice, no source.
 */
export const largeFlowOnLastDaysCheck: AccountCheck = {
  code: 'large-flow-on-last-days',
  severity: 'review',
  thresholds: ['lastDays', 'lastDaysFlowPercent'],
  check: ({ result: { status, openingCents, closingCents, data }, closesOn, policy: { checks } }) => {
    if (status !== 'solved' || openingCents === null || closingCents === null) return null;
    const firstOn = isoDate(dayNumber(closesOn) - checks.lastDays + 1);
    const { dates, cents } = data.flows;
    let largest = -1;
    // oldest first, and none after the close
    for (let index = dates.length - 1; index >= 0 && dates[index]! >= firstOn; index -= 1) {
      if (largest < 0 || Math.abs(cents[index]!) > Math.abs(cents[largest]!)) largest = index;
    }
    if (largest < 0) return null;
    const flowCents = cents[largest]!;
    const size = Math.max(Math.abs(openingCents), Math.abs(closingCents));
    const percent = (Math.abs(flowCents) / size) * 100;
    return percent > checks.lastDaysFlowPercent
      ? { flowCents, flowOn: dates[largest]!, sharePct: percent.toFixed(1) }
      : null;
  },
};
