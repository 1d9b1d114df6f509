import {
  ACTIVITY_KINDS,
  type AccountHistory,
  type ActivityKind,
  type BalanceColumns,
  dayNumber,
} from '../src/index.js';

export interface ActivityRow {
  readonly kind: ActivityKind;
  readonly cents: number;
  readonly on: string;
  /** Posting date, where it is another. */
  readonly posted?: string;
  readonly version?: number;
}

export type BalanceRow = readonly [on: string, cents: number, version?: number];

const columns = (rows: readonly BalanceRow[]): BalanceColumns => ({
  day: Int32Array.from(rows, ([on]) => dayNumber(on)),
  cents: Float64Array.from(rows, ([, cents]) => cents),
  ledgerVersion: Int32Array.from(rows, ([, , version]) => version ?? 1),
});

/** A history in columns from rows that can be read. */
export function historyOf(
  activity: readonly ActivityRow[],
  balances: readonly BalanceRow[],
  loanNotes: readonly BalanceRow[] = [],
): AccountHistory {
  return {
    activity: {
      effectiveDay: Int32Array.from(activity, ({ on }) => dayNumber(on)),
      postedDay: Int32Array.from(activity, ({ on, posted }) => dayNumber(posted ?? on)),
      kind: Uint8Array.from(activity, ({ kind }) => ACTIVITY_KINDS.indexOf(kind)),
      cents: Float64Array.from(activity, ({ cents }) => cents),
      ledgerVersion: Int32Array.from(activity, ({ version }) => version ?? 1),
    },
    balances: columns(balances),
    loanNotes: columns(loanNotes),
  };
}
