import { type Balances, lastNotAfter } from './balances.js';
import type { DailyFlows } from '../window/equation.js';

/** What is known of an account for the choice of openings; days since 1970-01-01. */
export interface Knowledge {
  readonly balances: Balances;
  /** Treated flows up to the close. */
  readonly flows: DailyFlows;
  readonly closesDay: number;
  /** The first day whose end-of-day balance may open a window: the eve of the records, or their first day where that is the one given. */
  readonly recordsOpenDay: number;
}

/** Where a window opens and with what; `cents` is null when it should be known and is not. */
export interface Opening {
  readonly day: number;
  readonly cents: number | null;
}

/** Index of the first flow after a day. */
export const firstAfter = (flows: DailyFlows, day: number): number => lastNotAfter(flows.days, day) + 1;

/**
 * The balance at the end of a day, or null when it is not known.
 *
 * Returns: the balance given for the day; 0 before the first sign of the account and between a balance of 0 and the next flow, since
 * files may leave out who has nothing.
 */
export function balanceAt({ balances, flows }: Pick<Knowledge, 'balances' | 'flows'>, day: number): number | null {
  const index = lastNotAfter(balances.days, day);
  if (index < 0) return firstAfter(flows, day) === 0 && flows.days.length > 0 ? 0 : null;
  if (balances.days[index] === day) return balances.cents[index]!;
  const isStillEmpty =
    balances.cents[index] === 0 && firstAfter(flows, balances.days[index]!) === firstAfter(flows, day);
  return isStillEmpty ? 0 : null;
}

/** The first day whose balance may open a window. */
export function recordsOpenDay(balances: Balances, recordsBeginDay: number): number {
  const isOnFirstDay = balances.days.includes(recordsBeginDay) && !balances.days.includes(recordsBeginDay - 1);
  return isOnFirstDay ? recordsBeginDay : recordsBeginDay - 1;
}

/**
 * Day of the flow that began the latest spell, after the account had stood at 0; null when it never did or nothing came after.
 * An account that is emptied and refilled between two known balances is not noticed.
 */
export function latestSpellDay({ balances, flows, closesDay }: Knowledge): number | null {
  for (let index = lastNotAfter(balances.days, closesDay - 1); index >= 0; index -= 1) {
    if (balances.cents[index] !== 0) continue;
    const next = firstAfter(flows, balances.days[index]!);
    if (next < flows.days.length) return flows.days[next]!;
  }
  return null;
}

/** Whether money was in the account before a spell began: then the spell is a rejoining. */
export function hadMoneyBefore({ balances, flows }: Knowledge, spellDay: number): boolean {
  return flows.days[0]! < spellDay || balances.days.some((day, index) => day < spellDay && balances.cents[index] !== 0);
}

/**
 * Where the window since joining opens: on the eve of the latest spell's first flow with nothing in the account, or with the first
 * balance of the records where the account is older than they are. Null when nothing is known of the account.
 */
export function sinceJoining(knowledge: Knowledge): Opening | null {
  const { balances, flows, closesDay, recordsOpenDay: recordsOpen } = knowledge;
  const spell = latestSpellDay(knowledge);
  if (spell !== null) return { day: spell - 1, cents: 0 };
  const first = balances.days.findIndex((day, index) => day >= recordsOpen && balances.cents[index] !== 0);
  const firstBalanceDay = first < 0 ? Infinity : balances.days[first]!;
  const firstFlowDay = flows.days[firstAfter(flows, recordsOpen)] ?? Infinity;
  if (firstBalanceDay < closesDay && (firstBalanceDay <= recordsOpen || firstBalanceDay < firstFlowDay)) {
    return { day: firstBalanceDay, cents: balances.cents[first]! };
  }
  return firstFlowDay === Infinity ? null : { day: firstFlowDay - 1, cents: 0 };
}

/** Whether the account had not begun at the end of a day: no flow, no money, but some later. */
export function joinedAfter({ balances, flows }: Knowledge, day: number): boolean {
  const hasEarlierFlow = firstAfter(flows, day) > 0;
  const hasEarlierMoney = balances.days.some((on, index) => on <= day && balances.cents[index] !== 0);
  return !hasEarlierFlow && !hasEarlierMoney && flows.days.length > 0;
}
