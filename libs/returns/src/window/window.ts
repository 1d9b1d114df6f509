import { readDay } from './civil-date.js';

export const FLOW_TIMINGS = ['start', 'mid', 'end'] as const;
/** When on its date a flow starts to work: at its start, half a day before its end, or at its end. */
export type FlowTiming = (typeof FLOW_TIMINGS)[number];

/** Money that crossed the boundary of the account: + is into it. */
export interface Flow {
  readonly date: string;
  readonly cents: number;
}

/** The question: what rate makes the opening balance and the flows grow into the closing balance? */
export interface WindowInput {
  readonly openedOn: string;
  readonly closedOn: string;
  readonly openingCents: number;
  readonly closingCents: number;
  readonly flows: readonly Flow[];
  readonly timing: FlowTiming;
  /** A window of this many whole years; asks for the annual rate of statements instead of Actual/365. */
  readonly years?: number | null;
}

/** A window that cannot be put as a question; `field` is a path such as `flows[3].date`. */
export class InvalidWindow extends Error {
  override readonly name = 'InvalidWindow';
  constructor(
    readonly field: string,
    readonly detail: string,
  ) {
    super(`${field} ${detail}`);
  }
}

const LARGEST_YEARS = 200;

const shown = (value: unknown): string => {
  if (value === undefined) return 'is missing';
  const text = JSON.stringify(value) ?? String(value);
  return `is ${text.length > 40 ? `${text.slice(0, 37)}...` : text}`;
};

function day(value: unknown, field: string): number {
  const read = typeof value === 'string' ? readDay(value) : null;
  if (read === null) throw new InvalidWindow(field, `${shown(value)}; give an existing day such as "2026-09-30"`);
  return read;
}

function cents(value: unknown, field: string): number {
  if (!Number.isSafeInteger(value)) {
    throw new InvalidWindow(field, `${shown(value)}; give whole cents between -9007199254740991 and 9007199254740991`);
  }
  return (value as number) + 0;
}

/**
 * Checks that a value is a window and returns just its known fields.
 *
 * Units and conventions: money in whole cents, dates `YYYY-MM-DD`; balances hold at the end of their dates; flow dates lie after
 * `openedOn` and not after `closedOn`, in any order.
 * Domain: any value, as it comes out of `JSON.parse`.
 * Returns: the window; unknown fields are left out.
 * Throws: {@link InvalidWindow}, which names the first field at fault and says what to give instead.
 * Not guaranteed: that the window has a rate; that is for the solver to decide.
 * Complexity: linear in the flows.
 * Example: `readWindow({ openedOn: '2026-06-31' })` throws `openedOn is "2026-06-31"; give an existing day such as "2026-09-30"`.
 */
export function readWindow(value: unknown): WindowInput {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) {
    throw new InvalidWindow('window', `${shown(value)}; give an object`);
  }
  const given = value as Record<string, unknown>;
  const opened = day(given['openedOn'], 'openedOn');
  const closed = day(given['closedOn'], 'closedOn');
  if (closed < opened) {
    throw new InvalidWindow('closedOn', `${shown(given['closedOn'])}, before openedOn ${String(given['openedOn'])}`);
  }
  const openingCents = cents(given['openingCents'], 'openingCents');
  const closingCents = cents(given['closingCents'], 'closingCents');
  if (!Array.isArray(given['flows'])) {
    throw new InvalidWindow('flows', `${shown(given['flows'])}; give a list, [] when there are none`);
  }
  const flows = given['flows'].map((flow: unknown, index): Flow => {
    const field = `flows[${index}]`;
    if (typeof flow !== 'object' || flow === null || Array.isArray(flow)) {
      throw new InvalidWindow(field, `${shown(flow)}; give an object with date and cents`);
    }
    const { date, cents: amount } = flow as Record<string, unknown>;
    const on = day(date, `${field}.date`);
    if (on <= opened || on > closed) {
      throw new InvalidWindow(
        `${field}.date`,
        `${shown(date)}; it must lie after openedOn ${String(given['openedOn'])} and not after closedOn ${String(given['closedOn'])}`,
      );
    }
    return { date: date as string, cents: cents(amount, `${field}.cents`) };
  });
  const timing = given['timing'];
  if (!FLOW_TIMINGS.includes(timing as FlowTiming)) {
    throw new InvalidWindow('timing', `${shown(timing)}; give "start", "mid" or "end"`);
  }
  const years = given['years'] ?? null;
  if (years !== null && !(Number.isInteger(years) && (years as number) >= 0 && (years as number) <= LARGEST_YEARS)) {
    throw new InvalidWindow(
      'years',
      `${shown(years)}; give a whole number from 0 to ${LARGEST_YEARS}, or leave it out`,
    );
  }
  return {
    openedOn: given['openedOn'] as string,
    closedOn: given['closedOn'] as string,
    openingCents,
    closingCents,
    flows,
    timing: timing as FlowTiming,
    ...(years === null ? {} : { years: years as number }),
  };
}
