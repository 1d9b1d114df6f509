import { Decimal } from 'decimal.js';
import { add, dd, type DoubleDouble, multiply, power, root as nthRoot } from './double-double.js';
import { type DecimalAt, decimalAt, type ExactTerms, refineExactly, toDecimal } from './fine-decimal.js';
import type { Root } from './polish.js';

/** Growth over a time: z to a whole number of half days, or the n-th root of it. */
export interface Growth {
  readonly halfDays: number;
  readonly degree: number;
}

/** A root with the way to more of its digits. */
export interface RefinableRoot extends Root {
  readonly exact: () => ExactTerms;
}

/** Decimal.js calls rounding a half away from zero ROUND_HALF_UP. */
const ROUND_HALF_AWAY = Decimal.ROUND_HALF_UP;
/** Digits of a printed growth factor; the last of them may be off by one. */
const FACTOR_DIGITS = 20;
/** What double-double may be trusted with: far from the ends of the doubles' range. */
const LEAST_FINE = 1e-30;
const LARGEST_FINE = 1e6;
/** Distance from a tie, in hundredths of a percent, below which decimal.js decides. */
const TIE_MARGIN = 1e-7;

/** Hundredths of a percent, whole, as `2.41`. */
export function writePercent(hundredths: string | bigint): string {
  const text = String(hundredths);
  const isNegative = text.startsWith('-');
  const digits = (isNegative ? text.slice(1) : text).padStart(3, '0');
  const written = `${digits.slice(0, -2)}.${digits.slice(-2)}`;
  return isNegative && written !== '0.00' ? `-${written}` : written;
}

/**
 * The percentage (growth − 1) · 100 with two decimals, half away from zero.
 *
 * Units: z per half day. Domain: any positive root, beyond doubles too.
 * Returns: the correctly rounded percentage of the root as refined; within 1e-25 of a tie it counts as the tie.
 * Complexity: constant from double-double; within 1e-7 of a tie, for large rates and ill-conditioned roots, a refinement in decimal.js.
 */
export function percentOf(root: RefinableRoot, growth: Growth): string {
  const fine = grow(root.z, growth);
  if (fine.hi < LARGEST_FINE && (fine.hi > LEAST_FINE || fine.hi === 0) && root.error < 1e-18) {
    const hundredths = multiply(add(fine, dd(-1)), dd(10000));
    const whole = Math.round(hundredths.hi);
    const distance = Math.abs(hundredths.hi - whole);
    if (distance < 0.5 - TIE_MARGIN) return writePercent(BigInt(whole));
  }
  return writePercent(exactHundredths(root, growth).toFixed(0, ROUND_HALF_AWAY));
}

/** The same percentage before its rounding, cut off after `digits` decimals, for the working. */
export function exactPercentOf(root: RefinableRoot, growth: Growth, digits: number): string {
  return exactHundredths(root, growth).div(100).toDecimalPlaces(digits, Decimal.ROUND_DOWN).toFixed();
}

function exactHundredths(root: RefinableRoot, growth: Growth): Decimal {
  // As many digits as stand before the point, and 60 more.
  const size = Math.max(0, (Math.log10(root.z.hi) * growth.halfDays) / growth.degree);
  const at = decimalAt(Math.ceil(size) + 70);
  const z = refineExactly(at, root.exact(), root.z);
  // A tie comes out as 0.4999… or 0.5 by chance of the last digit; at 25 places it is the tie.
  return growExactly(at, z, growth).minus(1).times(10000).toDecimalPlaces(25);
}

function growExactly(at: DecimalAt, z: Decimal, growth: Growth): Decimal {
  const value = at.pow(z, growth.halfDays);
  return growth.degree === 1 ? value : at.pow(value, new at(1).div(growth.degree));
}

function grow(z: DoubleDouble, growth: Growth): DoubleDouble {
  if (growth.degree === 1) return power(z, growth.halfDays);
  if (growth.halfDays % growth.degree === 0) return power(z, growth.halfDays / growth.degree);
  return nthRoot(power(z, growth.halfDays), growth.degree);
}

/**
 * The growth factor over the span as a decimal string of up to 20 significant digits, with an exponent below 1e-7 and from 1e21.
 *
 * Units: a factor, 1 is no change. Domain: any positive root, beyond doubles too.
 * Returns: 20 digits of which at least 17 are right; trailing zeros are left out.
 * Complexity: constant, but for extremes and ill-conditioned roots, which decimal.js refines.
 */
export function writeFactor(root: RefinableRoot, halfDays: number): string {
  const fine = grow(root.z, { halfDays, degree: 1 });
  if (root.error < 1e-19 && fine.hi > 1e-6 && fine.hi < 1e15) return writeFine(fine);
  const at = decimalAt(60);
  const z = root.error < 1e-19 ? toDecimal(at, root.z) : refineExactly(at, root.exact(), root.z);
  return at.pow(z, halfDays).toSignificantDigits(FACTOR_DIGITS).toString();
}

/** 2^124: makes whole numbers of both halves of what is larger than 2^-20, but for digits beyond the 31st. */
const FINE_SCALE = 2 ** 124;
const FINE_BITS = 124n;

function writeFine(value: DoubleDouble): string {
  const decimals = Math.max(0, FACTOR_DIGITS - 1 - Math.floor(Math.log10(value.hi)));
  const scaled = BigInt(value.hi * FINE_SCALE) + BigInt(Math.round(value.lo * FINE_SCALE));
  const rounded = (scaled * 10n ** BigInt(decimals) + (1n << (FINE_BITS - 1n))) >> FINE_BITS;
  const digits = rounded.toString().padStart(decimals + 1, '0');
  const whole = digits.slice(0, digits.length - decimals);
  const fraction = digits.slice(digits.length - decimals).replace(/0+$/, '');
  return fraction === '' ? whole : `${whole}.${fraction}`;
}
