import { describe, expect, it } from 'vitest';
import { answerOf, type DatedAmount, monthly, ratesOf, windowOfInvestor } from '../investor-flows.js';

interface Published {
  readonly name: string;
  readonly source: string;
  readonly amounts: readonly DatedAmount[];
  readonly rate: number;
  /** Digits that the source gives or holds to, as a tolerance. */
  readonly within: number;
  readonly scale?: number;
}

const on = (dates: readonly string[], amounts: readonly number[]): DatedAmount[] =>
  dates.map((date, index) => [date, amounts[index]!] as const);

const HELP = [-10000, 2750, 4250, 3250, 2750];
const HELP_1998 = ['1998-01-01', '1998-03-01', '1998-10-30', '1999-02-15', '1999-04-01'];
const office = 'LibreOffice QA sheet for XIRR';
const javaXirr = 'java-xirr test suite';
const phpSpreadsheet = 'PhpSpreadsheet test suite';
const pyxirr = 'pyxirr test suite';

const JULY_2001: DatedAmount[] = [
  ['2001-06-22', -2610],
  ['2001-07-03', -2589],
  ['2001-07-05', -5110],
  ['2001-07-06', -2550],
  ['2001-07-09', -5086],
  ['2001-07-10', -2561],
  ['2001-07-12', -5040],
  ['2001-07-13', -2552],
  ['2001-07-16', -2530],
];

const payroll: [closing: number, rate: number][] = [
  [2000, 1.41526706548978],
  [1800, 1.03112197466669],
  [1600, 0.665339866487698],
  [1400, 0.320513615664647],
  [1200, 0],
  [1000, -0.29171165478267],
  [800, -0.548371585025588],
  [600, -0.760852514281991],
  [400, -0.915227454539025],
];

