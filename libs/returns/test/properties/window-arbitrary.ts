import fc from 'fast-check';
import { dayNumber, type FlowTiming, isoDate, type WindowInput } from '../../src/index.js';

export const timings: FlowTiming[] = ['start', 'mid', 'end'];

/** A saver's account: an opening balance, deposits and a few smaller withdrawals, and a closing balance in reach of them. */
export const saverWindow = fc
  .record({
    openedDay: fc.integer({ min: dayNumber('1999-12-31'), max: dayNumber('2026-06-30') }),
    days: fc.integer({ min: 30, max: 3660 }),
    openingCents: fc.integer({ min: 100_00, max: 5_000_000_00 }),
    deposits: fc.array(
      fc.record({
        at: fc.double({ min: 0, max: 1, noNaN: true }),
        part: fc.double({ min: 0.0001, max: 0.3, noNaN: true }),
      }),
      { maxLength: 24 },
    ),
    withdrawals: fc.array(
      fc.record({
        at: fc.double({ min: 0, max: 1, noNaN: true }),
        part: fc.double({ min: 0.0001, max: 0.04, noNaN: true }),
      }),
      { maxLength: 4 },
    ),
    growth: fc.double({ min: -0.4, max: 0.9, noNaN: true }),
    timing: fc.constantFrom(...timings),
  })
  .map(({ openedDay, days, openingCents, deposits, withdrawals, growth, timing }): WindowInput => {
    const flow =
      (sign: 1 | -1) =>
      ({ at, part }: { at: number; part: number }) => ({
        date: isoDate(openedDay + 1 + Math.floor(at * (days - 1))),
        cents: sign * Math.max(1, Math.round(part * openingCents)),
      });
    const flows = [...deposits.map(flow(1)), ...withdrawals.map(flow(-1))];
    const paidIn = flows.reduce((sum, { cents }) => sum + cents, openingCents);
    return {
      openedOn: isoDate(openedDay),
      closedOn: isoDate(openedDay + days),
      openingCents,
      closingCents: Math.max(1, Math.round(paidIn * (1 + growth))),
      flows,
      timing,
    };
  });

/** Any window at all: balances and flows of either sign, short and long, with coinciding dates. */
export const anyWindow = fc
  .record({
    openedDay: fc.integer({ min: dayNumber('1999-12-31'), max: dayNumber('2026-06-30') }),
    days: fc.integer({ min: 0, max: 400 }),
    openingCents: fc.oneof(fc.constant(0), fc.integer({ min: -10_000, max: 1_000_000 })),
    closingCents: fc.oneof(fc.constant(0), fc.integer({ min: -10_000, max: 1_000_000 })),
    flows: fc.array(fc.tuple(fc.nat(399), fc.integer({ min: -500_000, max: 500_000 })), { maxLength: 9 }),
    timing: fc.constantFrom(...timings),
  })
  .map(({ openedDay, days, flows, ...rest }): WindowInput => ({
    ...rest,
    openedOn: isoDate(openedDay),
    closedOn: isoDate(openedDay + days),
    flows: days === 0 ? [] : flows.map(([at, cents]) => ({ date: isoDate(openedDay + 1 + (at % days)), cents })),
  }));
