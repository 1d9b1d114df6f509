import { describe, expect, it } from 'vitest';
import { type ActivityRow, type BalanceRow, historyOf } from '../../test/history.js';
import { DEFAULT_RETURN_POLICY, type ReturnPolicy, type WindowCode } from '../treatments/return-policy.js';
import { dayNumber } from '../window/civil-date.js';
import type { AccountContext } from './account.js';
import { computeAccount } from './compute-account.js';

const context = (changes: Partial<AccountContext> = {}, options: Partial<ReturnPolicy> = {}): AccountContext => ({
  opensOn: '2026-06-30',
  closesOn: '2026-09-30',
  policy: { ...DEFAULT_RETURN_POLICY, ...options },
  recordsBeginOn: '2019-07-01',
  publishedCloses: [],
  ...changes,
});

const contribution = (on: string, cents: number): ActivityRow => ({ kind: 'employee_contribution', cents, on });
const longStanding: BalanceRow[] = [
  ['2019-06-30', 1_000_000],
  ['2021-09-30', 1_200_000],
  ['2023-09-30', 1_300_000],
  ['2025-09-30', 1_500_000],
  ['2025-12-31', 1_600_000],
  ['2026-06-30', 1_800_000],
  ['2026-09-30', 1_868_920],
];
const compute = (
  activity: ActivityRow[],
  balances: BalanceRow[] = longStanding,
  given = context(),
  notes: BalanceRow[] = [],
) => computeAccount(historyOf(activity, balances, notes), given);
const windowIn = (result: ReturnType<typeof compute>, code: WindowCode) =>
  result.data.windows.find((window) => window.code === code)!;

describe('the windows of an account', () => {
  it('are the policy’s, each with its nominal opening and the rule for its annual rate', () => {
    const result = compute([contribution('2026-07-10', 25_000)]);
    expect(result).toMatchObject({
      status: 'solved',
      reason: null,
      periodReturn: '2.41',
      firstEstimate: '2.41',
      rejoinedOn: null,
    });
    expect(
      result.data.windows.map(({ code, openedOn, years, availability }) => [code, openedOn, years, availability]),
    ).toEqual([
      ['quarter', '2026-06-30', 0, 'computed'],
      ['year_to_date', '2025-12-31', 0, 'computed'],
      ['one_year', '2025-09-30', 1, 'computed'],
      ['three_years', '2023-09-30', 3, 'computed'],
      ['five_years', '2021-09-30', 5, 'computed'],
      ['since_joining', '2019-06-30', null, 'computed'],
    ]);
  });

  it('follow the plan year and Actual/365 where the policy says so', () => {
    const given = context({}, { yearToDate: 'plan_year', planYearStartMonth: 10, wholeYears: 'actual_365' });
    const result = compute([], longStanding, given);
    expect(windowIn(result, 'year_to_date')).toMatchObject({ openedOn: '2025-09-30', years: 0 });
    expect(windowIn(result, 'three_years').years).toBeNull();
    expect(windowIn(result, 'one_year').years).toBe(1);
  });

  it('say why they are unavailable', () => {
    const records = compute([], longStanding, context({ recordsBeginOn: '2025-10-01' }));
    expect(windowIn(records, 'three_years')).toMatchObject({
      availability: 'unavailable',
      reason: 'records-begin-later',
      answer: null,
    });
    expect(windowIn(records, 'since_joining').openedOn).toBe('2025-09-30');
    const gap = compute(
      [],
      longStanding.filter(([on]) => on !== '2023-09-30'),
    );
    expect(windowIn(gap, 'three_years')).toMatchObject({ reason: 'opening-balance-missing', openingCents: null });
    const open = compute([], longStanding.slice(0, -1));
    expect(open).toMatchObject({
      status: 'not-computed',
      reason: 'closing-balance-missing',
      closingCents: null,
      gainCents: null,
    });
    expect(open.data.movements).toBeNull();
    expect(compute([], [])).toMatchObject({ status: 'not-computed', reason: 'closing-balance-missing' });
  });

  it('of one who joined in the quarter start with the first flow; longer ones are not there', () => {
    const result = compute([contribution('2026-07-10', 25_000)], [['2026-09-30', 26_000]]);
    expect(windowIn(result, 'quarter')).toMatchObject({
      openingCents: 0,
      answer: { periodReturnPct: '4.00', spanDays: 82 },
    });
    expect(windowIn(result, 'year_to_date').answer).toEqual(windowIn(result, 'quarter').answer);
    expect(windowIn(result, 'one_year').reason).toBe('joined-later');
    expect(windowIn(result, 'since_joining')).toMatchObject({ openedOn: '2026-07-09', openingCents: 0, years: null });
  });

  it('hide what was earned on too little money', () => {
    const result = compute(
      [],
      [
        ['2026-06-30', 2400],
        ['2026-09-30', 2500],
      ],
    );
    expect(result).toMatchObject({
      status: 'not-computed',
      reason: 'capital-too-small',
      periodReturn: null,
      gainCents: 100,
    });
    expect(
      compute(
        [],
        [
          ['2026-06-30', 2500],
          ['2026-09-30', 2600],
        ],
      ).periodReturn,
    ).toBe('4.00');
  });

  it('carry an outcome’s name when there is no single rate', () => {
    const pump = [
      { kind: 'withdrawal', cents: 230_000, on: '2026-08-15' } as const,
      contribution('2026-09-30', 132_000),
    ];
    const result = compute(pump, [
      ['2026-06-30', 100_000],
      ['2026-09-30', 0],
    ]);
    expect(result).toMatchObject({ status: 'ambiguous', reason: 'several-rates', periodReturn: null });
    expect(windowIn(result, 'quarter')).toMatchObject({ availability: 'unavailable', reason: 'ambiguous' });
    expect(windowIn(result, 'quarter').answer!.roots.length).toBe(2);
  });

  it('take the newest version of a balance', () => {
    const corrected: BalanceRow[] = [...longStanding, ['2026-09-30', 1_900_000, 4]];
    expect(compute([], corrected).closingCents).toBe(1_900_000);
  });
});

