import { describe, expect, it } from 'vitest';
import { toAnswer } from '../solve/outcome.js';
import { solveWindow } from '../solve/solve-window.js';
import type { WindowInput } from '../window/window.js';
import { derive } from './derive.js';

const window: WindowInput = {
  openedOn: '2026-06-30',
  closedOn: '2026-09-30',
  openingCents: 1_800_000,
  closingCents: 1_868_920,
  flows: [{ date: '2026-07-10', cents: 25_000 }],
  timing: 'end',
};
const working = (changes: Partial<WindowInput> = {}) => {
  const input = { ...window, ...changes };
  return derive(input, toAnswer(solveWindow(input)));
};

describe('the working of a window', () => {
  it('can be followed from flows to printed figure', () => {
    const derived = working();
    expect(derived.flows).toEqual([
      { date: '2026-07-10', cents: 25_000, daysAtWork: 82, weight: '0.891304', weightedCents: '22282.61' },
    ]);
    expect(derived).toMatchObject({
      gainCents: 43_920,
      averageCapitalCents: '1822282.61',
      firstEstimatePct: '2.41',
      interval: null,
    });
    expect(derived.rounding).toEqual({ exactPct: '2.4102022972', printedPct: '2.41' });
  });

  it('steps from the first estimate to a residual of nothing', () => {
    const { steps } = working();
    expect(steps.map(({ step }) => step)).toEqual(steps.map((_, index) => index));
    expect(Number(steps[0]!.factor)).toBeCloseTo(1 + 43_920 / 1_822_282.61, 8);
    expect(Math.abs(Number(steps[steps.length - 1]!.residualCents))).toBeLessThan(0.001);
    expect(Number(steps[steps.length - 1]!.factor)).toBeCloseTo(1.0241020229728968, 12);
  });

  it('rounds the annual figure where there is one', () => {
    const { rounding } = working({
      openedOn: '2023-09-30',
      openingCents: 1_000_000,
      flows: [],
      closingCents: 1_331_000,
      years: 3,
    });
    expect(rounding).toEqual({ exactPct: '10', printedPct: '10.00' });
  });

  it('has no steps and no rounding where there is no rate, and says −100 for a total loss', () => {
    expect(working({ openingCents: 0, flows: [], closingCents: 5 })).toMatchObject({ steps: [], rounding: null });
    expect(working({ flows: [], closingCents: 0 })).toMatchObject({
      steps: [],
      rounding: { exactPct: '-100', printedPct: '-100.00' },
    });
    expect(working({ closedOn: '2026-06-30', flows: [] })).toMatchObject({ averageCapitalCents: null, rounding: null });
  });
});
