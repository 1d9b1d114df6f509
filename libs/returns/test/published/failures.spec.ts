import { describe, expect, it } from 'vitest';
import { dayNumber, type WindowInput } from '../../src/index.js';
import { answerOf, type DatedAmount, monthly, ratesOf, windowOfInvestor } from '../investor-flows.js';

// Inputs at which published solvers fail or mislead, from the issue threads and tests of the libraries named; true values by bisection.
const failures: {
  name: string;
  source: string;
  amounts: DatedAmount[];
  rates: number[];
  within: number;
  scale?: number;
}[] = [
  {
    name: 'F1',
    source: 'XIRR library issue: leaves the domain',
    amounts: [
      ['2014-03-01', 1124],
      ['2014-03-31', -885.41103946],
    ],
    rates: [-0.9451377991],
    within: 1e-10,
    scale: 1e8,
  },
  {
    name: 'F2',
    source: 'XIRR library issue: leaves the domain',
    amounts: [['2011-12-29', -9000], ...monthly('2012-01-29', 7, 305.38), ['2012-08-29', 133.04]],
    rates: [-0.9660894685],
    within: 1e-10,
  },
  {
    name: 'F3',
    source: 'XIRR library issue: does not converge',
    amounts: [
      ['2020-03-04', -713.07],
      ['2020-03-17', 555.33],
    ],
    rates: [-0.9991059151],
    within: 1e-10,
  },
  {
    name: 'F4',
    source: 'XIRR library issue: does not converge',
    amounts: [
      ['2021-08-03', -99995],
      ['2021-08-09', 97642],
    ],
    rates: [-0.7650989869],
    within: 1e-10,
  },
  {
    name: 'F5',
    source: 'XIRR library issue: #NUM',
    amounts: [
      ['2021-11-24', 55600],
      ['2021-12-24', -51094.83],
    ],
    rates: [-0.6423076122],
    within: 1e-10,
  },
  {
    name: 'F6',
    source: 'XIRR library issue: absolute tolerance',
    amounts: [
      ['2018-06-30', -84e6],
      ['2019-03-31', 800e3],
      ['2019-06-30', 760e3],
      ['2019-09-30', 680e3],
      ['2019-12-31', 800e3],
      ['2020-03-31', 280e3],
      ['2020-06-30', 740e3],
      ['2020-09-30', 520e3],
      ['2022-03-31', -2.1e6],
      ['2023-03-31', -13e6],
      ['2024-09-30', -3e6],
      ['2024-09-30', -4.1e6],
      ['2024-12-31', -250e3],
      ['2024-12-31', -1.8e6],
      ['2025-03-31', -8.4e6],
      ['2025-12-31', 1.8e6],
      ['2026-03-31', 43000],
      ['2026-03-31', -6600],
    ],
    rates: [-0.9127813822],
    within: 1e-10,
  },
  {
    name: 'F8',
    source: 'pyxirr issue: root nearer to −1 than a double resolves',
    amounts: [
      ['2024-11-21', -100],
      ['2024-11-28', -100],
      ['2024-12-03', 100],
    ],
    rates: [1.6737e-14 - 1],
    within: 1e-15,
  },
  {
    name: 'F9',
    source: 'spreadsheet issue: 2.98023E-09 in place of an error',
    amounts: [
      ['2010-04-01', 21162],
      ['2010-11-08', 6273.2],
      ['2011-02-01', 5417.2],
      ['2011-03-15', 5492.05],
      ['2011-05-12', 5486.15],
      ['2011-08-31', -20004],
    ],
    rates: [-0.5920466741],
    within: 1e-10,
  },
  {
    name: 'F11',
    source: 'spreadsheet issue: 2.98E-09 when the opening is split',
    amounts: [
      ['2019-09-13', -55000000],
      ['2019-09-13', -102253.4],
      ['2020-09-30', 45757426.8],
    ],
    rates: [-0.1623062248],
    within: 1e-10,
  },
  {
    name: 'F19',
    source: 'XIRR library test that asserts #NUM',
    amounts: [
      ['2010-01-15', -10000],
      ['2010-04-16', 10000],
      ['2010-07-16', -10000],
      ['2010-10-15', 5],
    ],
    rates: [5.76e-14 - 1],
    within: 1e-15,
  },
  {
    name: 'F20',
    source: 'pyxirr issue',
    amounts: [
      ['2020-05-27', 187.5],
      ['2020-05-27', -30],
      ['2020-05-27', 187.5],
      ['2020-05-28', 375],
      ['2020-05-28', -940],
    ],
    rates: [1.56e78],
    within: 0.01e78,
  },
  {
    name: 'F23 with 6.9',
    source: 'pyxirr issue',
    amounts: [
      ['2017-02-23', -627752],
      ['2017-11-07', -75167],
      ['2020-03-01', 6.9],
    ],
    rates: [-0.9846],
    within: 5e-6,
  },
  {
    name: 'F23 with 6.8',
    source: 'pyxirr issue',
    amounts: [
      ['2017-02-23', -627752],
      ['2017-11-07', -75167],
      ['2020-03-01', 6.8],
    ],
    rates: [-0.98469],
    within: 5e-6,
  },
  {
    name: 'F24',
    source: 'XIRR question: day and month exchanged',
    amounts: [
      ['2016-01-01', -100],
      ['2016-02-01', 150],
      ['2016-06-01', -100],
      ['2016-09-01', 200],
    ],
    rates: [63.4842],
    within: 5e-5,
  },
  {
    name: 'F26',
    source: 'spreadsheet and library disagree',
    amounts: [
      ['2020-01-09', -1200],
      ['2020-02-12', -1050],
      ['2020-03-02', -400],
      ['2020-03-13', -800],
      ['2020-05-11', 1500],
      ['2020-05-11', 1100],
      ['2020-05-11', 2000],
      ['2020-05-11', 450],
      ['2020-11-03', -2000],
      ['2020-12-29', 2850],
      ['2021-03-26', -1500],
      ['2021-07-21', 2025],
      ['2022-06-16', -2000],
      ['2022-07-06', 2635],
    ],
    rates: [3.6894338683],
    within: 1e-9,
  },
  {
    name: 'F27',
    source: 'pyxirr issue: none found, two exist',
    amounts: [
      ['2021-06-08', -1000000],
      ['2022-06-29', 5000],
      ['2023-06-08', -3],
      ['2023-06-30', 0],
    ],
    rates: [-0.9995965225, -0.9937850499],
    within: 1e-9,
  },
  {
    name: '8.3-fold in a day',
    source: 'XIRR library test; its yearly rate is beyond doubles',
    amounts: [
      ['2020-01-01', -559.5],
      ['2020-01-02', 4650.96],
    ],
    rates: [Infinity],
    within: 0,
  },
];

