import { type ActivityKind, returnPolicy, type ReturnPolicyOptions } from '@quarterpoise/dto';
import { ACTIVITY_KINDS, computeAccount, dayNumber } from '@quarterpoise/returns';
import type { AccountCheckInput } from '../check.js';

export interface AccountSketch {
  /** Balances by day, in cents. */
  readonly balances?: Readonly<Record<string, number>>;
  readonly activity?: readonly (readonly [on: string, kind: ActivityKind, cents: number])[];
  readonly publishedClosingCents?: number;
  readonly policy?: Partial<ReturnPolicyOptions>;
}

/** What the checks see of an account in the third quarter of 2026, computed as a run does. Untouched, it earned 2 %. */
export function accountCheckInput(sketch: AccountSketch = {}): AccountCheckInput {
  const policy = { ...returnPolicy.parse({}), ...sketch.policy };
  const balances = Object.entries(sketch.balances ?? { '2026-06-30': 1_000_000, '2026-09-30': 1_020_000 });
  const activity = sketch.activity ?? [];
  const opensOn = '2026-06-30';
  const closesOn = '2026-09-30';
  const none = { day: new Int32Array(), cents: new Float64Array(), ledgerVersion: new Int32Array() };
  const result = computeAccount(
    {
      activity: {
        effectiveDay: Int32Array.from(activity, ([on]) => dayNumber(on)),
        postedDay: Int32Array.from(activity, ([on]) => dayNumber(on)),
        kind: Uint8Array.from(activity, ([, kind]) => ACTIVITY_KINDS.indexOf(kind)),
        cents: Float64Array.from(activity, ([, , cents]) => cents),
        ledgerVersion: new Int32Array(activity.length).fill(1),
      },
      balances: {
        day: Int32Array.from(balances, ([on]) => dayNumber(on)),
        cents: Float64Array.from(balances, ([, cents]) => cents),
        ledgerVersion: new Int32Array(balances.length).fill(1),
      },
      loanNotes: none,
    },
    { opensOn, closesOn, policy, recordsBeginOn: '2019-07-01', publishedCloses: [] },
  );
  return { result, opensOn, closesOn, publishedClosingCents: sketch.publishedClosingCents ?? null, policy };
}
