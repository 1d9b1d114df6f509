import { Decimal } from 'decimal.js';
import { describe, expect, it } from 'vitest';
import { add, dd, divide, type DoubleDouble, multiply, power, root, twoProduct, twoSum } from './double-double.js';
import { decimalAt, toDecimal } from './fine-decimal.js';

const at = decimalAt(80);
const errorOf = (value: DoubleDouble, exact: Decimal): number =>
  toDecimal(at, value).div(exact).minus(1).abs().toNumber();
const third = divide(dd(1), dd(3));

describe('double-double arithmetic against decimal.js', () => {
  it('keeps what a double loses', () => {
    expect(twoSum(1, 2 ** -60)).toEqual({ hi: 1, lo: 2 ** -60 });
    const { hi, lo } = twoProduct(1 + 2 ** -30, 1 + 2 ** -30);
    expect([hi, lo]).toEqual([1 + 2 ** -29, 2 ** -60]);
  });

  it('adds, multiplies, divides and takes powers and roots to 30 digits', () => {
    const exact = toDecimal(at, third);
    expect(errorOf(third, new at(1).div(3))).toBeLessThan(1e-31);
    expect(errorOf(add(third, dd(1e-8)), exact.plus(toDecimal(at, dd(1e-8))))).toBeLessThan(1e-31);
    expect(errorOf(multiply(third, third), exact.times(exact))).toBeLessThan(1e-31);
    expect(errorOf(power(third, 41), exact.pow(41))).toBeLessThan(1e-29);
    expect(errorOf(root(third, 7), at.pow(exact, new at(1).div(7)))).toBeLessThan(1e-30);
    expect(power(third, 0)).toEqual(dd(1));
  });
});
