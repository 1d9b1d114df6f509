import { writePercent } from '../solve/figures.js';
import type { Equation } from '../window/equation.js';

/**
 * The first estimate in closed form: Modified Dietz over the effective span.
 *
 * Units: whole cents, half days. Domain: any equation.
 * Returns: gain and average capital · half days as sums over the equation's terms: at z = 1 the equation's value is −gain, and its
 * derivative by ln z is the time-weighted capital, so that gain over capital is exactly Newton's first step from a rate of 0.
 * Throws: never.
 * Complexity: linear in the terms.
 * Source: P. O. Dietz, "Pension Funds: Measuring Investment Performance" (1966); the modified form is the trade's (from memory).
 */
export function dietz(equation: Equation): { gainCents: number; capitalCentHalfDays: number } {
  let gain = 0;
  let capital = 0;
  for (let index = 0; index < equation.amounts.length; index += 1) {
    gain -= equation.amounts[index]!;
    capital += equation.amounts[index]! * equation.exponents[index]!;
  }
  return { gainCents: gain + 0, capitalCentHalfDays: capital };
}

/** Below this distance from a tie or from 0, doubles do not decide. */
const MARGIN = 1e-6;

/**
 * The first estimate as a percentage with two decimals, half away from zero.
 *
 * Domain: any equation. Returns: the correctly rounded percentage, or null when the average capital is 0 or there is no span.
 * Throws: never. Complexity: linear in the terms; whole numbers of any length where doubles cannot decide.
 * Example: 1000.00 opening, 1100.00 closing, no flow: `10.00`.
 */
export function firstEstimatePct(equation: Equation): string | null {
  if (equation.halfDays === 0 || equation.amounts.length === 0) return null;
  const { gainCents, capitalCentHalfDays } = dietz(equation);
  let size = 0;
  for (let index = 0; index < equation.amounts.length; index += 1) {
    size += Math.abs(equation.amounts[index]! * equation.exponents[index]!);
  }
  // Cents and half days are whole, so the sum is exact below 2^53.
  if (size < Number.MAX_SAFE_INTEGER) {
    if (capitalCentHalfDays === 0) return null;
    const hundredths = (gainCents * equation.halfDays * 10000) / capitalCentHalfDays;
    const whole = Math.round(hundredths);
    if (Math.abs(hundredths) < 1e9 && Math.abs(hundredths - whole) < 0.5 - MARGIN) return writePercent(BigInt(whole));
  }
  return exactEstimate(equation);
}

function exactEstimate(equation: Equation): string | null {
  let gain = 0n;
  let capital = 0n;
  for (let index = 0; index < equation.amounts.length; index += 1) {
    const amount = BigInt(equation.amounts[index]!);
    gain -= amount;
    capital += amount * BigInt(equation.exponents[index]!);
  }
  if (capital === 0n) return null;
  const numerator = gain * BigInt(equation.halfDays) * 10000n;
  const isNegative = numerator < 0n !== capital < 0n;
  const above = numerator < 0n ? -numerator : numerator;
  const below = capital < 0n ? -capital : capital;
  const rounded = (2n * above + below) / (2n * below);
  return writePercent(isNegative ? -rounded : rounded);
}
