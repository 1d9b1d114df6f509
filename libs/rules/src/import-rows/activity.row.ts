import { ACTIVITY_KINDS, type ActivityKind, type CivilDate, type ImportRowError } from '@quarterpoise/dto';
import { nearMatch } from './near-match.js';
import { type RawRow, type RowContext, RowReader } from './row-reader.js';
import { rowError } from './row-error.js';
import { LONGEST } from './limits.js';

/** A transaction as the sender knows it: positive amounts, the kind gives the direction; earnings and adjustments are signed. */
export interface ActivityRow {
  readonly line: number;
  readonly action: 'load';
  readonly reference: string;
  readonly participantNumber: string;
  readonly effectiveOn: CivilDate;
  readonly postedOn: CivilDate;
  readonly kind: ActivityKind;
  /** The stored code of the kind. */
  readonly kindCode: number;
  readonly source: string;
  readonly fund: string;
  readonly amountCents: number;
  readonly groupReference: string | null;
}

/** Takes a reference back. Only the reference matters; an amount, where one stands, counts in the control total. */
export interface ActivityVoidRow {
  readonly line: number;
  readonly action: 'void';
  readonly reference: string;
  readonly amountCents: number;
}

const SIGNED_KINDS: ReadonlySet<ActivityKind> = new Set(['earnings', 'adjustment']);
const CODES: ReadonlyMap<string, number> = new Map(ACTIVITY_KINDS.map((kind, code) => [kind, code]));

/** Reads a row of an activity file, or tells everything that is wrong with it. */
export function parseActivityRow(row: RawRow, context: RowContext): ActivityRow | ActivityVoidRow | ImportRowError[] {
  const reader = new RowReader(row, context);
  const reference = reader.text('reference', LONGEST.reference);
  const action = (row.values['action'] ?? '').toLowerCase();
  if (action === 'void') {
    const amountCents = reader.optionalAmount('amount') ?? 0;
    return reader.errors.length > 0 ? reader.errors : { line: row.line, action, reference, amountCents };
  }
  if (action !== '') reader.fault('action', 'unknown-action');
  const participantNumber = reader.text('participant_number', LONGEST.participantNumber);
  const effectiveOn = reader.pastDate('effective_on', { from: context.recordsBeginOn, isBalance: false });
  const postedOn = reader.pastDate('posted_on', { from: null, isBalance: false });
  reader.inOrder('effective_on', effectiveOn, 'posted_on', postedOn);
  const kindCode = readKind(reader, row);
  const source = reader.text('source', LONGEST.code);
  const fund = reader.text('fund', LONGEST.code);
  const amountCents = reader.amount('amount');
  const groupReference = reader.optionalText('group', LONGEST.reference);
  const kind = kindCode === null ? undefined : ACTIVITY_KINDS[kindCode];
  if (amountCents !== null && amountCents < 0 && kind !== undefined && !SIGNED_KINDS.has(kind)) {
    reader.errors.push(rowError(reader.place('amount'), 'negative-amount', { isBalance: false }));
  }
  if (
    reader.errors.length > 0 ||
    effectiveOn === null ||
    postedOn === null ||
    kindCode === null ||
    kind === undefined ||
    amountCents === null
  ) {
    return reader.errors;
  }
  return {
    line: row.line,
    action: 'load',
    reference,
    participantNumber,
    effectiveOn,
    postedOn,
    kind,
    kindCode,
    source,
    fund,
    amountCents,
    groupReference,
  };
}

function readKind(reader: RowReader, row: RawRow): number | null {
  const value = row.values['kind'] ?? '';
  const code = CODES.get(value) ?? CODES.get(value.toLowerCase());
  if (code !== undefined) return code;
  if (value === '') reader.fault('kind', 'required');
  else {
    const near = nearMatch(value, ACTIVITY_KINDS);
    reader.errors.push(rowError(reader.place('kind'), 'unknown-kind', { near, choices: ACTIVITY_KINDS }));
  }
  return null;
}