const published: Published[] = [
  {
    name: 'E1',
    source: 'spreadsheet help for XIRR; LibreOffice QA sheet',
    amounts: on(['2008-01-01', '2008-03-01', '2008-10-30', '2009-02-15', '2009-04-01'], HELP),
    rate: 0.373362533518831,
    within: 1e-12,
  },
  { name: 'E2', source: office, amounts: on(HELP_1998, HELP), rate: 0.374858597687371, within: 1e-12 },
  {
    name: 'E3',
    source: office,
    amounts: on(['1998-01-01', '1999-03-01', '2000-10-30', '2002-02-15', '2004-04-01'], HELP),
    rate: 0.0799495862990467,
    within: 1e-12,
  },
  {
    name: 'E4',
    source: office,
    amounts: on(HELP_1998, [-10000, 1, 2, 3250, 2750]),
    rate: -0.351015039169015,
    within: 1e-12,
  },
  {
    name: 'E5',
    source: office,
    amounts: on(['2004-01-01', '2005-01-01', '2006-01-01', '2007-01-01'], [-100, 10, 10, 110]),
    rate: 0.0998951090083094,
    within: 1e-12,
  },
  {
    name: 'E6 (signs turned)',
    source: office,
    amounts: on(['2016-01-01', '2016-03-01', '2017-01-01'], [10, 20, -35]),
    rate: 0.18826194159203,
    within: 1e-12,
  },
  {
    name: 'E7',
    source: office,
    amounts: on(
      ['2016-01-01', '2016-02-01', '2016-04-15', '2016-08-01', '2017-03-26'],
      [-7500, 3000, 5000, 1200, 4000],
    ),
    rate: 2.6602420360887,
    within: 1e-11,
  },
  {
    name: 'E8',
    source: office,
    amounts: on(['2016-04-30', '2016-05-31', '2016-09-01', '2016-12-31', '2017-01-31'], [-5000, 800, 1300, 600, 7500]),
    rate: 2.18630968237577,
    within: 1e-11,
  },
  {
    name: 'E9',
    source: office,
    amounts: on(
      ['2001-01-01', '2001-01-02', '2001-03-15', '2001-05-12', '2001-08-10'],
      [-10000, 2000, 2500, 5000, 1000],
    ),
    rate: 0.194818475056105,
    within: 1e-12,
  },
  {
    name: 'E9 with 1 February',
    source: 'spreadsheet help (from memory, 0.1828)',
    amounts: on(
      ['2001-01-01', '2001-02-01', '2001-03-15', '2001-05-12', '2001-08-10'],
      [-10000, 2000, 2500, 5000, 1000],
    ),
    rate: 0.1828434858,
    within: 1e-9,
  },
  ...payroll.map(([closing, rate], index): Published => ({
    name: `E${10 + index}`,
    source: office,
    amounts: [...monthly('2007-10-01', 12, -100), ['2008-10-01', closing]],
    rate,
    within: 1e-11,
  })),
  {
    name: 'E19',
    source: 'OpenOffice wiki, XIRR (~0.124)',
    amounts: on(['2008-02-05', '2008-07-05', '2009-01-05'], [-2750, 1000, 2000]),
    rate: 0.124,
    within: 5e-4,
  },
  {
    name: 'E20',
    source: 'Rust xirr documentation; pyxirr test suite (unordered)',
    amounts: on(['2015-10-17', '2018-06-10', '2015-06-11', '2015-07-21'], [-3000, 20000, -1000, -9000]),
    rate: 0.1635371584432641,
    within: 1e-12,
  },
  {
    name: 'E21',
    source: javaXirr,
    amounts: on(
      ['2010-01-01', '2010-04-01', '2010-07-01', '2010-10-01', '2011-01-01'],
      [-1000, -1000, -1000, -1000, 4300],
    ),
    rate: 0.1212676,
    within: 1e-6,
  },
  {
    name: 'E22',
    source: 'java-xirr readme',
    amounts: on(['2016-01-15', '2016-02-08', '2016-04-17', '2016-08-24'], [-1000, -2500, -1000, 5050]),
    rate: 0.2504234710540838,
    within: 1e-12,
  },
  {
    name: 'E23',
    source: 'java-xirr test suite; nodejs-xirr issue 1',
    amounts: [
      ['2000-05-24', -10000],
      ['2000-06-05', 3027.25],
      ['2001-04-09', 630.68],
      ['2004-02-24', 2018.2],
      ['2005-03-18', 1513.62],
      ['2006-02-15', 1765.89],
      ['2007-01-10', 4036.33],
      ['2007-11-14', 4036.33],
      ['2008-12-17', 1513.62],
      ['2010-01-15', 1513.62],
      ['2011-01-14', 2018.16],
      ['2012-02-03', 1513.62],
      ['2013-01-18', 1009.08],
      ['2014-01-24', 1513.62],
      ['2015-01-30', 1513.62],
      ['2016-01-22', 1765.89],
      ['2017-01-20', 1765.89],
      ['2017-06-05', 22421.55],
    ],
    rate: 0.2126861,
    within: 1e-7,
  },
  ...(
    [
      ['E24', ['2010-01-01', '2011-01-01', '2012-01-01'], [-1000, -1120, 2508.8], 0.12, 1e-12],
      ['E24 later', ['2010-01-01', '2011-01-01', '2013-01-01'], [-1000, -1120, 2508.8], 0.07017195, 1e-8],
      ['E25', ['2010-01-01', '2012-01-01'], [-2000, 2508.8], 0.12, 1e-12],
      ['E25 later', ['2010-01-01', '2013-01-01'], [-2000, 2508.8], 0.0784054, 1e-7],
      ['E26 down', ['2010-01-01', '2011-01-01'], [-1000, 900], -0.1, 1e-12],
      ['E26 up', ['2010-01-01', '2011-01-01'], [-1000, 1100], 0.1, 1e-12],
      ['E26 threefold', ['2010-01-01', '2011-01-01'], [-1000, 3000], 2, 1e-12],
      ['E26 level', ['2010-01-01', '2011-01-01'], [-1000, 1000], 0, 1e-15],
    ] as const
  ).map(([name, dates, amounts, rate, within]): Published => ({
    name,
    source: javaXirr,
    amounts: on(dates, amounts),
    rate,
    within,
  })),
  {
    name: 'E28',
    source: 'java-xirr issue 5',
    amounts: [...JULY_2001, ['2001-07-17', 29520]],
    rate: -0.7640294,
    within: 1e-7,
  },
  {
    name: 'E29',
    source: javaXirr,
    amounts: [...JULY_2001, ['2001-07-17', -9840], ['2001-07-18', 38900]],
    rate: -0.8353404,
    within: 1e-7,
  },
  {
    name: 'E30',
    source: phpSpreadsheet,
    amounts: on(['2010-01-01', '2010-04-01', '2010-10-01', '2011-02-01'], [-100, 20, 40, 25]),
    rate: -0.197387315,
    within: 1e-8,
  },
  {
    name: 'E31',
    source: phpSpreadsheet,
    amounts: on(
      ['2019-06-20', '2019-06-21', '2019-06-24', '2019-06-27', '2019-06-27', '2019-07-27'],
      [139947.43, 52573.25, 48849.74, 1893.67, 26369.16, -273029.18],
    ),
    rate: 0.137963527441025,
    within: 1e-8,
  },
  {
    name: 'E32',
    source: phpSpreadsheet,
    amounts: on(
      ['2008-01-01', '2008-03-01', '2008-10-30', '2009-02-15', '2009-04-01', '2009-06-01'],
      [-10000, 2750, 4250, 3250, 2750, 46000],
    ),
    rate: 3.434984565,
    within: 1e-8,
  },
  {
    name: 'E33',
    source: 'PhpSpreadsheet issue 689',
    amounts: on(['2018-09-05', '2018-09-26'], [-1000000.706, 947003.58]),
    rate: -0.6118824173,
    within: 1e-10,
    scale: 1000,
  },
  {
    name: 'E34',
    source: phpSpreadsheet,
    amounts: on(['2022-12-12', '2022-12-16'], [-20972.36, 20350.545]),
    rate: -0.935842486,
    within: 1e-8,
    scale: 1000,
  },
  {
    name: 'E35',
    source: phpSpreadsheet,
    amounts: on(['2015-04-01', '2019-06-27'], [4000, -46000]),
    rate: 0.77868869226873,
    within: 1e-8,
  },
  {
    name: 'E36',
    source: 'python xirr test suite',
    amounts: on(['2019-12-31', '2020-03-12'], [-80005.8, 65209.6]),
    rate: -0.6454,
    within: 5e-5,
  },
  {
    name: 'E37',
    source: 'python xirr test suite',
    amounts: on(['2018-05-09', '2018-06-09', '2018-11-09', '2018-12-09'], [-200, 30, 50, 20]),
    rate: -0.8037,
    within: 5e-5,
  },
  {
    name: 'E38',
    source: 'python xirr test suite',
    amounts: on(['2019-12-31', '2020-03-05'], [-100, 1000]),
    rate: 412461.6383,
    within: 1e-4,
  },
  {
    name: 'E39 up',
    source: 'ruby finance libraries',
    amounts: on(['1985-01-01', '1990-01-01', '1995-01-01'], [-1000, 600, 6000]),
    rate: 0.22568333231765117,
    within: 1e-12,
  },
  {
    name: 'E39 down',
    source: 'ruby finance libraries',
    amounts: on(['1985-01-01', '1990-01-01', '1995-01-01'], [-1000, 600, 200]),
    rate: -0.03459243361066291,
    within: 1e-12,
  },
  {
    name: 'E40',
    source: 'ruby finance libraries',
    amounts: on(['1957-01-01', '2013-01-01'], [-1000, 390000]),
    rate: 0.11233945341957301,
    within: 1e-12,
  },
  {
    name: 'E41 (pairs on a day)',
    source: 'ruby finance libraries',
    amounts: on(['2011-12-07', '2011-12-07', '2013-05-21', '2013-05-21'], [1000, 2000, -2000, -4000]),
    rate: 0.6103589452617378,
    within: 1e-12,
  },
  {
    name: 'E42',
    source: 'ruby xirr test suite',
    amounts: on(
      ['2021-03-17', '2021-03-23', '2021-03-26', '2021-04-01', '2021-05-17', '2021-06-03', '2021-06-17', '2021-06-21'],
      [-117.38, -2370.02, 0.29, 0.32, -3005.69, -4781.38, 3.09, 8509.93],
    ),
    rate: -0.8317173694,
    within: 1e-10,
  },
  {
    name: 'E43',
    source: pyxirr,
    amounts: on(['2021-06-09', '2021-08-11'], [-134.09, 40.86]),
    rate: -0.9989769231734277,
    within: 1e-13,
  },
  {
    name: 'E44',
    source: pyxirr,
    amounts: on(['2020-03-05', '2020-03-16'], [-18480, 13120]),
    rate: -0.9999884228170087,
    within: 1e-13,
  },
  {
    name: 'E45',
    source: 'F# finance library test suite',
    amounts: on(['2020-07-03', '2021-02-25'], [-177900000, 8799805.85]),
    rate: -0.990247691899517,
    within: 1e-13,
  },
  {
    name: 'E46',
    source: 'Rust financial crate documentation',
    amounts: on(
      ['2016-07-08', '2017-07-08', '2018-07-08', '2019-07-08', '2020-07-08', '2021-07-08'],
      [-379, 100, 100, 100, 100, 100],
    ),
    rate: 0.10004608364,
    within: 1e-10,
  },
  {
    name: 'E47 Act/365F',
    source: 'numeric library documentation by way of the pyxirr test suite',
    amounts: on(
      ['2007-01-12', '2008-02-14', '2008-03-03', '2008-06-14', '2008-12-01'],
      [-10000, 2500, 2000, 3000, 4000],
    ),
    rate: 0.10064378342638,
    within: 1e-12,
  },
  {
    name: 'E48',
    source: 'pyxirr readme',
    amounts: [['2021-01-01', -100], ...monthly('2021-02-01', 11, 20)],
    rate: 5.09623547168478,
    within: 1e-11,
  },
  {
    name: 'E48 shorter',
    source: 'pyxirr readme',
    amounts: [['2021-01-01', -80], ...monthly('2021-02-01', 11, 19)],
    rate: 8.780801977141174,
    within: 1e-11,
  },
  {
    name: 'E64',
    source: 'sample in an online sheet program’s help, which prints no answer; bisection of our own',
    amounts: on(['2012-01-01', '2012-06-23', '2013-05-12', '2014-02-09'], [-4000, 200, 250, 300]),
    rate: -0.6440855342,
    within: 1e-10,
  },
];

