import { describe, expect, it } from 'vitest';
import { answerOf, periodic, ratesOf, windowOfInvestor } from '../investor-flows.js';

const numpy = 'numpy-financial test suite';
const spreadsheets = 'spreadsheet test suites for IRR';
const cfa = 'CFA-type exercise';
const jrv = 'R package jrvFinance, documentation';

const published: {
  name: string;
  source: string;
  amounts: number[];
  rates: number[];
  within: number;
  times?: number[];
}[] = [
  { name: 'E49 first', source: numpy, amounts: [-100, 39, 59, 55, 20], rates: [0.28095], within: 5e-6 },
  { name: 'E49 second', source: numpy, amounts: [-100, 0, 0, 74], rates: [-0.0955], within: 5e-5 },
  { name: 'E49 third', source: numpy, amounts: [-100, 100, 0, 7], rates: [0.06206], within: 5e-6 },
  {
    name: 'E49 fourth',
    source: numpy,
    amounts: [-150000, 15000, 25000, 35000, 45000, 60000],
    rates: [0.0524],
    within: 5e-5,
  },
  {
    name: 'E50 four years',
    source: spreadsheets,
    amounts: [-70000, 12000, 15000, 18000, 21000],
    rates: [-0.02124484827341],
    within: 1e-12,
  },
  {
    name: 'E50 five years',
    source: spreadsheets,
    amounts: [-70000, 12000, 15000, 18000, 21000, 26000],
    rates: [0.08663094803652],
    within: 1e-12,
  },
  {
    name: 'E50 three years',
    source: spreadsheets,
    amounts: [-70000, 12000, 15000, 18000],
    rates: [-0.1821374641455],
    within: 1e-12,
  },
  { name: 'E50 short', source: spreadsheets, amounts: [-100, 20, 24, 28.8], rates: [-0.13618951095869], within: 1e-12 },
  {
    name: 'E50 long',
    source: spreadsheets,
    amounts: [-100, 20, 24, 28.8, 34.56, 41.47],
    rates: [0.130575756371527],
    // The spreadsheet stopped 4e-12 from the root.
    within: 1e-11,
  },
  { name: 'E60 first', source: `${cfa} (from memory)`, amounts: [-100, -118, 264], rates: [0.1386], within: 5e-5 },
  { name: 'E60 second', source: cfa, amounts: [-200, 100, 170], rates: [0.2052], within: 5e-5 },
  { name: 'E60 third', source: cfa, amounts: [-100, -266, 396], rates: [0.0635], within: 5e-5 },
  { name: 'E60 fourth', source: cfa, amounts: [-10, -100, 120.312], rates: [0.0853], within: 5e-5 },
  { name: 'E60 fifth', source: cfa, amounts: [-5000, -1000, -300, 6600.3], rates: [0.0171], within: 5e-5 },
  {
    name: 'E61',
    source: 'CFA mock examination',
    amounts: [-2500, -1500, -500, 500, 4626.875],
    rates: [0.0396],
    within: 5e-5,
  },
  { name: 'E62 first', source: jrv, amounts: [-600, 300, 400], rates: [0.1039126], within: 5e-8 },
  { name: 'E62 second', source: jrv, amounts: [-600, 100, 400], rates: [-0.09592852], within: 5e-9 },
  {
    name: 'E62 uneven',
    source: jrv,
    amounts: [-450, 100, 300, 200],
    times: [0, 0.3, 1.9, 2.5],
    rates: [0.1746131],
    within: 5e-8,
  },
  { name: 'E62 two rates', source: jrv, amounts: [100, -230, 132], rates: [0.1, 0.2], within: 1e-12 },
  {
    name: 'oil pump',
    source: 'J. H. Lorie and L. J. Savage, "Three problems in rationing capital" (1955), figures from memory',
    amounts: [-1600, 10000, -10000],
    rates: [0.25, 4],
    within: 1e-12,
  },
  {
    name: 'F12',
    source: 'issue of an IRR library',
    amounts: [...Array<number>(12).fill(87.17), -86.43],
    rates: [-0.5020732642],
    within: 1e-9,
  },
  {
    name: 'F13',
    source: 'issue of an IRR library',
    amounts: [-172545.848122807, ...Array<number>(480).fill(787.735232517999)],
    rates: [0.00384],
    within: 5e-7,
  },
  {
    name: 'F15',
    source: 'issue of an IRR library',
    amounts: [-1678.87, 771.96, 1814.05, 3520.3, 3552.95, 3584.99, 4789.91, -1],
    rates: [-0.99979, 1.00427],
    within: 5e-6,
  },
  {
    name: 'F16',
    source: 'numpy-financial issue',
    amounts: [-50, -100, 600, 300, -100],
    rates: [-0.7689, 1.85442],
    within: 5e-6,
  },
  {
    name: 'F17',
    source: 'numpy-financial test suite',
    amounts: [-5, 10.5, 1, -8, 1],
    rates: [-0.8702, 0.0886, 0.7096],
    within: 5e-5,
  },
];

describe('published rates of amounts at equal periods', () => {
  it.each(published)('$name: $source', ({ amounts, rates, within, times }) => {
    const answer = answerOf(windowOfInvestor(periodic(amounts, 10, times), 1e6));
    expect(answer.status).toBe(rates.length === 1 ? 'solved' : 'ambiguous');
    const found = ratesOf(answer, 10);
    expect(found.length).toBe(rates.length);
    found.forEach((rate, index) => expect(Math.abs(rate - rates[index]!)).toBeLessThanOrEqual(within));
  });

  it('a pump with no rate at all has no solution, whichever way the signs stand (textbook example, from memory)', () => {
    for (const sign of [1, -1]) {
      const answer = answerOf(windowOfInvestor(periodic([sign * 1000, sign * -3000, sign * 2500])));
      expect(answer).toMatchObject({ status: 'no-solution', reason: 'no-rate-fits', roots: [] });
    }
  });

  it('F28: one-sided amounts have no rate (issues of several libraries: some give 0, some NaN, some throw)', () => {
    for (const amounts of [
      [1, 2, 3],
      [-1, -2, -3],
    ]) {
      expect(answerOf(windowOfInvestor(periodic(amounts)))).toMatchObject({
        status: 'no-solution',
        reason: 'one-sided',
      });
    }
  });
});
