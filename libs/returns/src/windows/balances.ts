import type { AccountHistory, BalanceColumns } from './account.js';

/** Balances in force, by day, oldest first. */
export interface Balances {
  readonly days: number[];
  readonly cents: number[];
  readonly versions: number[];
}

/**
 * Balances in force: the newest version of each day, with the loan note of the same day added where loans are inside.
 *
 * Units: days since 1970-01-01, whole cents. Domain: columns of equal length, rows in any order.
 * Returns: one balance per day, oldest first. A day with a note but no other balance is a day with that balance; a day with a balance
 * and no note has no note outstanding, since a balances file that holds the account holds its note.
 * Complexity: n log n in the balances, linear when they come sorted.
 */
export function balancesInForce(history: Pick<AccountHistory, 'balances' | 'loanNotes'>, withNotes: boolean): Balances {
  const plain = newest(history.balances);
  if (!withNotes || history.loanNotes.day.length === 0) return plain;
  const notes = newest(history.loanNotes);
  const both: Balances = { days: [], cents: [], versions: [] };
  for (let left = 0, right = 0; left < plain.days.length || right < notes.days.length;) {
    const plainDay = plain.days[left] ?? Infinity;
    const noteDay = notes.days[right] ?? Infinity;
    const day = Math.min(plainDay, noteDay);
    both.days.push(day);
    both.cents.push((plainDay === day ? plain.cents[left]! : 0) + (noteDay === day ? notes.cents[right]! : 0));
    both.versions.push(
      Math.max(
        plainDay === day ? plain.versions[left]! : -Infinity,
        noteDay === day ? notes.versions[right]! : -Infinity,
      ),
    );
    if (plainDay === day) left += 1;
    if (noteDay === day) right += 1;
  }
  return both;
}

function newest({ day, cents, ledgerVersion }: BalanceColumns): Balances {
  const order = Array.from(day, (_, index) => index);
  order.sort((a, b) => day[a]! - day[b]! || ledgerVersion[a]! - ledgerVersion[b]!);
  const kept: Balances = { days: [], cents: [], versions: [] };
  for (const index of order) {
    const last = kept.days.length - 1;
    const at = last >= 0 && kept.days[last] === day[index] ? last : last + 1;
    kept.days[at] = day[index]!;
    kept.cents[at] = cents[index]!;
    kept.versions[at] = ledgerVersion[index]!;
  }
  return kept;
}

/** Index of the last balance not after a day; −1 when there is none. */
export function lastNotAfter(days: readonly number[], day: number): number {
  let low = 0;
  let high = days.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if (days[middle]! <= day) low = middle + 1;
    else high = middle;
  }
  return low - 1;
}
