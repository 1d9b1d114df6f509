import { Decimal } from 'decimal.js';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { addYears, dayNumber, derive, isoDate, type WindowInput } from '../../src/index.js';
import { answerOf } from '../investor-flows.js';
import { anyWindow, saverWindow } from './window-arbitrary.js';

const RUNS = { numRuns: 150 };
const Wide = Decimal.clone({ precision: 60, maxE: 9e15, minE: -9e15 });

/** Relative distance between two decimal strings. */
const distance = (first: string, second: string): number => new Wide(first).div(second).minus(1).abs().toNumber();

const shift = (window: WindowInput, days: number): WindowInput => {
  const moved = (date: string) => isoDate(dayNumber(date) + days);
  return {
    ...window,
    openedOn: moved(window.openedOn),
    closedOn: moved(window.closedOn),
    flows: window.flows.map(({ date, cents }) => ({ date: moved(date), cents })),
  };
};

const scale = (window: WindowInput, factor: number): WindowInput => ({
  ...window,
  openingCents: window.openingCents * factor,
  closingCents: window.closingCents * factor,
  flows: window.flows.map(({ date, cents }) => ({ date, cents: cents * factor })),
});

/** Σ amount · x^weight over the window's moments, and the sum of sizes, at 60 digits; written apart from the solver. */
function plugBack(window: WindowInput, root: string, spanDays: number): { residual: Decimal; size: Decimal } {
  const lag = { start: 1, mid: 0.5, end: 0 }[window.timing];
  const byDate = new Map<string, number>();
  for (const { date, cents } of window.flows) byDate.set(date, (byDate.get(date) ?? 0) + cents);
  const dates = [...byDate].filter(([, cents]) => cents !== 0).toSorted(([a], [b]) => (a < b ? -1 : 1));
  const start =
    window.openingCents !== 0 || dates.length === 0 ? dayNumber(window.openedOn) : dayNumber(dates[0]![0]) - lag;
  const end = start + spanDays;
  const terms: [number, number][] = [
    [window.openingCents, end - start],
    ...dates.map(([date, cents]): [number, number] => [cents, end - dayNumber(date) + lag]),
    [-window.closingCents, 0],
  ];
  let residual = new Wide(0);
  let size = new Wide(0);
  for (const [cents, days] of terms) {
    const term = new Wide(root).pow(new Wide(days).div(spanDays)).times(cents);
    residual = residual.plus(term);
    size = size.plus(term.abs());
  }
  return { residual, size };
}

