import { dietz } from '../estimate/first-estimate.js';
import { toAnswer } from '../solve/outcome.js';
import { annualRuleOf, solveEquation } from '../solve/solve-window.js';
import type { Close } from '../treatments/flow-day.js';
import type { WindowCode } from '../treatments/return-policy.js';
import { dayNumber, isoDate, isQuarterEnd } from '../window/civil-date.js';
import { equationOf } from '../window/equation.js';
import type { AccountContext, AccountHistory, AccountResult, ResultWindow, UnavailableReason } from './account.js';
import { type Balances, balancesInForce, lastNotAfter } from './balances.js';
import * as opening from './opening.js';
import { nominalSpan } from './spans.js';
import { treatHistory } from './treat-history.js';

/**
 * Every window of one account at a quarter's close, from its whole history, under one policy.
 *
 * Units and conventions: columns of days since 1970-01-01 and whole cents; balances hold at the end of their days; amounts as the
 * files give them (the kind gives the direction), reversals negated.
 * Domain: any history; empty columns too.
 * Returns: the windows of the policy in its order, each computed or unavailable with its reason; the quarter's movements, which add
 * up from opening to closing with the gain as what is left over (fees, forfeitures and, as flows, adjustments stand apart from the
 * gain whether or not they lower the return); the treated flows of the longest window; the balances at quarter ends. An opening
 * balance that is not known is never guessed. Solving the window that `windowOf` rebuilds gives the same answer, figure for figure.
 * Throws: RangeError for an unknown kind or a date that is none; InvalidWindow when amounts exceed 2^53 − 1 cents.
 * Not guaranteed: notice of an account emptied and refilled between two known balances.
 * Complexity: one pass over the history and one solution per window, each linear in the window's flows.
 * Source: common practice, no source, for the choice of windows and openings.
 */
export function computeAccount(history: AccountHistory, context: AccountContext): AccountResult {
  const { policy, closesOn } = context;
  const opensDay = dayNumber(context.opensOn);
  const closesDay = dayNumber(closesOn);
  const balances = balancesInForce(history, policy.loans === 'inside');
  const closes = closesOf(context, balances, closesDay);
  const { flows, movements } = treatHistory(history.activity, policy, closes, opensDay, closesDay);
  const knowledge: opening.Knowledge = {
    balances,
    flows,
    closesDay,
    recordsOpenDay: opening.recordsOpenDay(balances, dayNumber(context.recordsBeginOn)),
  };
  const closingCents = opening.balanceAt(knowledge, closesDay);
  const spellDay = opening.latestSpellDay(knowledge);
  const rejoinedDay = spellDay !== null && opening.hadMoneyBefore(knowledge, spellDay) ? spellDay : null;

  const computeWindow = (code: WindowCode): ResultWindow => {
    const plan = planWindow(code, knowledge, context, opensDay, rejoinedDay);
    const window: ResultWindow = {
      code,
      availability: 'unavailable',
      reason: null,
      openedOn: isoDate(plan.openedDay),
      closedOn: closesOn,
      openingCents: plan.openingCents,
      closingCents,
      years: plan.years,
      answer: null,
    };
    if (closingCents === null) return { ...window, reason: 'closing-balance-missing' };
    if (plan.openingCents === null) return { ...window, reason: plan.reason };
    const equation = equationOf({
      openedDay: plan.openedDay,
      closedDay: closesDay,
      openingCents: plan.openingCents,
      closingCents,
      days: flows.days,
      cents: flows.cents,
      from: opening.firstAfter(flows, plan.openedDay),
      to: flows.days.length,
      timing: policy.flowTiming,
    });
    const answer = toAnswer(solveEquation(equation, annualRuleOf(window)));
    if (answer.status !== 'solved' && answer.status !== 'total-loss')
      return { ...window, answer, reason: answer.status };
    const smallest = policy.smallestAverageCapitalCents * equation.halfDays;
    const { capitalCentHalfDays } = dietz(equation);
    const isTooSmall = capitalCentHalfDays <= 0 || capitalCentHalfDays < smallest;
    return isTooSmall
      ? { ...window, answer, reason: 'capital-too-small' }
      : { ...window, answer, availability: 'computed' };
  };

  const windows = policy.windows.map(computeWindow);
  const quarter = windows.find(({ code }) => code === 'quarter') ?? computeWindow('quarter');
  const isKnown = quarter.openingCents !== null && quarter.closingCents !== null;
  const gainCents = isKnown ? gainOf(quarter, movements) : null;
  const isComputed = quarter.availability === 'computed';
  return {
    ...statusOf(quarter),
    openingCents: quarter.openingCents,
    closingCents: quarter.closingCents,
    gainCents,
    periodReturn: isComputed ? (quarter.answer?.periodReturnPct ?? null) : null,
    firstEstimate: quarter.answer?.firstEstimatePct ?? null,
    rejoinedOn: rejoinedDay === null ? null : isoDate(rejoinedDay),
    data: {
      flowTiming: policy.flowTiming,
      windows,
      movements: gainCents === null ? null : { ...movements, gain: gainCents },
      flows: keptFlows(flows, [...windows, quarter]),
      values: quarterEndValues(balances, closesDay),
    },
  };
}

