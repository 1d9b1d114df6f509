/** The kinds of activity; the index of a kind is its code in histories. */
export const ACTIVITY_KINDS = [
  'employee_contribution',
  'employer_contribution',
  'rollover_in',
  'rollover_out',
  'transfer_in',
  'transfer_out',
  'withdrawal',
  'distribution',
  'loan_issued',
  'loan_repaid',
  'loan_interest',
  'loan_defaulted',
  'fee',
  'forfeiture',
  'earnings',
  'exchange_in',
  'exchange_out',
  'adjustment',
] as const;
export type ActivityKind = (typeof ACTIVITY_KINDS)[number];
