import { describe, expect, it } from 'vitest';
import { dd, divide } from './double-double.js';
import { exactPercentOf, percentOf, type RefinableRoot, writeFactor, writePercent } from './figures.js';
import { exactTerms } from './fine-decimal.js';

/** The root of `grown` = `put` · z over one half day. */
const ratio = (grown: number, put: number): RefinableRoot => ({
  z: divide(dd(grown), dd(put)),
  error: 1e-28,
  exact: () => exactTerms({ exponents: Float64Array.of(1, 0), amounts: Float64Array.of(put, -grown) }, []),
});
const whole = { halfDays: 1, degree: 1 };

describe('printed figures', () => {
  it('have two decimals and no negative zero', () => {
    expect([0n, 5n, -5n, 241n, -12345n].map((value) => writePercent(value))).toEqual([
      '0.00',
      '0.05',
      '-0.05',
      '2.41',
      '-123.45',
    ]);
    expect(percentOf(ratio(999999, 1000000), whole)).toBe('0.00');
  });

  it('round ties away from zero, and what is a hair off them to its side', () => {
    expect(percentOf(ratio(102345, 100000), whole)).toBe('2.35');
    expect(percentOf(ratio(97655, 100000), whole)).toBe('-2.35');
    expect(percentOf(ratio(1_023_449_999_999_999, 1_000_000_000_000_000), whole)).toBe('2.34');
    expect(percentOf(ratio(1_023_450_000_000_001, 1_000_000_000_000_000), whole)).toBe('2.35');
  });

  it('take the root of whole years', () => {
    expect(percentOf(ratio(121, 100), { halfDays: 1, degree: 2 })).toBe('10.00');
    expect(percentOf(ratio(106_090_000, 100_000_000), { halfDays: 1, degree: 2 })).toBe('3.00');
  });

  it('write every digit of large percentages', () => {
    expect(percentOf(ratio(10, 1), { halfDays: 30, degree: 1 })).toBe(`${'9'.repeat(30)}00.00`);
    expect(exactPercentOf(ratio(4, 3), whole, 6)).toBe('33.333333');
  });

  it('write factors with 20 digits, exponents where needed, and no trailing zeros', () => {
    expect(writeFactor(ratio(11, 10), 1)).toBe('1.1');
    expect(writeFactor(ratio(1, 1), 1)).toBe('1');
    expect(writeFactor(ratio(4, 3), 1)).toBe('1.3333333333333333333');
    expect(writeFactor(ratio(2, 3), 1)).toBe('0.66666666666666666667');
    expect(writeFactor(ratio(1, 1000), 120)).toBe('1e-360');
    expect(writeFactor(ratio(1000, 1), 120)).toBe('1e+360');
    expect(writeFactor(ratio(123_456, 1), 1)).toBe('123456');
  });
});
