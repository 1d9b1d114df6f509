import { add, dd, divide, type DoubleDouble, multiply, power } from './double-double.js';

/** The terms of a sum Σ amounts[j] · z^exponents[j], exponents strictly descending. `lows` carries the amounts' low parts. */
export interface Terms {
  readonly exponents: Float64Array;
  readonly amounts: Float64Array;
  readonly lows?: Float64Array;
}

/**
 * A sum's value, its derivative by ln z, and both with every amount made positive. All four are divided by the same power of z, so
 * that only signs and ratios mean anything; in return nothing overflows, whatever the rate.
 */
export interface Evaluation {
  readonly value: number;
  readonly slope: number;
  readonly size: number;
  readonly sizeSlope: number;
}

/** Evaluates at v = ln z by Horner's rule over the gaps between exponents, from the end at which powers cannot overflow. */
export function evaluate(terms: Terms, v: number): Evaluation {
  const { exponents, amounts } = terms;
  const count = amounts.length;
  const isForward = v <= 0;
  let index = isForward ? 0 : count - 1;
  const step = isForward ? 1 : -1;
  const rate = isForward ? v : -v;
  let exponent = exponents[index]!;
  let value = amounts[index]!;
  let slope = value * exponent;
  let size = Math.abs(value);
  let sizeSlope = size * exponent;
  let gap = -1;
  let factor = 1;
  for (let done = 1; done < count; done += 1) {
    index += step;
    const next = exponents[index]!;
    const nextGap = Math.abs(exponent - next);
    // Payroll comes at even intervals: most gaps equal the one before.
    if (nextGap !== gap) {
      gap = nextGap;
      factor = Math.exp(rate * gap);
    }
    exponent = next;
    const amount = amounts[index]!;
    const magnitude = Math.abs(amount);
    value = value * factor + amount;
    slope = slope * factor + amount * exponent;
    size = size * factor + magnitude;
    sizeSlope = sizeSlope * factor + magnitude * exponent;
  }
  return { value, slope, size, sizeSlope };
}

export interface FineEvaluation {
  readonly value: DoubleDouble;
  readonly slope: DoubleDouble;
  readonly size: number;
}

/** The same at z itself and in double-double: relative error of the value against `size` below 1e-26 for spans of a century. */
export function evaluateFinely(terms: Terms, z: DoubleDouble): FineEvaluation {
  const { exponents, amounts, lows } = terms;
  const count = amounts.length;
  const isForward = z.hi <= 1;
  const base = isForward ? z : divide(dd(1), z);
  const step = isForward ? 1 : -1;
  let index = isForward ? 0 : count - 1;
  let exponent = exponents[index]!;
  let value: DoubleDouble = { hi: amounts[index]!, lo: lows?.[index] ?? 0 };
  let slope = multiply(value, dd(exponent));
  let size = Math.abs(value.hi);
  let gap = -1;
  let factor = dd(1);
  for (let done = 1; done < count; done += 1) {
    index += step;
    const next = exponents[index]!;
    const nextGap = Math.abs(exponent - next);
    if (nextGap !== gap) {
      gap = nextGap;
      factor = power(base, gap);
    }
    exponent = next;
    const amount: DoubleDouble = { hi: amounts[index]!, lo: lows?.[index] ?? 0 };
    value = add(multiply(value, factor), amount);
    slope = add(multiply(slope, factor), multiply(amount, dd(exponent)));
    size = size * factor.hi + Math.abs(amount.hi);
  }
  return { value, slope, size };
}

/** How often the sign changes along the amounts; by Descartes' rule no fewer than the positive roots, and of the same parity. */
export function signChanges(amounts: Float64Array): number {
  let changes = 0;
  for (let index = 1; index < amounts.length; index += 1) {
    if (amounts[index]! < 0 !== amounts[index - 1]! < 0) changes += 1;
  }
  return changes;
}

/** Logarithms of z between which every positive root lies (Cauchy's bound from both ends). */
export function rootBounds(terms: Terms): { low: number; high: number } {
  const { amounts } = terms;
  const count = amounts.length;
  let largest = 0;
  for (let index = 0; index < count; index += 1) largest = Math.max(largest, Math.abs(amounts[index]!));
  // |z| ≤ 1 + max |a_j / a_0|, since exponents differ by at least 1; the same for 1/z from the other end.
  return {
    low: -Math.log1p(largest / Math.abs(amounts[count - 1]!)) - 1e-9,
    high: Math.log1p(largest / Math.abs(amounts[0]!)) + 1e-9,
  };
}
