import { describe, expect, it } from 'vitest';
import { type FlowTiming, isoDate } from '../../src/index.js';
import { answerOf, ratesOf } from '../investor-flows.js';

interface Case {
  readonly name: string;
  readonly source: string;
  readonly days: number;
  readonly opening: number;
  readonly closing: number;
  /** Day of the period, counted from its opening, and amount into the account. */
  readonly flows: readonly (readonly [day: number, amount: number])[];
  readonly timing?: FlowTiming;
  readonly printed: string;
}

const fm = 'SOA/CAS examination FM and Course 2, published solutions (simple interest)';
const bacon = 'C. R. Bacon, performance measurement textbook, from memory';
const financialMath = 'R package FinancialMath (its code; the manual has a sign wrong)';
// Second year at the rate of the first: what the account is worth between the two.
const MIDDLE_VALUE = 103992 / 1.0624990518;

const cases: Case[] = [
  {
    name: 'E51',
    source: 'encyclopedia, Modified Dietz',
    days: 730,
    opening: 100,
    closing: 300,
    flows: [[365, 50]],
    printed: '120.00',
  },
  {
    name: 'E52',
    source: 'tutorial page, 90 days',
    days: 90,
    opening: 100000,
    closing: 125000,
    flows: [
      [20, 20000],
      [60, -10000],
    ],
    printed: '13.37',
  },
  {
    name: 'E52 in 31 days',
    source: 'tutorial page, its answer not seen; ours',
    days: 31,
    opening: 100000,
    closing: 118000,
    flows: [
      [9, 20000],
      [19, -10000],
    ],
    printed: '7.25',
  },
  {
    name: 'E53',
    source: 'examination preparation, October',
    days: 31,
    opening: 585.6,
    closing: 602.34,
    flows: [
      [5, -15.05],
      [9, 19.82],
      [15, 16.42],
      [24, -18.96],
    ],
    printed: '2.45',
  },
  {
    name: 'E54 (profit shown as a loss)',
    source: 'encyclopedia, Modified Dietz',
    days: 8,
    opening: 1000,
    closing: 250,
    flows: [[1, -1200]],
    printed: '-900.00',
  },
  {
    name: 'E55 simple, as mid-month',
    source: bacon,
    days: 31,
    opening: 74.2,
    closing: 104.4,
    flows: [[16, 37.1]],
    timing: 'mid',
    printed: '-7.44',
  },
  {
    name: 'E55 end of day',
    source: bacon,
    days: 31,
    opening: 74.2,
    closing: 104.4,
    flows: [[14, 37.1]],
    printed: '-7.30',
  },
  {
    name: 'E55 start of day',
    source: bacon,
    days: 31,
    opening: 74.2,
    closing: 104.4,
    flows: [[14, 37.1]],
    timing: 'start',
    printed: '-7.21',
  },
  {
    name: 'E56 first',
    source: financialMath,
    days: 4,
    opening: 100,
    closing: 175,
    flows: [
      [1, 20],
      [2, 10],
      [3, 50],
    ],
    printed: '-3.77',
  },
  {
    // The package divides by the 1.75 years: 0.0269058296 a year.
    name: 'E56 second',
    source: financialMath,
    days: 7,
    opening: 25200,
    closing: 25900,
    flows: [
      [1, 500],
      [6, -1000],
    ],
    printed: '4.71',
  },
  { name: 'E57', source: fm, days: 12, opening: 100000, closing: MIDDLE_VALUE, flows: [[3, -8000]], printed: '6.25' },
  { name: 'E58 withdrawal', source: fm, days: 12, opening: 140, closing: 100, flows: [[5, -56.092]], printed: '15.00' },
  {
    name: 'E58 deposit',
    source: fm,
    days: 12,
    opening: 900,
    closing: 800,
    flows: [
      [6, 333.1176],
      [10, -400],
    ],
    printed: '-3.31',
  },
  {
    name: 'E59',
    source: fm,
    days: 12000,
    opening: 50000,
    closing: 55000,
    flows: [
      [4000, 8000],
      [7063, -10000],
    ],
    printed: '13.67',
  },
];

const windowOf = ({ days, opening, closing, flows, timing }: Case) => ({
  openedOn: isoDate(0),
  closedOn: isoDate(days),
  openingCents: Math.round(opening * 1e4),
  closingCents: Math.round(closing * 1e4),
  flows: flows.map(([day, amount]) => ({ date: isoDate(day), cents: Math.round(amount * 1e4) })),
  timing: timing ?? ('end' as const),
});

describe('published Dietz figures', () => {
  it.each(cases)('$name: $source', (example) => {
    expect(answerOf(windowOf(example)).firstEstimatePct).toBe(example.printed);
  });

  it('E51: the rate is 50 % a year where Modified Dietz says 120 % for two (encyclopedia)', () => {
    const answer = answerOf(windowOf(cases[0]!));
    expect(ratesOf(answer, 365)[0]).toBeCloseTo(0.5, 14);
    expect(answer).toMatchObject({ periodReturnPct: '125.00', annualReturnPct: '50.00' });
  });
});
