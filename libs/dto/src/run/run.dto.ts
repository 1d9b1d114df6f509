import { z } from 'zod';
import { civilDate } from '../civil-date.js';
import { cents } from '../money.js';
import { windowCode } from '../plan/return-policy.dto.js';

export const RUN_STATES = ['queued', 'computing', 'completed', 'failed', 'cancelled'] as const;
export const runState = z.enum(RUN_STATES);
export type RunState = z.infer<typeof runState>;

/** How a single rate came out; `not-computed` when the data did not allow the question to be put. */
export const resultStatus = z.enum(['solved', 'ambiguous', 'total-loss', 'no-solution', 'no-capital', 'not-computed']);
export type ResultStatus = z.infer<typeof resultStatus>;

/** The answer of the solver, as `npm run solve` prints it; percentages have two decimals. */
export const answer = z.object({
  status: resultStatus.exclude(['not-computed']),
  periodReturnPct: z.string().nullable(),
  annualReturnPct: z.string().nullable(),
  firstEstimatePct: z.string().nullable(),
  factorLow: z.string().nullable(),
  factorHigh: z.string().nullable(),
  roots: z.array(z.string()),
  spanDays: z.number().nullable(),
  iterations: z.int().nullable(),
  reason: z.string().nullable(),
});
export type Answer = z.infer<typeof answer>;

/** One printed window of a result: computed, or unavailable with the reason; openings and closings are null where unknown. */
export const resultWindow = z.object({
  code: windowCode,
  availability: z.enum(['computed', 'unavailable']),
  reason: z.string().nullable(),
  openedOn: civilDate,
  closedOn: civilDate,
  openingCents: cents.nullable(),
  closingCents: cents.nullable(),
  years: z.int().nullable(),
  answer: answer.nullable(),
});
export type ResultWindow = z.infer<typeof resultWindow>;

/** How the opening balance became the closing one; every amount is signed as it moves the balance, and they add up. */
export const movements = z.object({
  employee: cents,
  employer: cents,
  rolloversIn: cents,
  loanRepayments: cents,
  withdrawals: cents,
  loansIssued: cents,
  forfeitures: cents,
  fees: cents,
  adjustments: cents,
  /** What is left over: the gain or loss. */
  gain: cents,
});
export type Movements = z.infer<typeof movements>;

/** Everything that a run keeps of one account. Flows are those of the longest window, treated by the policy; + is into the account. */
export const resultData = z.object({
  flowTiming: z.enum(['start', 'mid', 'end']),
  windows: z.array(resultWindow),
  movements: movements.nullable(),
  flows: z.object({ dates: z.array(civilDate), cents: z.array(cents) }),
  /** Balances at the ends of earlier quarters, for the picture over time. */
  values: z.object({ dates: z.array(civilDate), cents: z.array(cents) }),
});
export type ResultData = z.infer<typeof resultData>;

export const runTotals = z.object({
  openingCents: cents,
  closingCents: cents,
  gainCents: cents,
  netFlowCents: cents,
  solved: z.int(),
  notComputed: z.int(),
  /** Count of accounts by status. */
  byStatus: z.record(z.string(), z.int()),
  /** Distribution of the quarter's returns: lower bound of each bin in percent and the count; bins are one percentage point wide. */
  distribution: z.array(z.object({ fromPct: z.number(), count: z.int() })),
  /** The totals that must tie to something independent of the run. */
  ties: z.array(
    z.object({
      code: z.enum(['closing-to-control-total', 'opening-to-last-published', 'gain-to-reported-earnings']),
      expectedCents: cents,
      foundCents: cents,
      tied: z.boolean(),
      checked: z.boolean(),
    }),
  ),
});
export type RunTotals = z.infer<typeof runTotals>;

export const runSummary = z.object({
  id: z.uuid(),
  quarterId: z.uuid(),
  planId: z.uuid(),
  isRehearsal: z.boolean(),
  state: runState,
  accountCount: z.int(),
  doneCount: z.int(),
  flagCount: z.int(),
  undecidedFlagCount: z.int(),
  ledgerVersion: z.int(),
  policyVersion: z.int(),
  engineVersion: z.string(),
  startedByName: z.string(),
  startedVia: z.enum(['page', 'terminal', 'api_key']),
  startedAt: z.iso.datetime(),
  finishedAt: z.iso.datetime().nullable(),
  failure: z.string().nullable(),
  resultsSha256: z.string().nullable(),
  totals: runTotals.nullable(),
});
export type RunSummary = z.infer<typeof runSummary>;

/** Event `progress` of a run's stream. */
export const runProgress = z.object({
  state: runState,
  accountCount: z.int(),
  doneCount: z.int(),
  flagCount: z.int(),
  notComputedCount: z.int(),
  accountsPerSecond: z.number(),
  secondsLeft: z.number().nullable(),
});
export type RunProgress = z.infer<typeof runProgress>;

export const resultRow = z.object({
  accountId: z.uuid(),
  participantNumber: z.string(),
  name: z.string(),
  status: resultStatus,
  reason: z.string().nullable(),
  openingCents: cents.nullable(),
  closingCents: cents.nullable(),
  gainCents: cents.nullable(),
  periodReturnPct: z.string().nullable(),
  firstEstimatePct: z.string().nullable(),
  flagCodes: z.array(z.string()),
});
export type ResultRow = z.infer<typeof resultRow>;
