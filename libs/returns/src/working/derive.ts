import { Decimal } from 'decimal.js';
import { dietz } from '../estimate/first-estimate.js';
import { signChanges } from '../solve/evaluate.js';
import { exactPercentOf, type RefinableRoot } from '../solve/figures.js';
import { newton } from '../solve/newton.js';
import type { Answer } from '../solve/outcome.js';
import { annualGrowth, annualRuleOf, findRoots, startOf } from '../solve/solve-window.js';
import type { WindowCode } from '../treatments/return-policy.js';
import { isoDate } from '../window/civil-date.js';
import { type Equation, equationOf, flowExponent, sliceOf } from '../window/equation.js';
import { readWindow, type WindowInput } from '../window/window.js';
import type { ResultData, ResultWindow } from '../windows/account.js';
import { windowOf } from '../windows/window-of.js';

/** One iterate of Newton's method: the growth factor over the span, and by how many cents the equation misses the closing balance. */
export interface WorkingStep {
  step: number;
  factor: string;
  residualCents: string;
}

/** How a window's figure came about, in codes and figures. */
export interface Derivation {
  flows: { date: string; cents: number; daysAtWork: number; weight: string; weightedCents: string }[];
  gainCents: number;
  averageCapitalCents: string | null;
  firstEstimatePct: string | null;
  steps: WorkingStep[];
  /** Null: this engine version proves no interval. */
  interval: { low: string; high: string } | null;
  rounding: { exactPct: string; printedPct: string } | null;
}

export interface Working extends Derivation {
  window: ResultWindow;
}

const PERCENT_DECIMALS = 10;

/**
 * Derives a window's answer step by step, so that it can be followed by hand.
 *
 * Units: whole cents and, where weighted, hundredths of a cent as decimal strings; weights are shares of the effective span with six
 * decimals; factors are over the effective span.
 * Domain: a window and the answer that {@link solveWindow} gave for it.
 * Returns: the flows by date with their days at work and weights; gain and average capital; the first estimate; Newton's steps from it
 * to the root (none where the rate did not come from them); the percentage before rounding, cut off after ten decimals, and as printed:
 * the annual one where the window has one.
 * Throws: InvalidWindow.
 * Not guaranteed: that rounded weights times flows add up to the last digit shown.
 * Complexity: as solving, and once more in decimal.js.
 */
export function derive(input: WindowInput, answer: Answer): Derivation {
  const window = readWindow(input);
  const slice = sliceOf(window);
  const equation = equationOf(slice);
  const { gainCents, capitalCentHalfDays } = dietz(equation);
  const hasSpan = equation.halfDays > 0;
  const weigh = (centHalfDays: Decimal.Value): string => new Decimal(centHalfDays).div(equation.halfDays).toFixed(2);
  return {
    flows: Array.from({ length: slice.to }, (_, index) => {
      const cents = slice.cents[index]!;
      const halfDays = flowExponent(slice, index);
      return {
        date: isoDate(slice.days[index]!),
        cents,
        daysAtWork: halfDays / 2,
        weight: hasSpan ? new Decimal(halfDays).div(equation.halfDays).toFixed(6) : '0.000000',
        weightedCents: hasSpan ? weigh(new Decimal(cents).times(halfDays)) : '0.00',
      };
    }),
    gainCents,
    averageCapitalCents: hasSpan ? weigh(capitalCentHalfDays) : null,
    firstEstimatePct: answer.firstEstimatePct,
    steps: answer.status === 'solved' ? stepsOf(equation, Number(answer.roots[0])) : [],
    interval: null,
    rounding: roundingOf(window, equation, answer),
  };
}

/** The working of a stored window; null when it has no answer. */
export function workingOf(
  data: Pick<ResultData, 'flowTiming' | 'windows' | 'flows'>,
  code: WindowCode,
): Working | null {
  const input = windowOf(data, code);
  const window = data.windows.find((candidate) => candidate.code === code);
  if (input === null || window === undefined || window.answer === null) return null;
  return { window, ...derive(input, window.answer) };
}

function stepsOf(equation: Equation, factor: number): WorkingStep[] {
  const steps: WorkingStep[] = [];
  const found = newton(equation, equation.halfDays, startOf(equation), (v) => {
    steps.push({
      step: steps.length,
      factor: new Decimal(v).times(equation.halfDays).exp().toSignificantDigits(15).toString(),
      residualCents: residual(equation, v),
    });
  });
  // With several changes of sign Newton may have been left for the isolation of roots.
  const isTheRoot = Math.abs(found.v * equation.halfDays - Math.log(factor)) < 1e-6 || factor === 0;
  return found.hasConverged && isTheRoot ? steps : [];
}

/** What the equation's left side comes to at a rate, in cents: closing balance by the rate less the one that is. */
function residual({ exponents, amounts }: Equation, v: number): string {
  let sum = 0;
  for (let index = 0; index < amounts.length; index += 1) sum += amounts[index]! * Math.exp(v * exponents[index]!);
  if (!Number.isFinite(sum) || Math.abs(sum) >= 1e21)
    return new Decimal(Number.isFinite(sum) ? sum : Infinity).toString();
  const written = sum.toFixed(4);
  return Number(written) === 0 ? '0.0000' : written;
}

function roundingOf(window: WindowInput, equation: Equation, answer: Answer): Derivation['rounding'] {
  const printedPct = answer.annualReturnPct ?? answer.periodReturnPct;
  if (printedPct === null) return null;
  if (answer.status === 'total-loss') return { exactPct: '-100', printedPct };
  const [root] = findRoots(equation, signChanges(equation.amounts)).roots as [RefinableRoot];
  const annual = answer.annualReturnPct === null ? null : annualGrowth(equation, annualRuleOf(window));
  const growth = annual ?? { halfDays: equation.halfDays, degree: 1 };
  return { exactPct: exactPercentOf(root, growth, PERCENT_DECIMALS), printedPct };
}
