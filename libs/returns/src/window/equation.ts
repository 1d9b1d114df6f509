import { dayNumber } from './civil-date.js';
import { type FlowTiming, InvalidWindow, type WindowInput } from './window.js';

/**
 * A window as a polynomial: Σ amounts[j] · z^exponents[j] = 0, where z is the growth factor of half a day, so that every exponent is
 * a whole number. Balances hold at the end of their dates, hence the closing balance stands as −closing at exponent 0.
 */
export interface Equation {
  /** Effective span in half days. */
  readonly halfDays: number;
  /** Half days from each moment to the effective end, strictly descending. */
  readonly exponents: Float64Array;
  /** Whole cents, none 0; money into the account is +, money out and the closing balance −. */
  readonly amounts: Float64Array;
  /** Money went in at least once and never came out: no date's flows sum to less than 0, and the opening balance is not negative. */
  readonly isOnlyIn: boolean;
  /** Neither a balance nor a flow. */
  readonly isEmpty: boolean;
  readonly closingCents: number;
  /** The effective span is the whole window. */
  readonly isWholeWindow: boolean;
}

/** Half days by which a flow works less than the whole of its date. */
const LAG: Record<FlowTiming, number> = { start: 2, mid: 1, end: 0 };

/** One window over treated flows that are sorted by day, one per day, none 0. */
export interface WindowSlice {
  readonly openedDay: number;
  readonly closedDay: number;
  readonly openingCents: number;
  readonly closingCents: number;
  readonly days: ArrayLike<number>;
  readonly cents: ArrayLike<number>;
  /** Index of the first flow after `openedDay`. */
  readonly from: number;
  /** Index after the last flow not after `closedDay`. */
  readonly to: number;
  readonly timing: FlowTiming;
}

/**
 * Puts a window as its equation of value.
 *
 * Units: half days and whole cents.
 * Domain: flows sorted by day, one per day, none 0.
 * Returns: the equation; moments that coincide (an opening balance and a flow at the start of the first day, a closing balance and a
 * flow at the end of the last) are one term, and a term of 0 is left out.
 * Throws: {@link InvalidWindow} when the amounts of one moment, or all of them together, exceed 2^53 − 1 cents.
 * Complexity: linear in the flows.
 * Source: common practice, no source, for effective span and timings; the equation itself is the textbook's equation of value.
 */
export function equationOf(slice: WindowSlice): Equation {
  const { openedDay, closedDay, openingCents, closingCents, days, cents, from, to } = slice;
  const lag = LAG[slice.timing];
  const count = to - from;
  const start = openingCents === 0 && count > 0 ? 2 * days[from]! - lag : 2 * openedDay;
  const end = effectiveEnd(slice);

  const exponents = new Float64Array(count + 2);
  const amounts = new Float64Array(count + 2);
  let terms = 0;
  let isOnlyIn = openingCents >= 0;
  let total = openingCents;
  let pendingExponent = end - start;
  let pending = openingCents;
  for (let index = from; index <= to; index += 1) {
    const isClosing = index === to;
    const amount = isClosing ? -closingCents : cents[index]!;
    const exponent = isClosing ? 0 : end - 2 * days[index]! + lag;
    total += amount;
    if (!isClosing && amount < 0) isOnlyIn = false;
    if (exponent === pendingExponent) {
      pending += amount;
      if (!Number.isSafeInteger(pending)) throw tooLarge();
      continue;
    }
    if (pending !== 0) {
      exponents[terms] = pendingExponent;
      amounts[terms] = pending;
      terms += 1;
    }
    pendingExponent = exponent;
    pending = amount;
  }
  if (pending !== 0) {
    exponents[terms] = pendingExponent;
    amounts[terms] = pending;
    terms += 1;
  }
  if (!Number.isSafeInteger(total)) throw tooLarge();
  return {
    halfDays: end - start,
    exponents: exponents.subarray(0, terms),
    amounts: amounts.subarray(0, terms),
    isOnlyIn: isOnlyIn && (openingCents > 0 || count > 0),
    isEmpty: openingCents === 0 && closingCents === 0 && count === 0,
    closingCents,
    isWholeWindow: end - start === 2 * (closedDay - openedDay),
  };
}

/** The effective end in half days: the close, or the last flow's moment where it took out all that was left. */
function effectiveEnd({ closedDay, closingCents, days, cents, from, to, timing }: WindowSlice): number {
  const isEmptied = closingCents === 0 && to > from && cents[to - 1]! < 0;
  return isEmptied ? 2 * days[to - 1]! - LAG[timing] : 2 * closedDay;
}

/** Half days that a flow of the window is at work before the effective end. */
export const flowExponent = (slice: WindowSlice, index: number): number =>
  effectiveEnd(slice) - 2 * slice.days[index]! + LAG[slice.timing];

const tooLarge = (): InvalidWindow => new InvalidWindow('flows', 'and balances together exceed 9007199254740991 cents');

/** Flows by day, sorted, those of one date as their sum, dates that sum to 0 left out. */
export interface DailyFlows {
  readonly days: number[];
  readonly cents: number[];
}

/**
 * Merges flows by date.
 *
 * Units: days since 1970-01-01, whole cents. Domain: any order.
 * Returns: one flow per date, oldest first, none 0.
 * Throws: {@link InvalidWindow} when a date's sum exceeds 2^53 − 1 cents.
 * Complexity: linear when the days come sorted, else n log n.
 */
export function mergeByDay(days: ArrayLike<number>, cents: ArrayLike<number>): DailyFlows {
  const order = Array.from(days, (_, index) => index);
  let isSorted = true;
  for (let index = 1; index < days.length && isSorted; index += 1) isSorted = days[index - 1]! <= days[index]!;
  if (!isSorted) order.sort((first, second) => days[first]! - days[second]!);
  const merged: DailyFlows = { days: [], cents: [] };
  for (let at = 0; at < order.length;) {
    const day = days[order[at]!]!;
    let sum = 0;
    for (; at < order.length && days[order[at]!] === day; at += 1) sum += cents[order[at]!]!;
    if (!Number.isSafeInteger(sum)) throw tooLarge();
    if (sum === 0) continue;
    merged.days.push(day);
    merged.cents.push(sum);
  }
  return merged;
}

/** A checked window with its flows merged, ready for {@link equationOf}. */
export function sliceOf(window: WindowInput): WindowSlice {
  const flows = mergeByDay(
    window.flows.map((flow) => dayNumber(flow.date)),
    window.flows.map((flow) => flow.cents),
  );
  return {
    openedDay: dayNumber(window.openedOn),
    closedDay: dayNumber(window.closedOn),
    openingCents: window.openingCents,
    closingCents: window.closingCents,
    days: flows.days,
    cents: flows.cents,
    from: 0,
    to: flows.days.length,
    timing: window.timing,
  };
}
