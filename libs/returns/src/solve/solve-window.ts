import { dietz, firstEstimatePct } from '../estimate/first-estimate.js';
import { addYears } from '../window/civil-date.js';
import { type Equation, equationOf, sliceOf } from '../window/equation.js';
import { readWindow, type WindowInput } from '../window/window.js';
import { dd } from './double-double.js';
import { evaluate, signChanges } from './evaluate.js';
import { type Growth, percentOf, type RefinableRoot, writeFactor } from './figures.js';
import { exactTerms } from './fine-decimal.js';
import { isolateRoots } from './isolate.js';
import { newton } from './newton.js';
import type { Outcome } from './outcome.js';
import { polish } from './polish.js';

/** Half days of a year of 365 days, by which rates over longer spans are annualised. */
const HALF_DAYS_OF_YEAR = 730;

/**
 * Solves the equation of value of a window: the rate at which the opening balance and the flows grow into the closing balance.
 *
 * Units and conventions: cents, civil dates; balances hold at the end of their dates; the rate is over the effective span; percentages
 * have two decimals, half away from zero. The annual rate is Actual/365 for spans of more than 365 days; with `years` n ≥ 2 it is the
 * n-th root where the window is n whole years and the effective span all of it, and with 0 or 1 there is none.
 * Domain: any window that {@link readWindow} accepts, negative balances included.
 * Returns: one of `solved`, `ambiguous`, `total-loss`, `no-solution`, `no-capital`, each with its reason. Roots have at least 15
 * significant digits; rounded percentages are those of roots refined in double-double, and in decimal.js near ties.
 * Throws: InvalidWindow, which names the field.
 * Not guaranteed: a proven interval around the root; roots closer to each other than a relative 1e-45 are told as one.
 * Complexity: linear in the flows, about four passes, when one change of sign or the running balance shows that the root is the
 * only one; else the isolation of every root.
 * Source: the textbook equation of value. Uniqueness: Descartes' rule for real exponents; C. S. Soper, "The marginal efficiency of
 * capital: a further note", Economic Journal 69 (1959), cited from abstracts.
 * Example: opening 1000.00, closing 1100.00, no flows, 2026-06-30 to 2026-09-30: status `solved`, `10.00`, root `1.1`.
 */
export function solveWindow(window: WindowInput): Outcome {
  const checked = readWindow(window);
  return solveEquation(equationOf(sliceOf(checked)), annualRuleOf(checked));
}

/** How a window asks to be annualised: never, by its whole years, or by Actual/365. */
export type AnnualRule =
  { readonly by: 'none' } | { readonly by: 'actual-365' } | { readonly by: 'years'; readonly years: number };

/** The rule that `years` stands for; whole years count only where the dates are that many years apart. */
export function annualRuleOf(window: Pick<WindowInput, 'openedOn' | 'closedOn' | 'years'>): AnnualRule {
  const years = window.years ?? null;
  if (years === null) return { by: 'actual-365' };
  if (years < 2) return { by: 'none' };
  const isAnniversary =
    addYears(window.openedOn, years) === window.closedOn || addYears(window.closedOn, -years) === window.openedOn;
  return isAnniversary ? { by: 'years', years } : { by: 'actual-365' };
}

