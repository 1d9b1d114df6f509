import { flowDay, type Close } from '../treatments/flow-day.js';
import type { ReturnPolicy } from '../treatments/return-policy.js';
import { type Treatment, treatmentsOf } from '../treatments/treatments.js';
import { type DailyFlows, mergeByDay } from '../window/equation.js';
import type { AccountHistory, Movements } from './account.js';

/** A history under a policy: its flows up to the close, and the quarter's movements but for the gain. */
export interface TreatedHistory {
  readonly flows: DailyFlows;
  readonly movements: Omit<Movements, 'gain'>;
}

const treatmentsByPolicy = new WeakMap<ReturnPolicy, readonly Treatment[]>();

function treatmentsFor(policy: ReturnPolicy): readonly Treatment[] {
  const known = treatmentsByPolicy.get(policy);
  if (known !== undefined) return known;
  const made = treatmentsOf(policy);
  treatmentsByPolicy.set(policy, made);
  return made;
}

/** One pass over the rows: each is given its day and its meaning, once. */
export function treatHistory(
  activity: AccountHistory['activity'],
  policy: ReturnPolicy,
  closes: readonly Close[],
  opensDay: number,
  closesDay: number,
): TreatedHistory {
  const treatments = treatmentsFor(policy);
  const { effectiveDay, postedDay, kind, cents, ledgerVersion } = activity;
  const days: number[] = [];
  const amounts: number[] = [];
  const movements = {
    employee: 0,
    employer: 0,
    rolloversIn: 0,
    loanRepayments: 0,
    withdrawals: 0,
    loansIssued: 0,
    forfeitures: 0,
    fees: 0,
    adjustments: 0,
  };
  for (let row = 0; row < kind.length; row += 1) {
    const treatment = treatments[kind[row]!];
    if (treatment === undefined)
      throw new RangeError(`activity.kind[${row}] is ${kind[row]}, which is no kind of activity`);
    if (treatment.line === null) continue;
    const day = flowDay(policy, effectiveDay[row]!, postedDay[row]!, ledgerVersion[row]!, closes);
    if (day > closesDay) continue;
    const amount = treatment.direction * cents[row]!;
    if (day > opensDay) movements[treatment.line] += amount;
    if (treatment.isFlow) {
      days.push(day);
      amounts.push(amount);
    }
  }
  return { flows: mergeByDay(days, amounts), movements };
}
