import { Decimal } from 'decimal.js';
import type { DoubleDouble } from './double-double.js';
import type { Terms } from './evaluate.js';

/** Digits at which a turning point that lies on the axis is told from one that only comes near. */
const DECIDING_DIGITS = 120;

/** A Decimal constructor of its own precision; nothing here touches the library's shared settings. */
export type DecimalAt = typeof Decimal;

export const decimalAt = (digits: number): DecimalAt =>
  Decimal.clone({
    precision: digits,
    rounding: Decimal.ROUND_HALF_UP,
    maxE: 9e15,
    minE: -9e15,
    toExpNeg: -7,
    toExpPos: 21,
  });

/** The sum of the two doubles, to the constructor's digits. */
export const toDecimal = (at: DecimalAt, value: DoubleDouble): Decimal =>
  binary(at, value.hi).plus(binary(at, value.lo));

/** A double's own value; the library's constructor would read the shortest decimal that names the double instead. */
function binary(at: DecimalAt, value: number): Decimal {
  if (value === 0) return new at(0);
  const exponent = Math.floor(Math.log2(Math.abs(value))) - 53;
  return at.pow(2, exponent).times(new at(BigInt(value * 2 ** -exponent).toString()));
}

/** Value and slope (by ln z) of the terms at z, both divided by the same power of z; `size` is the value with amounts made positive. */
function evaluateExactly(
  at: DecimalAt,
  { exponents, amounts }: ExactTerms,
  z: Decimal,
): { value: Decimal; slope: Decimal; size: Decimal } {
  let value = new at(amounts[0]!);
  let slope = value.times(exponents[0]!);
  let size = value.abs();
  let gap = -1;
  let factor = new at(1);
  for (let index = 1; index < amounts.length; index += 1) {
    const nextGap = exponents[index - 1]! - exponents[index]!;
    if (nextGap !== gap) {
      gap = nextGap;
      factor = at.pow(z, gap);
    }
    const amount = amounts[index]!;
    value = value.times(factor).plus(amount);
    slope = slope.times(factor).plus(amount.times(exponents[index]!));
    size = size.times(factor).plus(amount.abs());
  }
  return { value, slope, size };
}

/** The terms of a chain of derivatives without rounding. */
export interface ExactTerms {
  readonly exponents: Float64Array;
  readonly amounts: readonly Decimal[];
}

/** Amounts times the product of (exponent − pivot), exactly. */
export function exactTerms(terms: Terms, pivots: readonly number[]): ExactTerms {
  const at = decimalAt(DECIDING_DIGITS + 8 * pivots.length);
  const { exponents } = terms;
  return {
    exponents,
    amounts: Array.from(terms.amounts, (amount, index) =>
      pivots.reduce((product, pivot) => product.times(exponents[index]! - pivot), new at(amount)),
    ),
  };
}

/**
 * Refines a simple root to as many digits as the constructor carries, less those that the equation's conditioning costs.
 *
 * Domain: z from double-double, correct to at least ten digits. Returns: z. Throws: never.
 * Complexity: a few evaluations; each step doubles the digits.
 */
export function refineExactly(at: DecimalAt, terms: ExactTerms, z: DoubleDouble): Decimal {
  let value = toDecimal(at, z);
  for (let step = 0; step < 12; step += 1) {
    const here = evaluateExactly(at, terms, value);
    if (here.value.isZero() || here.slope.isZero()) break;
    const change = here.value.div(here.slope).times(value);
    value = value.minus(change);
    if (change.isZero() || change.e - value.e < -at.precision * 0.6) break;
  }
  return value;
}

/**
 * Sign of `terms` at a root of `slopes` (the next derivative in the chain), told at 120 digits.
 *
 * Returns: 0 when the value is below 1e-90 of the terms' size; then the two touch, which is a double root.
 * Not guaranteed: a proof that a value below that is 0; amounts in whole cents and spans of decades stay far above it.
 */
export function signAtTurningPoint(terms: ExactTerms, slopes: ExactTerms, z: DoubleDouble): -1 | 0 | 1 {
  const at = decimalAt(DECIDING_DIGITS);
  const { value, size } = evaluateExactly(at, terms, refineExactly(at, slopes, z));
  if (value.isZero() || value.abs().lt(size.times('1e-90'))) return 0;
  return value.isNegative() ? -1 : 1;
}
