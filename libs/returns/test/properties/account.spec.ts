import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  ACTIVITY_KINDS,
  computeAccount,
  DEFAULT_RETURN_POLICY,
  isoDate,
  dayNumber,
  solveWindow,
  toAnswer,
  WINDOW_CODES,
  windowOf,
  workingOf,
} from '../../src/index.js';
import { type ActivityRow, type BalanceRow, historyOf } from '../history.js';

const FIRST = dayNumber('2018-06-30');
const LAST = dayNumber('2026-09-30');
const QUARTER_ENDS = Array.from({ length: 34 }, (_, index) => {
  const months = 5 + 3 * index;
  return `${2018 + Math.floor(months / 12)}-${['03-31', '06-30', '09-30', '12-31'][Math.floor((months % 12) / 3)]}`;
});

const account = fc.record({
  activity: fc.array(
    fc.record({
      kind: fc.constantFrom(...ACTIVITY_KINDS),
      cents: fc.integer({ min: 1, max: 200_000 }),
      day: fc.integer({ min: FIRST + 1, max: LAST }),
      delay: fc.constantFrom(0, 0, 0, 5, 40),
      version: fc.integer({ min: 1, max: 9 }),
    }),
    { maxLength: 60 },
  ),
  balances: fc.array(fc.option(fc.integer({ min: 0, max: 9_000_000 }), { freq: 12 }), { minLength: 34, maxLength: 34 }),
  policy: fc.record({
    flowTiming: fc.constantFrom('start' as const, 'mid' as const, 'end' as const),
    fees: fc.constantFrom('net' as const, 'gross' as const),
    loans: fc.constantFrom('outside' as const, 'inside' as const),
    emptiedAndRefilled: fc.constantFrom('whole' as const, 'latest_spell' as const),
    wholeYears: fc.constantFrom('anniversary' as const, 'actual_365' as const),
  }),
  recordsBeginOn: fc.constantFrom('2018-07-01', '2022-07-01'),
});

describe('properties of an account’s windows', () => {
  it('every stored answer comes out again from the stored data, and movements add up', () => {
    fc.assert(
      fc.property(account, ({ activity, balances, policy, recordsBeginOn }) => {
        const rows = activity.map(({ kind, cents, day, delay, version }): ActivityRow => ({
          kind,
          cents,
          on: isoDate(day),
          posted: isoDate(day + delay),
          version,
        }));
        const known = balances.flatMap((cents, index): BalanceRow[] =>
          cents === null ? [] : [[QUARTER_ENDS[index]!, cents, 3]],
        );
        const result = computeAccount(historyOf(rows, known), {
          opensOn: '2026-06-30',
          closesOn: '2026-09-30',
          recordsBeginOn,
          policy: { ...DEFAULT_RETURN_POLICY, ...policy, windows: WINDOW_CODES },
          publishedCloses: [{ day: dayNumber('2026-06-30'), ledgerVersion: 5 }],
        });
        for (const { code, answer, availability, reason } of result.data.windows) {
          const input = windowOf(result.data, code);
          expect(input === null).toBe(answer === null);
          expect(availability === 'computed').toBe(reason === null);
          if (input === null) continue;
          expect(toAnswer(solveWindow(input))).toEqual(answer);
          expect(workingOf(result.data, code)!.rounding?.printedPct ?? null).toBe(
            answer!.annualReturnPct ?? answer!.periodReturnPct,
          );
        }
        if (result.data.movements !== null) {
          const total = Object.values(result.data.movements).reduce((sum, cents) => sum + cents, result.openingCents!);
          expect(total).toBe(result.closingCents);
        }
      }),
      { numRuns: 150 },
    );
  }, 20_000);
});
