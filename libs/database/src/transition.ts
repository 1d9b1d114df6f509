import type { EntityManager } from '@mikro-orm/postgresql';
import type { ImportState, InquiryState, QuarterState, RunState } from '@quarterpoise/dto';
import { checkMove, IMPORT_MACHINE, INQUIRY_MACHINE, QUARTER_MACHINE, RUN_MACHINE } from '@quarterpoise/rules';
import { type AuditFact, recordAudit } from './audit/audit.writer.js';

/** Everything that has states, with the table that keeps them and the machine that rules them. */
const SUBJECTS = {
  quarter: { table: 'quarter', machine: QUARTER_MACHINE },
  run: { table: 'run', machine: RUN_MACHINE },
  import: { table: 'import', machine: IMPORT_MACHINE },
  inquiry: { table: 'inquiry', machine: INQUIRY_MACHINE },
} as const;

interface StateOf {
  quarter: QuarterState;
  run: RunState;
  import: ImportState;
  inquiry: InquiryState;
}

/** The state machine does not allow this move; nothing was written. */
export class IllegalMove extends Error {
  override readonly name = 'IllegalMove';
  constructor(
    readonly subject: keyof StateOf,
    readonly from: string,
    readonly to: string,
    readonly reason: string,
  ) {
    super(reason);
  }
}

/** The row does not exist, or is not in the scope. */
export class SubjectNotFound extends Error {
  override readonly name = 'SubjectNotFound';
}

/** Locks a row until the end of the transaction and tells its state. */
export async function lockState<S extends keyof StateOf>(
  tx: EntityManager,
  subject: S,
  id: string,
): Promise<StateOf[S]> {
  const [row] = await tx.execute<{ state: StateOf[S] }[]>(
    `select state from ${SUBJECTS[subject].table} where id = ? for update`,
    [id],
  );
  if (!row) throw new SubjectNotFound(`There is no ${subject} ${id} in scope`);
  return row.state;
}

/**
 * The only way to another state: locks the row, asks the machine, writes state and audit in the caller's transaction.
 * `set` holds further columns that belong to the move (raw names and values).
 * @returns The state that was left.
 * @throws IllegalMove with the reason; SubjectNotFound when the row is out of scope.
 */
export async function transition<S extends keyof StateOf>(
  tx: EntityManager,
  subject: S,
  id: string,
  to: StateOf[S],
  move: { set?: Readonly<Record<string, unknown>>; audit?: AuditFact } = {},
): Promise<StateOf[S]> {
  const from = await lockState(tx, subject, id);
  const refusal = checkMove(SUBJECTS[subject].machine, from, to);
  if (refusal) throw new IllegalMove(subject, from, to, refusal.reason);
  const columns = Object.entries(move.set ?? {});
  await tx.execute(
    `update ${SUBJECTS[subject].table} set ${['state = ?', ...columns.map(([name]) => `${name} = ?`)].join(', ')} where id = ?`,
    [to, ...columns.map(([, value]) => value), id],
  );
  if (move.audit) await recordAudit(tx, { ...move.audit, details: { from, to, ...move.audit.details } });
  return from;
}
