import { addYears, type Answer, dayNumber, isoDate, solveWindow, toAnswer, type WindowInput } from '../src/index.js';

/** A dated amount as an investor sees it, the way spreadsheets take them: − is paid in, + is paid out. */
export type DatedAmount = readonly [date: string, amount: number];

/** Puts dated amounts as a window: what is paid in first opens it, what is paid out last closes it. `scale` makes amounts whole. */
export function windowOfInvestor(amounts: readonly DatedAmount[], scale = 100): WindowInput {
  const dates = amounts.map(([date]) => date).toSorted();
  const openedOn = dates[0]!;
  const closedOn = dates[dates.length - 1]!;
  const whole = (amount: number): number => Math.round(amount * scale);
  const sumOn = (date: string): number =>
    amounts.filter(([on]) => on === date).reduce((sum, [, amount]) => sum + whole(amount), 0);
  return {
    openedOn,
    closedOn,
    openingCents: -sumOn(openedOn) + 0,
    closingCents: openedOn === closedOn ? 0 : sumOn(closedOn),
    flows: amounts
      .filter(([date]) => date !== openedOn && date !== closedOn)
      .map(([date, amount]) => ({ date, cents: -whole(amount) + 0 })),
    timing: 'end',
  };
}

/** Amounts at equal periods of `days` days. */
export function periodic(amounts: readonly number[], days = 1, times?: readonly number[]): DatedAmount[] {
  const start = dayNumber('2001-01-01');
  return amounts.map(
    (amount, index) => [isoDate(start + Math.round((times?.[index] ?? index) * days)), amount] as const,
  );
}

export const answerOf = (window: WindowInput): Answer => toAnswer(solveWindow(window));

/** Rates per `days` days of every root. */
export function ratesOf(answer: Answer, days: number): number[] {
  return answer.roots.map((root) => Math.expm1((Math.log(Number(root)) * days) / answer.spanDays!));
}

/** A deposit each month on the day of `first`, `count` times. */
export function monthly(first: string, count: number, amount: number): DatedAmount[] {
  const [year, month, day] = first.split('-').map(Number) as [number, number, number];
  return Array.from({ length: count }, (_, index) => {
    const months = month - 1 + index;
    const at = addYears(`2000-${String((months % 12) + 1).padStart(2, '0')}-${String(day).padStart(2, '0')}`, 0);
    return [`${year + Math.floor(months / 12)}${at.slice(4)}`, amount] as const;
  });
}