describe('an account emptied and refilled', () => {
  const activity: ActivityRow[] = [
    contribution('2022-01-10', 500_000),
    { kind: 'distribution', cents: 520_000, on: '2023-05-05' },
    contribution('2026-02-02', 100_000),
  ];
  const balances: BalanceRow[] = [
    ['2022-03-31', 510_000],
    ['2022-09-30', 505_000],
    ['2023-06-30', 0],
    ['2023-09-30', 0],
    ['2026-03-31', 101_000],
    ['2026-06-30', 103_000],
    ['2026-09-30', 104_000],
  ];

  it('is one equation over a window, but since joining begins at the latest rejoining', () => {
    const result = compute(activity, balances);
    expect(result.rejoinedOn).toBe('2026-02-02');
    expect(windowIn(result, 'three_years')).toMatchObject({
      openedOn: '2023-09-30',
      openingCents: 0,
      availability: 'computed',
    });
    expect(windowIn(result, 'year_to_date')).toMatchObject({ openedOn: '2025-12-31', openingCents: 0 });
    expect(windowIn(result, 'since_joining')).toMatchObject({ openedOn: '2026-02-01', openingCents: 0 });
  });

  it('is its latest spell only where the policy says so', () => {
    const result = compute(activity, balances, context({}, { emptiedAndRefilled: 'latest_spell' }));
    expect(windowIn(result, 'three_years')).toMatchObject({ openedOn: '2026-02-01', openingCents: 0, years: null });
    expect(windowIn(result, 'quarter')).toMatchObject({ openedOn: '2026-06-30', years: 0 });
  });
});

