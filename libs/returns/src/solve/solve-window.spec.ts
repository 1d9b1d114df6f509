import { describe, expect, it } from 'vitest';
import type { WindowInput } from '../window/window.js';
import { toAnswer } from './outcome.js';
import { solveWindow } from './solve-window.js';

const window: WindowInput = {
  openedOn: '2026-06-30',
  closedOn: '2026-09-30',
  openingCents: 100_000,
  closingCents: 110_000,
  flows: [],
  timing: 'end',
};
const solve = (changes: Partial<WindowInput>) => toAnswer(solveWindow({ ...window, ...changes }));
const flow = (date: string, cents: number) => ({ date, cents });

describe('solving a window', () => {
  it('gives the example of the documentation', () => {
    expect(solve({})).toEqual({
      status: 'solved',
      periodReturnPct: '10.00',
      annualReturnPct: null,
      firstEstimatePct: '10.00',
      factorLow: null,
      factorHigh: null,
      roots: ['1.1'],
      spanDays: 92,
      iterations: 0,
      reason: null,
    });
  });

  it('gives the quarter of a saver in few steps', () => {
    const answer = solve({ openingCents: 1_800_000, closingCents: 1_868_920, flows: [flow('2026-07-10', 25_000)] });
    expect(answer).toMatchObject({ status: 'solved', periodReturnPct: '2.41', firstEstimatePct: '2.41', spanDays: 92 });
    expect(answer.iterations).toBeLessThanOrEqual(4);
  });

  it('tells total loss only when all the money had time to be lost', () => {
    expect(solve({ closingCents: 0 })).toMatchObject({
      status: 'total-loss',
      reason: 'nothing-left',
      periodReturnPct: '-100.00',
      roots: [],
      iterations: null,
    });
    expect(solve({ closingCents: 0, openingCents: 0, flows: [flow('2026-07-10', 5)] })).toMatchObject({
      status: 'total-loss',
      spanDays: 82,
    });
    expect(solve({ closingCents: 0, flows: [flow('2026-09-30', 5)] })).toMatchObject({
      status: 'no-solution',
      reason: 'one-sided',
    });
    expect(solve({ closingCents: 0, flows: [flow('2026-09-30', 5)], timing: 'mid' }).status).toBe('total-loss');
    expect(solve({ closingCents: 0, openingCents: -5 }).status).toBe('no-solution');
    expect(solve({ closingCents: 0, flows: [flow('2026-07-10', -5)] }).status).toBe('solved');
  });

  it('annualises a total loss over more than a year to the same', () => {
    expect(solve({ openedOn: '2024-06-30', closingCents: 0 }).annualReturnPct).toBe('-100.00');
    expect(solve({ openedOn: '2025-09-30', closingCents: 0 }).annualReturnPct).toBeNull();
  });

  it('tells that nothing was at work', () => {
    expect(solve({ openingCents: 0, closingCents: 0 })).toMatchObject({
      status: 'no-capital',
      reason: 'no-money',
      spanDays: 92,
    });
    expect(solve({ openingCents: 0 })).toMatchObject({ status: 'no-capital', reason: 'no-time' });
    expect(solve({ closedOn: '2026-06-30' })).toMatchObject({ status: 'no-capital', reason: 'no-time', spanDays: 0 });
    expect(solve({ openingCents: 0, flows: [flow('2026-09-30', 110_000)] })).toMatchObject({
      status: 'no-capital',
      reason: 'no-time',
      spanDays: 0,
    });
    expect(solve({ closingCents: 0, timing: 'start', flows: [flow('2026-07-01', -100_000)] }).status).toBe(
      'no-capital',
    );
  });

  it('lists every rate of an ambiguous window, ascending', () => {
    const answer = solve({
      openingCents: 100_000,
      closingCents: 0,
      openedOn: '2003-01-01',
      closedOn: '2003-03-02',
      flows: [flow('2003-01-31', -500_000), flow('2003-03-02', 600_000)],
    });
    expect(answer).toMatchObject({
      status: 'ambiguous',
      reason: 'several-rates',
      roots: ['4', '9'],
      periodReturnPct: null,
    });
  });

  it('counts a double root as one', () => {
    const answer = solve({
      openingCents: 100,
      closingCents: 0,
      openedOn: '2003-01-01',
      closedOn: '2003-03-02',
      flows: [flow('2003-01-31', -220), flow('2003-03-02', 121)],
    });
    expect(answer).toMatchObject({ status: 'solved', roots: ['1.21'], periodReturnPct: '21.00' });
  });

  it('writes rates beyond doubles', () => {
    const grown = {
      openedOn: '2026-01-01',
      closedOn: '2026-12-31',
      openingCents: 1,
      flows: [flow('2026-01-02', -1000)],
      closingCents: 1,
    };
    const answer = solve(grown);
    expect(answer.status).toBe('solved');
    expect(answer.roots[0]).toMatch(/^1e\+1092$/);
    expect(answer.periodReturnPct).toMatch(/^(9{21}|1)\d+\.\d\d$/);
    expect(
      solve({ openingCents: 0, flows: [flow('2026-07-01', 100), flow('2026-09-29', 1_000_000)], closingCents: 1 })
        .roots[0],
    ).toMatch(/e-\d{3}$/);
  });
});

describe('the annual rate', () => {
  const years = (openedOn: string, closedOn: string, given: Partial<WindowInput>) =>
    solve({ openedOn, closedOn, ...given }).annualReturnPct;

  it('is Actual/365 above 365 days and absent up to there', () => {
    expect(years('2025-09-30', '2026-09-30', {})).toBeNull();
    expect(years('2020-01-01', '2021-01-01', {})).toBe('9.97');
    expect(years('2022-09-30', '2026-09-30', { closingCents: 150_000 })).toBe('10.66');
  });

  it('is the root of whole years when asked for', () => {
    expect(years('2022-09-30', '2026-09-30', { closingCents: 146_410, years: 4 })).toBe('10.00');
    expect(years('2024-09-30', '2026-09-30', { closingCents: 121_000, years: 2 })).toBe('10.00');
    expect(years('2020-02-29', '2023-02-28', { closingCents: 133_100, years: 3 })).toBe('10.00');
    expect(years('2021-02-28', '2024-02-29', { closingCents: 133_100, years: 3 })).toBe('10.00');
  });

  it('is absent for years 0 and 1, in leap years too', () => {
    expect(years('2020-01-01', '2021-01-01', { years: 1 })).toBeNull();
    expect(years('2020-01-01', '2021-01-01', { years: 0 })).toBeNull();
  });

  it('is Actual/365 on the span where the account began or ended within the whole years', () => {
    const closedEarly = { closingCents: 0, flows: [flow('2025-09-30', -133_100)], years: 4 };
    expect(years('2022-09-30', '2026-09-30', closedEarly)).toBe('9.99');
    const withinAYear = { closingCents: 0, flows: [flow('2023-09-30', -110_000)], years: 4 };
    expect(years('2022-09-30', '2026-09-30', withinAYear)).toBeNull();
  });

  it('is Actual/365 where the dates are not that many years apart', () => {
    expect(years('2022-09-30', '2026-06-30', { years: 4 })).toBe(years('2022-09-30', '2026-06-30', {}));
  });
});
