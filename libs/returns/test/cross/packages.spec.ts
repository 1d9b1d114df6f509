import { XIRR } from '@formulajs/formulajs';
import { xirr as nodeIrr } from 'node-irr';
import { describe, expect, it } from 'vitest';
import xirr from 'xirr';
import { isoDate } from '../../src/index.js';
import { answerOf, type DatedAmount, ratesOf, windowOfInvestor } from '../investor-flows.js';

/** Well-behaved accounts: level deposits every two weeks, and a closing balance a given growth above what was paid in. */
const accounts = [26, 52, 130].flatMap((deposits) =>
  [-0.08, 0.01, 0.12].map((growth) => {
    const amounts: DatedAmount[] = [[isoDate(18262), -10000]];
    for (let index = 1; index <= deposits; index += 1) amounts.push([isoDate(18262 + 14 * index), -250]);
    amounts.push([isoDate(18262 + 14 * (deposits + 1)), Math.round((10000 + 250 * deposits) * (1 + growth))]);
    return { name: `${deposits} deposits, ${growth * 100} %`, amounts };
  }),
);

const utc = (date: string): Date => new Date(`${date}T00:00:00Z`);
const ours = (amounts: readonly DatedAmount[]): number => ratesOf(answerOf(windowOfInvestor(amounts)), 365)[0]!;

describe('other packages on well-behaved accounts', () => {
  it.each(accounts)('xirr, to 1e-9 a year: $name', ({ amounts }) => {
    const theirs = xirr(amounts.map(([date, amount]) => ({ amount, when: utc(date) })));
    expect(Math.abs(theirs - ours(amounts))).toBeLessThan(1e-9);
  });

  it.each(accounts)('node-irr, to 1e-6 a year: $name', ({ amounts }) => {
    const daily = nodeIrr(amounts.map(([date, amount]) => ({ amount, date: utc(date) })));
    expect(Math.abs((1 + daily.rate) ** 365 - 1 - ours(amounts))).toBeLessThan(1e-6);
  });

  it.each(accounts)('@formulajs/formulajs, to 1e-8 a year: $name', ({ amounts }) => {
    const theirs = XIRR(
      amounts.map(([, amount]) => amount),
      amounts.map(([date]) => utc(date)),
      0.1,
    ) as number;
    expect(Math.abs(theirs - ours(amounts))).toBeLessThan(1e-8);
  });
});
