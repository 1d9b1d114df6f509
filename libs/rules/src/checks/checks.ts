import { ambiguousCheck } from './ambiguous.check.js';
import { capitalTooSmallCheck } from './capital-too-small.check.js';
import { type AccountCheck, type AccountCheckInput, type CheckedFlag, SEVERITIES, type Severity } from './check.js';
import { emptiedAndRefilledCheck } from './emptied-and-refilled.check.js';
import { estimateGapCheck } from './estimate-gap.check.js';
import { extremeReturnCheck } from './extreme-return.check.js';
import { largeFlowOnLastDaysCheck } from './large-flow-on-last-days.check.js';
import { negativeBalanceCheck } from './negative-balance.check.js';
import { noCapitalCheck } from './no-capital.check.js';
import { noSolutionCheck } from './no-solution.check.js';
import { notComputedCheck } from './not-computed.check.js';
import { openingDiffersCheck } from './opening-differs.check.js';
import { outlierCheck } from './outlier.check.js';
import { totalLossCheck } from './total-loss.check.js';

/** Every check of a single account, worst first as people meet them. */
export const ACCOUNT_CHECKS: readonly AccountCheck[] = [
  notComputedCheck,
  ambiguousCheck,
  noSolutionCheck,
  totalLossCheck,
  openingDiffersCheck,
  negativeBalanceCheck,
  extremeReturnCheck,
  estimateGapCheck,
  largeFlowOnLastDaysCheck,
  noCapitalCheck,
  capitalTooSmallCheck,
  emptiedAndRefilledCheck,
];

/** Codes of all flags, worst first; the order within a severity is the order of the review queue. */
export const FLAG_CODES: readonly string[] = ACCOUNT_CHECKS.map(({ code }) => code).toSpliced(
  ACCOUNT_CHECKS.indexOf(extremeReturnCheck) + 1,
  0,
  outlierCheck.code,
);

/** The flags of one account, worst first. */
export function checkAccount(input: AccountCheckInput): CheckedFlag[] {
  const flags: CheckedFlag[] = [];
  for (const { code, severity, check } of ACCOUNT_CHECKS) {
    const figures = check(input);
    if (figures !== null) flags.push({ code, severity, figures });
  }
  return flags;
}

/** Worst first: by severity, then by code; equal ones stay in the order given. Codes that are not known come last of theirs. */
export function sortFlags<F extends { readonly code: string; readonly severity: Severity }>(flags: readonly F[]): F[] {
  const rank = ({ code }: F) => (FLAG_CODES.includes(code) ? FLAG_CODES.indexOf(code) : FLAG_CODES.length);
  return flags.toSorted((a, b) => SEVERITIES.indexOf(a.severity) - SEVERITIES.indexOf(b.severity) || rank(a) - rank(b));
}
