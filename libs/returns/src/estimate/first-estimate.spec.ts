import { describe, expect, it } from 'vitest';
import { equationOf, sliceOf } from '../window/equation.js';
import { dietz, firstEstimatePct } from './first-estimate.js';

const equation = (openingCents: number, closingCents: number, flows: [string, number][] = []) =>
  equationOf(
    sliceOf({
      openedOn: '2026-06-30',
      closedOn: '2026-07-10',
      openingCents,
      closingCents,
      flows: flows.map(([date, cents]) => ({ date, cents })),
      timing: 'end',
    }),
  );

describe('the first estimate', () => {
  it('is gain over average capital', () => {
    const put = equation(1000, 1200, [['2026-07-05', 100]]);
    expect(dietz(put)).toEqual({ gainCents: 100, capitalCentHalfDays: 21000 });
    expect(firstEstimatePct(put)).toBe('9.52');
  });

  it('rounds ties away from zero, exactly', () => {
    expect(firstEstimatePct(equation(20000, 20001))).toBe('0.01');
    expect(firstEstimatePct(equation(20000, 19999))).toBe('-0.01');
    expect(firstEstimatePct(equation(20001, 20000))).toBe('0.00');
    expect(firstEstimatePct(equation(9_000_000_000_000_000, 9_000_450_000_000_000))).toBe('0.01');
  });

  it('is absent when there is no capital to divide by', () => {
    expect(firstEstimatePct(equation(0, 0))).toBeNull();
    expect(firstEstimatePct(equation(1000, 500, [['2026-07-05', -2000]]))).toBeNull();
    expect(firstEstimatePct(equation(4_500_000_000_000_000, 5, [['2026-07-05', -9_000_000_000_000_000]]))).toBeNull();
  });
});
