import { describe, expect, it } from 'vitest';
import { ACTIVITY_KINDS, type ActivityKind } from './activity-kinds.js';
import { DEFAULT_RETURN_POLICY, type ReturnPolicy } from './return-policy.js';
import { treatmentsOf } from './treatments.js';

const treated = (kind: ActivityKind, options: Partial<ReturnPolicy> = {}) => {
  const { direction, isFlow, line } = treatmentsOf({ ...DEFAULT_RETURN_POLICY, ...options })[
    ACTIVITY_KINDS.indexOf(kind)
  ]!;
  return `${direction > 0 ? '+' : '-'} ${isFlow ? 'flow' : 'none'} ${line ?? 'unlisted'}`;
};

// Common practice, no single source.
describe('what a kind of activity means', () => {
  it.each<[ActivityKind, string]>([
    ['employee_contribution', '+ flow employee'],
    ['employer_contribution', '+ flow employer'],
    ['rollover_in', '+ flow rolloversIn'],
    ['rollover_out', '- flow withdrawals'],
    ['transfer_in', '+ flow rolloversIn'],
    ['transfer_out', '- flow withdrawals'],
    ['withdrawal', '- flow withdrawals'],
    ['distribution', '- flow withdrawals'],
    ['loan_issued', '- flow loansIssued'],
    ['loan_repaid', '+ flow loanRepayments'],
    ['loan_interest', '+ flow loanRepayments'],
    ['loan_defaulted', '- none unlisted'],
    ['fee', '- none fees'],
    ['forfeiture', '- flow forfeitures'],
    ['earnings', '+ none unlisted'],
    ['exchange_in', '+ none unlisted'],
    ['exchange_out', '- none unlisted'],
    ['adjustment', '+ none unlisted'],
  ])('by default: %s is %s', (kind, expected) => {
    expect(treated(kind)).toBe(expected);
  });

  it.each<[Partial<ReturnPolicy>, ActivityKind, string]>([
    [{ fees: 'gross' }, 'fee', '- flow fees'],
    [{ loans: 'inside' }, 'loan_issued', '- none unlisted'],
    [{ loans: 'inside' }, 'loan_repaid', '+ none unlisted'],
    [{ loans: 'inside' }, 'loan_interest', '+ none unlisted'],
    [{ loans: 'inside' }, 'loan_defaulted', '- flow withdrawals'],
    [{ forfeitures: 'loss' }, 'forfeiture', '- none forfeitures'],
    [{ adjustments: 'flow' }, 'adjustment', '+ flow adjustments'],
  ])('under %j: %s is %s', (options, kind, expected) => {
    expect(treated(kind, options)).toBe(expected);
  });

  it('is said of every kind', () => {
    expect(treatmentsOf(DEFAULT_RETURN_POLICY).length).toBe(ACTIVITY_KINDS.length);
  });
});