/** Solves a window that is already put as its equation; the way of {@link solveWindow} without reading dates. */
export function solveEquation(equation: Equation, rule: AnnualRule): Outcome {
  const { amounts, exponents, halfDays } = equation;
  const common = { firstEstimatePct: firstEstimatePct(equation), spanDays: halfDays / 2 };
  const annual = annualGrowth(equation, rule);
  const last = amounts.length - 1;

  // Time to be lost runs to the window's close: with money only in and nothing left, that is where the effective span ends.
  if (equation.isOnlyIn && equation.closingCents === 0 && last >= 0 && exponents[last]! > 0) {
    return {
      status: 'total-loss',
      reason: 'nothing-left',
      periodReturnPct: '-100.00',
      annualReturnPct: annual === null ? null : '-100.00',
      ...common,
    };
  }
  if (equation.isEmpty) return { status: 'no-capital', reason: 'no-money', ...common };
  if (last < 0 || exponents[0] === 0) return { status: 'no-capital', reason: 'no-time', ...common };
  const changes = signChanges(amounts);
  if (changes === 0) return { status: 'no-solution', reason: 'one-sided', ...common };

  const { roots, iterations } = findRoots(equation, changes);
  const [first] = roots;
  if (first === undefined) return { status: 'no-solution', reason: 'no-rate-fits', ...common };
  const written = roots.map((root) => writeFactor(root, halfDays));
  if (roots.length > 1) return { status: 'ambiguous', reason: 'several-rates', roots: written, iterations, ...common };
  return {
    status: 'solved',
    reason: null,
    periodReturnPct: percentOf(first, { halfDays, degree: 1 }),
    annualReturnPct: annual === null ? null : percentOf(first, annual),
    roots: [written[0]!],
    iterations,
    ...common,
  };
}

/** Over what the annual rate is taken, or null where there is none. */
export function annualGrowth(equation: Equation, rule: AnnualRule): Growth | null {
  // Never annualise what is not longer than a year.
  if (rule.by === 'none' || equation.halfDays <= HALF_DAYS_OF_YEAR) return null;
  if (rule.by === 'years' && equation.isWholeWindow) return { halfDays: equation.halfDays, degree: rule.years };
  return { halfDays: HALF_DAYS_OF_YEAR, degree: 1 };
}

/** Where Newton starts, ln z: from the first estimate, or from no growth where that has no logarithm. */
export function startOf(equation: Equation): number {
  const { gainCents, capitalCentHalfDays } = dietz(equation);
  const factor = 1 + (gainCents * equation.halfDays) / capitalCentHalfDays;
  return factor > 0 && factor < Infinity ? Math.log(factor) / equation.halfDays : 0;
}

/** Every root, ascending: one where its being the only one can be shown at once, else by isolation. */
export function findRoots(equation: Equation, changes: number): { roots: RefinableRoot[]; iterations: number } {
  const { halfDays } = equation;
  const found = newton(equation, halfDays, startOf(equation));
  if (changes === 1 || (found.hasConverged && keepsItsSign(equation, found.v))) {
    const root = polish(equation, halfDays, dd(Math.exp(found.v)));
    return { roots: [{ ...root, exact: () => exactTerms(equation, []) }], iterations: found.iterations };
  }
  const roots = isolateRoots(equation).map(({ z, on }): RefinableRoot => ({
    ...polish(on, halfDays, z),
    exact: () => exactTerms(equation, on.pivots),
  }));
  return { roots, iterations: found.iterations };
}

/** Room for rounding when a running balance is said not to be 0. */
const CLEARLY = 1e-9;

/** Soper's criterion: at the root, the balance rolled forward never changes its sign or vanishes before the end. */
function keepsItsSign(equation: Equation, v: number): boolean {
  const { amounts, exponents } = equation;
  const count = amounts.length;
  // From the end at which powers stay small; from the far end the running sum is the balance with its sign turned.
  const isForward = v <= 0;
  const step = isForward ? 1 : -1;
  let index = isForward ? 0 : count - 1;
  let balance = amounts[index]!;
  let size = Math.abs(balance);
  const sign = Math.sign(balance);
  for (let done = 1; done < count - 1; done += 1) {
    const factor = Math.exp(-Math.abs(v) * Math.abs(exponents[index]! - exponents[index + step]!));
    index += step;
    balance = balance * factor + amounts[index]!;
    size = size * factor + Math.abs(amounts[index]!);
    if (!(balance * sign > CLEARLY * size)) return false;
  }
  const { value, size: whole } = evaluate(equation, v);
  return Math.abs(value) <= CLEARLY * whole;
}
