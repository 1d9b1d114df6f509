import { z } from 'zod';

/** Whole cents as a safe integer; + and − as the field says. */
export const cents = z.int();

/** A plain decimal amount with at most two places, as it stands in the files: `1234.5`, `-0.07`. */
const AMOUNT = /^(-?)(\d{1,13})(?:\.(\d{1,2}))?$/;

/**
 * Reads a plain decimal amount as whole cents without passing through binary fractions.
 * Returns null for everything else: thousands separators, exponents, three decimals, blanks.
 */
export function parseAmount(text: string): number | null {
  const match = AMOUNT.exec(text);
  if (!match) return null;
  const [, sign, whole, fraction = ''] = match;
  const value = Number(whole) * 100 + Number(fraction.padEnd(2, '0'));
  return sign === '-' && value !== 0 ? -value : value;
}

/** Whole cents as a plain decimal with two places: `-7` → `-0.07`. The inverse of {@link parseAmount}. */
export function formatAmount(value: number): string {
  const digits = Math.abs(value).toString().padStart(3, '0');
  return `${value < 0 ? '-' : ''}${digits.slice(0, -2)}.${digits.slice(-2)}`;
}
