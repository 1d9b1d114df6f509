import { parseAmount } from '@quarterpoise/dto';
import { workingOf } from '@quarterpoise/returns';
import type { AccountCheck } from './check.js';

/** On average less was in the account than the policy prints a return for. */
export const capitalTooSmallCheck: AccountCheck = {
  code: 'capital-too-small',
  severity: 'notice',
  thresholds: ['smallestAverageCapitalCents'],
  check: ({ result: { reason, data }, policy }) => {
    if (reason !== 'capital-too-small') return null;
    const average = workingOf(data, 'quarter')?.averageCapitalCents ?? null;
    // the working gives hundredths of a cent
    const hundredths = average === null ? null : parseAmount(average);
    return {
      averageCapitalCents: hundredths === null ? null : Math.round(hundredths / 100),
      smallestCents: policy.smallestAverageCapitalCents,
    };
  },
};