describe('published rates of dated amounts, Actual/365', () => {
  it.each(published)('$name: $source', ({ amounts, rate, within, scale }) => {
    const answer = answerOf(windowOfInvestor(amounts, scale));
    expect(answer.status).toBe('solved');
    expect(Math.abs(ratesOf(answer, 365)[0]! - rate)).toBeLessThanOrEqual(within);
  });

  it('E27: nothing left is a total loss and no root (java-xirr gives −1, spreadsheets an error)', () => {
    const answer = answerOf(windowOfInvestor(on(['2010-01-01', '2011-01-01'], [-1000, 0])));
    expect(answer).toMatchObject({ status: 'total-loss', periodReturnPct: '-100.00', roots: [] });
  });

  it('E29 and E47 over 360 days (java-xirr, pyxirr test suites)', () => {
    const first = answerOf(windowOfInvestor([...JULY_2001, ['2001-07-17', -9840], ['2001-07-18', 38900]]));
    expect(ratesOf(first, 360)[0]).toBeCloseTo(-0.8312209, 7);
    const second = answerOf(
      windowOfInvestor(
        on(['2007-01-12', '2008-02-14', '2008-03-03', '2008-06-14', '2008-12-01'], [-10000, 2500, 2000, 3000, 4000]),
      ),
    );
    expect(ratesOf(second, 360)[0]).toBeCloseTo(0.0991988898057063, 11);
  });
});
