import type { EntityManager } from '@mikro-orm/postgresql';
import type { ResultData, ResultStatus } from '@quarterpoise/dto';
import { copyInto } from '../bulk/copy-into.js';

export interface NewResult {
  readonly accountId: string;
  readonly participantId: string;
  readonly status: ResultStatus;
  readonly reason: string | null;
  readonly openingCents: number | null;
  readonly closingCents: number | null;
  readonly gainCents: number | null;
  /** The printed percentage, or null where nothing may be printed. */
  readonly periodReturn: string | null;
  readonly firstEstimate: string | null;
  readonly inputSha256: Buffer;
  readonly data: ResultData;
}

export interface NewFlag {
  readonly accountId: string | null;
  readonly code: string;
  readonly severity: 'blocking' | 'review' | 'notice';
  readonly figures: Readonly<Record<string, string | number | null>>;
}

/** Hundredths of a percent of a printed percentage, for sorting; null beyond the safe integers. */
export function basisPointsOf(printed: string | null): number | null {
  if (printed === null) return null;
  const value = Number(printed.replace('.', ''));
  return Number.isSafeInteger(value) ? value : null;
}

/** Writes a slice's results: staged by COPY, inserted by one statement, so that the policies of the table hold. */
export async function writeResults(
  tx: EntityManager,
  run: { runId: string; planId: string },
  results: readonly NewResult[],
): Promise<void> {
  await tx.execute('create temporary table result_staging (like result) on commit drop');
  await copyInto(
    tx,
    'result_staging',
    {
      run_id: 'uuid',
      plan_id: 'uuid',
      account_id: 'uuid',
      participant_id: 'uuid',
      status: 'text',
      reason: 'text',
      opening_cents: 'bigint',
      closing_cents: 'bigint',
      gain_cents: 'bigint',
      period_return: 'text',
      period_return_bp: 'bigint',
      first_estimate: 'text',
      input_sha256: 'bytea',
      data: 'jsonb',
    },
    results.map((r) => [
      run.runId,
      run.planId,
      r.accountId,
      r.participantId,
      r.status,
      r.reason,
      r.openingCents,
      r.closingCents,
      r.gainCents,
      r.periodReturn,
      basisPointsOf(r.periodReturn),
      r.firstEstimate,
      r.inputSha256,
      r.data,
    ]),
  );
  await tx.execute('insert into result select * from result_staging');
}

/** Writes flags of a run; one of a code and account that is there already stays as it is. */
export async function writeFlags(
  tx: EntityManager,
  run: { runId: string; planId: string },
  flags: readonly NewFlag[],
): Promise<void> {
  if (flags.length === 0) return;
  await tx.execute(
    `insert into flag (run_id, plan_id, account_id, code, severity, figures)
     select ?::uuid, ?::uuid, f.account_id, f.code, f.severity, f.figures
     from jsonb_to_recordset(?::jsonb) as f (account_id uuid, code text, severity text, figures jsonb)
     on conflict do nothing`,
    [
      run.runId,
      run.planId,
      JSON.stringify(
        flags.map(({ accountId, code, severity, figures }) => ({ account_id: accountId, code, severity, figures })),
      ),
    ],
  );
}
