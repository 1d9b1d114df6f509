/** Why a window has no single rate; stable codes, translated where they are shown. */
export const OUTCOME_REASONS = [
  /** Several growth factors satisfy the equation. */
  'several-rates',
  /** Money went in, none came out, none is left: −100.00 %. */
  'nothing-left',
  /** No balance and no flow. */
  'no-money',
  /** There is money, but none of it was in the account for any time. */
  'no-time',
  /** All that remains in the equation has one sign, so that nothing can balance it. */
  'one-sided',
  /** Both signs occur, and yet no growth factor balances the equation. */
  'no-rate-fits',
] as const;
export type OutcomeReason = (typeof OUTCOME_REASONS)[number];

/** Two decimals, half away from zero, `2.41`, `-0.03`, `0.00`. */
export type Percentage = string;

interface Common {
  /** Modified Dietz over the effective span; null when its denominator is 0. */
  readonly firstEstimatePct: Percentage | null;
  /** Effective span in days; half days occur with timing `mid`. */
  readonly spanDays: number;
}

export interface Solved extends Common {
  readonly status: 'solved';
  readonly reason: null;
  readonly periodReturnPct: Percentage;
  /** Null when the span is not long enough to be annualised or the window is one of at most a year. */
  readonly annualReturnPct: Percentage | null;
  /** The growth factor over the effective span, one decimal string of at least 15 significant digits. */
  readonly roots: readonly [string];
  readonly iterations: number;
}

export interface Ambiguous extends Common {
  readonly status: 'ambiguous';
  readonly reason: 'several-rates';
  /** Every growth factor that satisfies the equation, ascending. */
  readonly roots: readonly string[];
  readonly iterations: number;
}

export interface TotalLoss extends Common {
  readonly status: 'total-loss';
  readonly reason: 'nothing-left';
  readonly periodReturnPct: '-100.00';
  readonly annualReturnPct: '-100.00' | null;
}

export interface NoSolution extends Common {
  readonly status: 'no-solution';
  readonly reason: 'one-sided' | 'no-rate-fits';
}

export interface NoCapital extends Common {
  readonly status: 'no-capital';
  readonly reason: 'no-money' | 'no-time';
}

/** What a window's question came to; every case is an answer, none is an exception. */
export type Outcome = Solved | Ambiguous | TotalLoss | NoSolution | NoCapital;
export type OutcomeStatus = Outcome['status'];

/** The solve command's fields, each always present. */
export interface Answer {
  status: OutcomeStatus;
  periodReturnPct: string | null;
  annualReturnPct: string | null;
  firstEstimatePct: string | null;
  factorLow: string | null;
  factorHigh: string | null;
  roots: string[];
  spanDays: number | null;
  iterations: number | null;
  reason: string | null;
}

/**
 * An outcome as the flat record that the solve command prints and results keep.
 *
 * Units: percentages with two decimals; roots are growth factors over the effective span; `spanDays` in days.
 * Returns: every field; `roots` is empty and the others null where they have no meaning. `factorLow` and `factorHigh` are null
 * for every outcome of this engine version: it computes roots to the digits printed but does not carry a proof of the interval.
 * Throws: never. Complexity: constant.
 * Example: `toAnswer(solveWindow(window)).periodReturnPct`.
 */
export function toAnswer(outcome: Outcome): Answer {
  const isSolved = outcome.status === 'solved';
  const hasRate = isSolved || outcome.status === 'total-loss';
  return {
    status: outcome.status,
    periodReturnPct: hasRate ? outcome.periodReturnPct : null,
    annualReturnPct: hasRate ? outcome.annualReturnPct : null,
    firstEstimatePct: outcome.firstEstimatePct,
    factorLow: null,
    factorHigh: null,
    roots: isSolved || outcome.status === 'ambiguous' ? [...outcome.roots] : [],
    spanDays: outcome.spanDays,
    iterations: isSolved || outcome.status === 'ambiguous' ? outcome.iterations : null,
    reason: outcome.reason,
  };
}
