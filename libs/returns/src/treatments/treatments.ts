import type { Movements } from '../windows/account.js';
import { ACTIVITY_KINDS, type ActivityKind } from './activity-kinds.js';
import type { ReturnPolicy } from './return-policy.js';

/** The line of the statement's movements that a kind is shown in; the gain is never listed, it is what is left over. */
export type MovementLine = Exclude<keyof Movements, 'gain'>;

/** What one kind of activity means under one policy. */
export interface Treatment {
  /** +1 when a positive amount raises the balance, −1 when it lowers it. */
  readonly direction: 1 | -1;
  /** Money that crosses the boundary of the account, and so belongs to the equation of value. */
  readonly isFlow: boolean;
  /** Its line among the movements; null for what is part of the gain or leaves the total as it is. */
  readonly line: MovementLine | null;
}

type Rule = (policy: ReturnPolicy) => Treatment;

const into = (line: MovementLine): Rule => always({ direction: 1, isFlow: true, line });
const outOf = (line: MovementLine): Rule => always({ direction: -1, isFlow: true, line });
const always =
  (treatment: Treatment): Rule =>
  () =>
    treatment;
/** Nothing at account level. */
const within = (direction: 1 | -1): Treatment => ({ direction, isFlow: false, line: null });

/** The one table of what each kind means. */
const RULES: Record<ActivityKind, Rule> = {
  employee_contribution: into('employee'),
  employer_contribution: into('employer'),
  rollover_in: into('rolloversIn'),
  rollover_out: outOf('withdrawals'),
  transfer_in: into('rolloversIn'),
  transfer_out: outOf('withdrawals'),
  withdrawal: outOf('withdrawals'),
  distribution: outOf('withdrawals'),
  // Inside, money moves between the funds and the note, both of which are in the balance.
  loan_issued: ({ loans }) => (loans === 'outside' ? { direction: -1, isFlow: true, line: 'loansIssued' } : within(-1)),
  loan_repaid: ({ loans }) =>
    loans === 'outside' ? { direction: 1, isFlow: true, line: 'loanRepayments' } : within(1),
  // Inside, what the borrower pays for the loan is what the note earns.
  loan_interest: ({ loans }) =>
    loans === 'outside' ? { direction: 1, isFlow: true, line: 'loanRepayments' } : within(1),
  // Outside, the note was never in the balance; inside, it leaves the balance as paid out, not as lost.
  loan_defaulted: ({ loans }) =>
    loans === 'outside' ? within(-1) : { direction: -1, isFlow: true, line: 'withdrawals' },
  fee: ({ fees }) => ({ direction: -1, isFlow: fees === 'gross', line: 'fees' }),
  forfeiture: ({ forfeitures }) => ({ direction: -1, isFlow: forfeitures === 'outflow', line: 'forfeitures' }),
  earnings: always(within(1)),
  exchange_in: always(within(1)),
  exchange_out: always(within(-1)),
  adjustment: ({ adjustments }) =>
    adjustments === 'flow' ? { direction: 1, isFlow: true, line: 'adjustments' } : within(1),
};

/**
 * What each kind of activity means under a policy, by kind code.
 *
 * Units: none. Domain: any policy.
 * Returns: one treatment per kind, in the order of the kinds.
 * Throws: never. Complexity: constant.
 * Source: common practice, no single source, for each choice.
 * Example: under the defaults a fee is no flow but a line of its own, and an issued loan is an outflow.
 */
export function treatmentsOf(policy: ReturnPolicy): readonly Treatment[] {
  return ACTIVITY_KINDS.map((kind) => RULES[kind](policy));
}
