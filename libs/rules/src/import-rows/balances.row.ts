import type { CivilDate, ImportRowError } from '@quarterpoise/dto';
import { LONGEST } from './limits.js';
import { rowError } from './row-error.js';
import { type RawRow, type RowContext, RowReader } from './row-reader.js';

/** The fund name under which a loan's outstanding note stands. */
export const LOAN_NOTE = 'loan_note';

/** A balance at the end of a day. It may be negative: that is for the checks of the run to question, not for the file to hide. */
export interface BalanceRow {
  readonly line: number;
  readonly participantNumber: string;
  readonly asOf: CivilDate;
  /** May be empty for a loan note. */
  readonly source: string;
  readonly fund: string;
  readonly balanceCents: number;
  /** Earnings since the last balance, as the sender reports them. */
  readonly earningsCents: number | null;
}

/** Reads a row of a balances file, or tells everything that is wrong with it. */
export function parseBalanceRow(row: RawRow, context: RowContext): BalanceRow | ImportRowError[] {
  const reader = new RowReader(row, context);
  const participantNumber = reader.text('participant_number', LONGEST.participantNumber);
  const asOf = reader.pastDate('as_of', { from: context.recordsEve, isBalance: true });
  const fund = reader.text('fund', LONGEST.code);
  const source =
    fund === LOAN_NOTE ? (reader.optionalText('source', LONGEST.code) ?? '') : reader.text('source', LONGEST.code);
  const balanceCents = reader.amount('balance');
  const earningsCents = reader.optionalAmount('earnings');
  if (fund === LOAN_NOTE && balanceCents !== null && balanceCents < 0) {
    reader.errors.push(rowError(reader.place('balance'), 'negative-amount', { isBalance: true }));
  }
  if (reader.errors.length > 0 || asOf === null || balanceCents === null) return reader.errors;
  return { line: row.line, participantNumber, asOf, source, fund, balanceCents, earningsCents };
}