describe('properties of the rate', () => {
  it('does not change with the scale of money', () => {
    fc.assert(
      fc.property(saverWindow, fc.constantFrom(2, 10, 1000), (window, factor) => {
        const [plain, scaled] = [answerOf(window), answerOf(scale(window, factor))];
        expect(scaled.periodReturnPct).toBe(plain.periodReturnPct);
        expect(scaled.firstEstimatePct).toBe(plain.firstEstimatePct);
        expect(distance(scaled.roots[0]!, plain.roots[0]!)).toBeLessThan(1e-17);
      }),
      RUNS,
    );
  });

  it('does not change when every sign is turned', () => {
    fc.assert(
      fc.property(anyWindow, (window) => {
        const [plain, turned] = [answerOf(window), answerOf(scale(window, -1))];
        fc.pre(plain.status !== 'total-loss' && turned.status !== 'total-loss');
        // A closing balance of 0 ends the span at a last flow out, which turned is a flow in.
        fc.pre(window.closingCents !== 0);
        expect({ ...turned, iterations: 0 }).toEqual({ ...plain, iterations: 0 });
      }),
      RUNS,
    );
  });

  it('does not change when every date moves by as many days', () => {
    fc.assert(
      fc.property(anyWindow, fc.integer({ min: -4000, max: 4000 }), (window, days) => {
        expect(answerOf(shift(window, days))).toEqual(answerOf(window));
      }),
      RUNS,
    );
  });

  it('does not depend on the order of flows, on their being split within a day, or on flows of 0', () => {
    fc.assert(
      fc.property(anyWindow, fc.nat(), (window, part) => {
        const split = window.flows.flatMap(({ date, cents }) => [
          { date, cents: cents - (part % 1000) },
          { date, cents: 0 },
          { date, cents: part % 1000 },
        ]);
        expect(answerOf({ ...window, flows: split.toReversed() })).toEqual(answerOf(window));
      }),
      RUNS,
    );
  });

  it('rises with the closing balance', () => {
    fc.assert(
      fc.property(saverWindow, fc.integer({ min: 1, max: 1_000_000 }), (window, more) => {
        const [less, greater] = [answerOf(window), answerOf({ ...window, closingCents: window.closingCents + more })];
        fc.pre(less.status === 'solved' && greater.status === 'solved');
        expect(new Wide(greater.roots[0]!).gt(less.roots[0]!)).toBe(true);
      }),
      RUNS,
    );
  });

  it('put back into the equation leaves nothing, to 1e-15 of the amounts', () => {
    fc.assert(
      fc.property(fc.oneof(saverWindow, anyWindow), (window) => {
        const answer = answerOf(window);
        for (const root of answer.roots) {
          const { residual, size } = plugBack(window, root, answer.spanDays!);
          expect(residual.abs().div(size).toNumber()).toBeLessThan(1e-15);
        }
      }),
      RUNS,
    );
  });

  it('of an account without flows multiplies over any split of its time', () => {
    fc.assert(
      fc.property(
        fc.tuple(fc.integer({ min: 1, max: 1e9 }), fc.integer({ min: 1, max: 1e9 }), fc.integer({ min: 1, max: 1e9 })),
        fc.tuple(fc.integer({ min: 1, max: 800 }), fc.integer({ min: 1, max: 800 })),
        ([opening, middle, closing], [first, second]) => {
          const rate = (from: number, to: number, opened: number, closed: number) =>
            answerOf({
              openedOn: isoDate(from),
              closedOn: isoDate(to),
              openingCents: opened,
              closingCents: closed,
              flows: [],
              timing: 'end',
            }).roots[0]!;
          const parts = new Wide(rate(0, first, opening, middle)).times(rate(first, first + second, middle, closing));
          expect(distance(parts.toString(), rate(0, first + second, opening, closing))).toBeLessThan(1e-16);
        },
      ),
      RUNS,
    );
  });

  it('has the sign of the gain when the average capital is positive', () => {
    fc.assert(
      fc.property(saverWindow, (window) => {
        const answer = answerOf(window);
        const { gainCents, averageCapitalCents } = derive(window, answer);
        fc.pre(answer.status === 'solved' && Number(averageCapitalCents) > 0);
        expect(Math.sign(new Wide(answer.roots[0]!).minus(1).toNumber())).toBe(Math.sign(gainCents));
      }),
      RUNS,
    );
  });

  it('becomes its reciprocal when time runs backwards', () => {
    fc.assert(
      fc.property(saverWindow, (window) => {
        fc.pre(window.timing === 'end');
        const [opened, closed] = [dayNumber(window.openedOn), dayNumber(window.closedOn)];
        fc.pre(window.flows.every(({ date }) => date < window.closedOn));
        const backwards: WindowInput = {
          ...window,
          openingCents: window.closingCents,
          closingCents: window.openingCents,
          flows: window.flows.map(({ date, cents }) => ({
            date: isoDate(opened + closed - dayNumber(date)),
            cents: -cents,
          })),
        };
        const [forth, back] = [answerOf(window), answerOf(backwards)];
        expect(back.status).toBe(forth.status);
        forth.roots.forEach((root, index) => {
          const mirrored = back.roots[back.roots.length - 1 - index]!;
          expect(distance(new Wide(1).div(root).toString(), mirrored)).toBeLessThan(1e-16);
        });
      }),
      RUNS,
    );
  });

  it('has every field, and percentages of two decimals without a negative zero', () => {
    fc.assert(
      fc.property(anyWindow, (window) => {
        const answer = answerOf(window);
        for (const text of [answer.periodReturnPct, answer.annualReturnPct, answer.firstEstimatePct]) {
          if (text !== null) expect(text).toMatch(/^(?!-0\.00$)-?\d+\.\d\d$/);
        }
        expect(answer.periodReturnPct !== null).toBe(answer.status === 'solved' || answer.status === 'total-loss');
        expect(answer.roots.length > 1).toBe(answer.status === 'ambiguous');
        expect(answer.reason === null).toBe(answer.status === 'solved');
        if (answer.spanDays! <= 365) expect(answer.annualReturnPct).toBeNull();
      }),
      { numRuns: 600 },
    );
  });

  it('keeps a first estimate at or below it with deposits only', () => {
    fc.assert(
      fc.property(saverWindow, (window) => {
        const flows = window.flows.filter(({ cents }) => cents > 0);
        const answer = answerOf({ ...window, flows });
        fc.pre(answer.status === 'solved');
        expect(Number(answer.firstEstimatePct)).toBeLessThanOrEqual(Number(answer.periodReturnPct));
      }),
      RUNS,
    );
  });
});

describe('anniversaries', () => {
  it('annualise whole years by exactly their number', () => {
    fc.assert(
      fc.property(fc.integer({ min: 2, max: 12 }), fc.integer({ min: 0, max: 20000 }), (years, day) => {
        const openedOn = isoDate(day);
        const grown = 1.07 ** years * 1e9;
        const answer = answerOf({
          openedOn,
          closedOn: addYears(openedOn, years),
          openingCents: 1e9,
          closingCents: Math.round(grown),
          flows: [],
          timing: 'end',
          years,
        });
        expect(answer.annualReturnPct).toBe('7.00');
      }),
      RUNS,
    );
  });
});