const empty: WindowInput = {
  openedOn: '2020-01-01',
  closedOn: '2020-04-01',
  openingCents: 0,
  closingCents: 0,
  flows: [],
  timing: 'end',
};

describe('published failures', () => {
  it.each(failures)('$name: $source', ({ amounts, rates, within, scale }) => {
    const answer = answerOf(windowOfInvestor(amounts, scale));
    expect(answer.status).toBe(rates.length === 1 ? 'solved' : 'ambiguous');
    const found = ratesOf(answer, 365);
    expect(found.length).toBe(rates.length);
    found.forEach((rate, index) => {
      if (Number.isFinite(rates[index])) expect(Math.abs(rate - rates[index]!)).toBeLessThanOrEqual(within);
      else expect(rate).toBe(rates[index]);
    });
  });

  it('F7: the rate of a loan does not change with its scale (spreadsheet issue: ×10 gave 356 %)', () => {
    const rates = [1, 10].map((factor) => {
      const payments = monthly('2004-07-01', 24, 8774.28 * factor);
      return ratesOf(answerOf(windowOfInvestor([['2004-06-01', -200000 * factor], ...payments])), 365)[0]!;
    });
    expect(rates[0]).toBeCloseTo(0.05112, 4);
    expect(rates[1]).toBeCloseTo(rates[0]!, 14);
  });

  it('F21: money in and out on one day is no capital (library returned its own guess)', () => {
    expect(
      answerOf(
        windowOfInvestor([
          ['2000-06-09', 2500],
          ['2000-06-09', -2500],
        ]),
      ),
    ).toMatchObject({ status: 'no-capital', reason: 'no-money' });
  });

  it('F22: nothing, zeros and negative zeros are no capital (library returned its upper bracket)', () => {
    const zeros = [0, -0].map((cents) => ({ date: '2020-02-01', cents }));
    for (const flows of [[], zeros]) {
      expect(answerOf({ ...empty, openingCents: -0, flows })).toMatchObject({
        status: 'no-capital',
        reason: 'no-money',
        firstEstimatePct: null,
      });
    }
  });

  it('F25: days are civil days, also across a change of the clocks (library counted seconds of local time)', () => {
    expect(dayNumber('2021-03-29') - dayNumber('2021-03-27')).toBe(2);
  });

  it('F29: money without time has no first estimate and no infinity', () => {
    const lastDay = answerOf({ ...empty, closingCents: 510, flows: [{ date: '2020-04-01', cents: 500 }] });
    expect(lastDay).toMatchObject({ status: 'no-capital', reason: 'no-time', firstEstimatePct: null });
    const cancelled = answerOf({
      ...empty,
      closedOn: '2020-01-03',
      openingCents: 1000,
      closingCents: 500,
      flows: [{ date: '2020-01-02', cents: -2000 }],
    });
    expect(cancelled.firstEstimatePct).toBeNull();
  });

  it('F30: a flow outside the window is refused, and order does not matter', () => {
    const flows = [
      { date: '2020-03-01', cents: 100 },
      { date: '2020-02-01', cents: -50 },
    ];
    const window = { ...empty, openingCents: 1000, closingCents: 1100 };
    expect(answerOf({ ...window, flows })).toEqual(answerOf({ ...window, flows: flows.toReversed() }));
    expect(() => answerOf({ ...window, flows: [{ date: '2019-12-31', cents: 5 }] })).toThrow(
      'flows[0].date is "2019-12-31"',
    );
  });
});
