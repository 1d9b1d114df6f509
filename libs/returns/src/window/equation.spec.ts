import { describe, expect, it } from 'vitest';
import { equationOf, mergeByDay, sliceOf } from './equation.js';
import type { WindowInput } from './window.js';

const window: WindowInput = {
  openedOn: '2026-06-30',
  closedOn: '2026-07-10',
  openingCents: 1000,
  closingCents: 1200,
  flows: [{ date: '2026-07-04', cents: 100 }],
  timing: 'end',
};
const put = (changes: Partial<WindowInput>) => {
  const { halfDays, exponents, amounts } = equationOf(sliceOf({ ...window, ...changes }));
  return { halfDays, terms: [...exponents].map((exponent, index) => [exponent, amounts[index]]) };
};

describe('the equation of a window', () => {
  it('counts half days from each moment to the end', () => {
    expect(put({})).toEqual({
      halfDays: 20,
      terms: [
        [20, 1000],
        [12, 100],
        [0, -1200],
      ],
    });
    expect(put({ timing: 'mid' }).terms[1]).toEqual([13, 100]);
    expect(put({ timing: 'start' }).terms[1]).toEqual([14, 100]);
  });

  it('runs from the first flow when the opening balance is 0', () => {
    expect(put({ openingCents: 0 })).toEqual({
      halfDays: 12,
      terms: [
        [12, 100],
        [0, -1200],
      ],
    });
  });

  it('runs to the last flow when it takes all that is left out of the account, and only then', () => {
    const flows = [{ date: '2026-07-04', cents: -900 }];
    expect(put({ closingCents: 0, flows })).toEqual({
      halfDays: 8,
      terms: [
        [8, 1000],
        [0, -900],
      ],
    });
    expect(put({ closingCents: 1, flows }).halfDays).toBe(20);
    expect(put({ closingCents: 0 }).halfDays).toBe(20);
  });

  it('merges one date and forgets dates that sum to 0', () => {
    const flows = [
      { date: '2026-07-05', cents: 70 },
      { date: '2026-07-04', cents: 60 },
      { date: '2026-07-05', cents: -70 },
      { date: '2026-07-04', cents: 40 },
    ];
    expect(put({ flows })).toEqual(put({}));
    expect(
      put({
        openingCents: 0,
        flows: [{ date: '2026-07-01', cents: 5 }, { date: '2026-07-01', cents: -5 }, ...window.flows],
      }).halfDays,
    ).toBe(12);
  });

  it('makes one term of moments that coincide', () => {
    expect(put({ flows: [{ date: '2026-07-10', cents: 100 }] }).terms).toEqual([
      [20, 1000],
      [0, -1100],
    ]);
    expect(put({ timing: 'start', flows: [{ date: '2026-07-01', cents: 100 }] }).terms).toEqual([
      [20, 1100],
      [0, -1200],
    ]);
    expect(put({ flows: [{ date: '2026-07-10', cents: 1200 }] }).terms).toEqual([[20, 1000]]);
  });

  it('refuses amounts that are no longer whole together', () => {
    const huge = Number.MAX_SAFE_INTEGER;
    expect(() => put({ openingCents: huge, flows: [{ date: '2026-07-01', cents: huge }] })).toThrow(
      'flows and balances together exceed',
    );
    expect(() => mergeByDay([1, 1], [huge, huge])).toThrow('flows and balances together exceed');
  });
});
