import { type Evaluation, evaluate, rootBounds, type Terms } from './evaluate.js';

/** Is told every iterate, the last one too. */
export type Observer = (v: number) => void;

export interface NewtonResult {
  readonly hasConverged: boolean;
  /** ln of the growth factor of half a day. */
  readonly v: number;
  /** Newton steps taken, counting safeguarded ones. */
  readonly iterations: number;
}

const MOST_ITERATIONS = 200;
/** From here on the bracket is halved, which ends within the rest. */
const PATIENCE = 60;

/**
 * Newton's method on the equation of value in v = ln z, kept within a bracket where the signs at both ends differ.
 *
 * Units: v per half day. Domain: at least two terms with at least one change of sign.
 * Returns: an iterate whose last step was below a relative 1e-13, or whose residual is rounding noise; `hasConverged` is false when
 * neither came about, which can only be without a bracket (an even number of sign changes).
 * Throws: never.
 * Not guaranteed: with several roots, which one is found.
 * Complexity: linear in the terms per iteration; three or four iterations for an ordinary account, never more than 200.
 * Source: textbook Newton with bisection; a step of more than half an e-fold over the span, and one out of the bracket, is taken on the
 * logarithm of the ratio of money in to money out instead, which is close to a straight line for one change of sign (ours).
 */
export function newton(terms: Terms, spanHalfDays: number, start: number, observe?: Observer): NewtonResult {
  const { amounts } = terms;
  const topSign = Math.sign(amounts[0]!);
  const hasBracket = topSign !== Math.sign(amounts[amounts.length - 1]!);
  let { low, high } = rootBounds(terms);
  const noise = 2e-16 * (amounts.length + 4);
  let v = start > low && start < high ? start : (low + high) / 2;
  for (let iterations = 0; iterations < MOST_ITERATIONS; iterations += 1) {
    const at = evaluate(terms, v);
    observe?.(v);
    if (Math.abs(at.value) <= noise * at.size) return { hasConverged: true, v, iterations };
    if (hasBracket) {
      if (at.value * topSign > 0) high = v;
      else low = v;
    }
    let step = -at.value / at.slope;
    if (!(Math.abs(step) * spanHalfDays <= 0.5)) step = ratioStep(at);
    let next = v + step;
    if (!(next > low && next < high) || iterations >= PATIENCE) {
      if (!hasBracket) return { hasConverged: false, v, iterations };
      next = (low + high) / 2;
    }
    const moved = Math.abs(next - v);
    v = next;
    if (moved <= 1e-13 * Math.max(Math.abs(v), 1 / spanHalfDays)) {
      observe?.(v);
      return { hasConverged: true, v, iterations: iterations + 1 };
    }
  }
  return { hasConverged: false, v, iterations: MOST_ITERATIONS };
}

/** Newton's step on ln(money in / money out). */
function ratioStep(at: Evaluation): number {
  const plus = (at.size + at.value) / 2;
  const minus = (at.size - at.value) / 2;
  const slope = (at.sizeSlope + at.slope) / (2 * plus) - (at.sizeSlope - at.slope) / (2 * minus);
  return -Math.log(plus / minus) / slope;
}