/** The published closes and, unless it is one of them, the close in hand, with the balance in force at each. */
function closesOf(context: AccountContext, balances: Balances, closesDay: number): Close[] {
  const closes = context.publishedCloses.map(({ day, ledgerVersion }) => ({ day, ledgerVersion }));
  if (!closes.some(({ day }) => day === closesDay)) closes.push({ day: closesDay, ledgerVersion: Infinity });
  return closes.map((close) => {
    const index = lastNotAfter(balances.days, close.day);
    const isOnDay = index >= 0 && balances.days[index] === close.day;
    return { ...close, balanceVersion: isOnDay ? balances.versions[index]! : -Infinity };
  });
}

interface WindowPlan {
  readonly openedDay: number;
  readonly openingCents: number | null;
  readonly years: number | null;
  /** Why the opening is null. */
  readonly reason: UnavailableReason | null;
}

/** Where a window opens for this account, or why it cannot. */
function planWindow(
  code: WindowCode,
  knowledge: opening.Knowledge,
  { closesOn, policy, recordsBeginOn }: AccountContext,
  opensDay: number,
  rejoinedDay: number | null,
): WindowPlan {
  if (code === 'since_joining') {
    const joined = opening.sinceJoining(knowledge);
    if (joined !== null) return { openedDay: joined.day, openingCents: joined.cents, years: null, reason: null };
    const openedDay = Math.min(dayNumber(recordsBeginOn) - 1, knowledge.closesDay);
    return { openedDay, openingCents: null, years: null, reason: 'opening-balance-missing' };
  }
  const { openedDay, years } = nominalSpan(code, opensDay, closesOn, policy);
  if (policy.emptiedAndRefilled === 'latest_spell' && rejoinedDay !== null && rejoinedDay - 1 > openedDay) {
    // What is left of a window of several years is no longer whole years.
    const rule = years !== null && years >= 2 ? null : years;
    return { openedDay: rejoinedDay - 1, openingCents: 0, years: rule, reason: null };
  }
  const unavailable = (reason: UnavailableReason): WindowPlan => ({ openedDay, openingCents: null, years, reason });
  const hasJoinedLater = opening.joinedAfter(knowledge, openedDay);
  if (openedDay < knowledge.recordsOpenDay) {
    const wasThere = !opening.joinedAfter(knowledge, knowledge.recordsOpenDay);
    if (!hasJoinedLater || wasThere) return unavailable('records-begin-later');
  }
  const isLong = code !== 'quarter' && code !== 'year_to_date';
  if (hasJoinedLater && isLong) return unavailable('joined-later');
  const openingCents = opening.balanceAt(knowledge, openedDay);
  return openingCents === null
    ? unavailable('opening-balance-missing')
    : { openedDay, openingCents, years, reason: null };
}

/** What is left over when every listed movement is taken from the change of the balance. */
function gainOf(quarter: ResultWindow, movements: Record<string, number>): number {
  let gain = quarter.closingCents! - quarter.openingCents!;
  for (const amount of Object.values(movements)) gain -= amount;
  return gain;
}

function statusOf(quarter: ResultWindow): Pick<AccountResult, 'status' | 'reason'> {
  if (quarter.answer === null || quarter.reason === 'capital-too-small') {
    return { status: 'not-computed', reason: quarter.reason };
  }
  return { status: quarter.answer.status, reason: quarter.answer.reason };
}

function keptFlows(
  flows: { days: number[]; cents: number[] },
  windows: readonly ResultWindow[],
): AccountResult['data']['flows'] {
  const opened = windows.filter(({ answer }) => answer !== null).map(({ openedOn }) => openedOn);
  if (opened.length === 0) return { dates: [], cents: [] };
  const earliest = opened.reduce((first, date) => (date < first ? date : first));
  const from = lastNotAfter(flows.days, dayNumber(earliest)) + 1;
  return { dates: flows.days.slice(from).map(isoDate), cents: flows.cents.slice(from) };
}

function quarterEndValues(balances: Balances, closesDay: number): AccountResult['data']['values'] {
  const dates: string[] = [];
  const cents: number[] = [];
  balances.days.forEach((day, index) => {
    if (day > closesDay || !isQuarterEnd(day)) return;
    dates.push(isoDate(day));
    cents.push(balances.cents[index]!);
  });
  return { dates, cents };
}