describe('movements', () => {
  it('add up to the cent from opening to closing under every policy', () => {
    const activity: ActivityRow[] = [
      contribution('2026-07-10', 25_000),
      { kind: 'employer_contribution', cents: 12_500, on: '2026-07-10' },
      { kind: 'rollover_in', cents: 40_000, on: '2026-08-01' },
      { kind: 'loan_issued', cents: 90_000, on: '2026-08-03' },
      { kind: 'loan_repaid', cents: 5_000, on: '2026-09-03' },
      { kind: 'loan_interest', cents: 300, on: '2026-09-03' },
      { kind: 'fee', cents: 750, on: '2026-09-30' },
      { kind: 'fee', cents: -50, on: '2026-09-30' },
      { kind: 'forfeiture', cents: 2_000, on: '2026-09-15' },
      { kind: 'adjustment', cents: -33, on: '2026-09-16' },
      { kind: 'exchange_out', cents: 7_000, on: '2026-09-16' },
      { kind: 'exchange_in', cents: 7_000, on: '2026-09-16' },
      { kind: 'withdrawal', cents: 10_000, on: '2026-06-30' },
    ];
    const notes: BalanceRow[] = [['2026-09-30', 85_000]];
    for (const loans of ['outside', 'inside'] as const) {
      for (const adjustments of ['earnings', 'flow'] as const) {
        const { data, openingCents, closingCents } = compute(
          activity,
          longStanding,
          context({}, { loans, adjustments }),
          notes,
        );
        const total = Object.values(data.movements!).reduce((sum, cents) => sum + cents, openingCents!);
        expect(total).toBe(closingCents);
      }
    }
    const { movements } = compute(activity).data;
    expect(movements).toMatchObject({
      employee: 25_000,
      employer: 12_500,
      rolloversIn: 40_000,
      loanRepayments: 5_300,
      withdrawals: 0,
      loansIssued: -90_000,
      forfeitures: -2_000,
      fees: -700,
      adjustments: 0,
    });
  });

  it('lower the return by fees when net, and not when gross', () => {
    const fee: ActivityRow[] = [{ kind: 'fee', cents: 1_000, on: '2026-07-01' }];
    const balances: BalanceRow[] = [
      ['2026-06-30', 100_000],
      ['2026-09-30', 99_000],
    ];
    expect(compute(fee, balances).periodReturn).toBe('-1.00');
    expect(compute(fee, balances, context({}, { fees: 'gross' })).periodReturn).toBe('0.00');
  });

  it('hold the loan note in the balance when loans are inside, so that a loan is no loss', () => {
    const loan: ActivityRow[] = [{ kind: 'loan_issued', cents: 30_000, on: '2026-07-15' }];
    const balances: BalanceRow[] = [
      ['2026-06-30', 100_000],
      ['2026-09-30', 70_000],
    ];
    expect(compute(loan, balances).periodReturn).toBe('0.00');
    expect(compute(loan, balances, context({}, { loans: 'inside' }), [['2026-09-30', 30_000]]).periodReturn).toBe(
      '0.00',
    );
  });
});

describe('a late deposit', () => {
  const late: ActivityRow = {
    kind: 'employee_contribution',
    cents: 50_000,
    on: '2026-06-25',
    posted: '2026-07-06',
    version: 7,
  };
  const published = [{ day: dayNumber('2026-06-30'), ledgerVersion: 5 }];
  const balances: BalanceRow[] = [
    ['2026-06-30', 100_000, 4],
    ['2026-09-30', 150_000, 8],
  ];

  it('counts when it was posted, since the published balance did not hold it', () => {
    const result = compute([late], balances, context({ publishedCloses: published }));
    expect(result.data.flows).toEqual({ dates: ['2026-07-06'], cents: [50_000] });
    expect(result.periodReturn).toBe('0.00');
  });

  it('counts when it took effect once the balance was corrected with it', () => {
    const corrected: BalanceRow[] = [...balances, ['2026-06-30', 150_000, 7]];
    const result = compute([late], corrected, context({ publishedCloses: published }));
    expect(result.data.flows.dates).toEqual(['2026-06-25']);
    expect(result.periodReturn).toBe('0.00');
  });

  it('posted after the quarter in hand waits for the next, so that it counts once', () => {
    const after: ActivityRow = { ...late, on: '2026-09-28', posted: '2026-10-02' };
    const result = compute(
      [after],
      [
        ['2026-06-30', 100_000],
        ['2026-09-30', 100_000],
      ],
    );
    expect(result).toMatchObject({ periodReturn: '0.00', gainCents: 0 });
  });
});

describe('what is kept', () => {
  it('are the flows of the longest window by date and the balances at quarter ends', () => {
    const result = compute(
      [contribution('2019-06-30', 7), contribution('2020-01-05', 100), contribution('2020-01-05', 11)],
      [...longStanding, ['2026-07-31', 5], ['2026-12-31', 9]],
    );
    expect(result.data.flows).toEqual({ dates: ['2020-01-05'], cents: [111] });
    expect(result.data.values.dates).toEqual(longStanding.map(([on]) => on));
  });

  it('refuses a kind that is none', () => {
    const history = historyOf([contribution('2026-07-10', 1)], longStanding);
    history.activity.kind[0] = 99;
    expect(() => computeAccount(history, context())).toThrow('activity.kind[0] is 99');
  });
});
