import type { ReturnPolicy, WindowCode } from '../treatments/return-policy.js';
import type { Answer, OutcomeStatus } from '../solve/outcome.js';
import type { FlowTiming } from '../window/window.js';

/** Balances of one account in columns: the total per day and ledger version; the newest version of a day is in force. */
export interface BalanceColumns {
  /** Days since 1970-01-01, in any order. */
  readonly day: Int32Array;
  readonly cents: Float64Array;
  readonly ledgerVersion: Int32Array;
}

/** Everything that is known of one account, untreated, in columns of equal length. */
export interface AccountHistory {
  readonly activity: {
    /** Days since 1970-01-01. */
    readonly effectiveDay: Int32Array;
    readonly postedDay: Int32Array;
    /** Index into the kinds of activity. */
    readonly kind: Uint8Array;
    /** As the files give them: positive, the kind gives the direction; earnings and adjustments signed; reversals negated. */
    readonly cents: Float64Array;
    readonly ledgerVersion: Int32Array;
  };
  /** Balances without the loan note. */
  readonly balances: BalanceColumns;
  /** Outstanding loan notes. */
  readonly loanNotes: BalanceColumns;
}

/** A quarter end whose figures were published, and the ledger version that they were computed from. */
export interface PublishedClose {
  readonly day: number;
  readonly ledgerVersion: number;
}

export interface AccountContext {
  /** The quarter: the previous quarter end and this one. */
  readonly opensOn: string;
  readonly closesOn: string;
  readonly policy: ReturnPolicy;
  /** The first day that the plan's records cover; balances from its eve on are opening balances. */
  readonly recordsBeginOn: string;
  readonly publishedCloses: readonly PublishedClose[];
}

export const UNAVAILABLE_REASONS = [
  'joined-later',
  'records-begin-later',
  'opening-balance-missing',
  'closing-balance-missing',
  'capital-too-small',
] as const;
export type UnavailableReason = (typeof UNAVAILABLE_REASONS)[number] | Exclude<OutcomeStatus, 'solved' | 'total-loss'>;

/** One window of an account. An unavailable one keeps its answer where the question could be put. */
export interface ResultWindow {
  code: WindowCode;
  availability: 'computed' | 'unavailable';
  reason: string | null;
  openedOn: string;
  closedOn: string;
  openingCents: number | null;
  closingCents: number | null;
  /** The rule for the annual rate, as the solve command takes it. */
  years: number | null;
  answer: Answer | null;
}

/** How the quarter's opening balance became the closing one; signed as each moves the balance, and adding up to the cent. */
export interface Movements {
  employee: number;
  employer: number;
  rolloversIn: number;
  loanRepayments: number;
  withdrawals: number;
  loansIssued: number;
  forfeitures: number;
  fees: number;
  adjustments: number;
  /** What is left over. */
  gain: number;
}

/** What a run keeps of one account; from it every window can be solved again. */
export interface ResultData {
  flowTiming: FlowTiming;
  windows: ResultWindow[];
  movements: Movements | null;
  /** Treated flows of the longest window, one per date, oldest first. */
  flows: { dates: string[]; cents: number[] };
  /** Balances at quarter ends up to the closing one, oldest first. */
  values: { dates: string[]; cents: number[] };
}

/** Result of one account: the data to keep and the figures that lists sort by. */
export interface AccountResult {
  status: OutcomeStatus | 'not-computed';
  reason: string | null;
  openingCents: number | null;
  closingCents: number | null;
  gainCents: number | null;
  /** The quarter's return in percent with two decimals; null unless solved or total loss. */
  periodReturn: string | null;
  firstEstimate: string | null;
  /** First flow of the latest spell, when the account was emptied and refilled; else null. */
  rejoinedOn: string | null;
  data: ResultData;
}
