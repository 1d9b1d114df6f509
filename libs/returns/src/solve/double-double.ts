/**
 * Arithmetic on unevaluated sums of two doubles: about 106 bits, relative error of a few 2^-104 an operation, no allocation that
 * outlives an expression. Source: T. J. Dekker, "A floating-point technique for extending the available precision", Numerische
 * Mathematik 18 (1971); D. E. Knuth, TAOCP vol. 2, 4.2.2 (two-sum). Written from memory of these.
 */
export interface DoubleDouble {
  readonly hi: number;
  readonly lo: number;
}

/** 2^27 + 1: splits a double into two halves of 26 bits. Overflows beyond 2^996, which no caller reaches. */
const SPLITTER = 134217729;

export const dd = (value: number): DoubleDouble => ({ hi: value, lo: 0 });

/** Sum of two doubles, exact. */
export function twoSum(a: number, b: number): DoubleDouble {
  const hi = a + b;
  const shadow = hi - a;
  return { hi, lo: a - (hi - shadow) + (b - shadow) };
}

const quickSum = (a: number, b: number): DoubleDouble => {
  const hi = a + b;
  return { hi, lo: b - (hi - a) };
};

/** Product of two doubles, exact unless its low part underflows. */
export function twoProduct(a: number, b: number): DoubleDouble {
  const hi = a * b;
  const aScaled = SPLITTER * a;
  const aHigh = aScaled - (aScaled - a);
  const aLow = a - aHigh;
  const bScaled = SPLITTER * b;
  const bHigh = bScaled - (bScaled - b);
  const bLow = b - bHigh;
  return { hi, lo: aHigh * bHigh - hi + aHigh * bLow + aLow * bHigh + aLow * bLow };
}

export function add(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
  const high = twoSum(a.hi, b.hi);
  const low = twoSum(a.lo, b.lo);
  const first = quickSum(high.hi, high.lo + low.hi);
  return quickSum(first.hi, first.lo + low.lo);
}

export const negate = (a: DoubleDouble): DoubleDouble => ({ hi: -a.hi, lo: -a.lo });

export function multiply(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
  const product = twoProduct(a.hi, b.hi);
  return quickSum(product.hi, product.lo + (a.hi * b.lo + a.lo * b.hi));
}

export function divide(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
  const first = a.hi / b.hi;
  const rest = add(a, negate(multiply(b, dd(first))));
  const second = rest.hi / b.hi;
  const last = add(rest, negate(multiply(b, dd(second))));
  const sum = quickSum(first, second);
  return add(sum, dd(last.hi / b.hi));
}

/** a to a whole power ≥ 0 by repeated squaring. */
export function power(a: DoubleDouble, exponent: number): DoubleDouble {
  let result: DoubleDouble | null = null;
  let square = a;
  for (let rest = exponent; ;) {
    if (rest % 2 === 1) result = result === null ? square : multiply(result, square);
    rest = Math.floor(rest / 2);
    if (rest === 0) return result ?? dd(1);
    square = multiply(square, square);
  }
}

/** The positive `degree`-th root of a > 0: two Newton steps from the double's root double the digits twice. */
export function root(a: DoubleDouble, degree: number): DoubleDouble {
  let value = dd(Math.pow(a.hi, 1 / degree));
  for (let step = 0; step < 2; step += 1) {
    const below = power(value, degree - 1);
    const excess = add(multiply(below, value), negate(a));
    value = add(value, negate(divide(excess, multiply(below, dd(degree)))));
  }
  return value;
}
