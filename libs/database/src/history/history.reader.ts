import { createHash } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import { to as copyTo } from 'pg-copy-streams';
import { BinaryArray, readBinaryRows, uuidOf } from '../bulk/binary-copy.js';
import { rawClient } from '../bulk/raw-client.js';

/** An account's whole history as of a ledger version; days count from 1970-01-01, money is whole cents. */
export interface StoredHistory {
  readonly activity: {
    readonly effectiveDay: Int32Array;
    readonly postedDay: Int32Array;
    readonly kind: Uint8Array;
    readonly cents: Float64Array;
    readonly ledgerVersion: Int32Array;
  };
  readonly balances: DatedCents;
  readonly loanNotes: DatedCents;
}

interface DatedCents {
  readonly day: Int32Array;
  readonly cents: Float64Array;
  readonly ledgerVersion: Int32Array;
}

export interface AccountRow {
  readonly accountId: string;
  readonly participantId: string;
  readonly history: StoredHistory;
  /** Of the stored bytes: equal histories have equal digests. */
  readonly sha256: Buffer;
}

/**
 * Reads the histories of the accounts `first` … `last` of a plan, in order of their ids, as they stood at a ledger version.
 * An account without any history yields empty arrays, so that a run can say why it was not computed.
 */
export async function* readHistories(
  tx: EntityManager,
  range: { planId: string; ledgerVersion: number; firstAccountId: string; lastAccountId: string },
): AsyncGenerator<AccountRow> {
  const client = await rawClient(tx);
  const literal = (value: string) => client.escapeLiteral(value);
  const arrays = ARRAY_COLUMNS.map((name) => `coalesce(h.${name}, '{}')`).join(', ');
  const stream = client.query(
    copyTo(`copy (
      select a.id, a.participant_id, ${arrays}
      from account a
      left join lateral (
        select * from account_history
        where account_id = a.id and ledger_version <= ${Math.trunc(range.ledgerVersion)}
        order by ledger_version desc limit 1
      ) h on true
      where a.plan_id = ${literal(range.planId)} and a.id between ${literal(range.firstAccountId)} and ${literal(range.lastAccountId)}
      order by a.id
    ) to stdout (format binary)`),
  );
  for await (const fields of readBinaryRows(stream)) {
    const [account, participant, ...columns] = fields as Buffer[];
    const digest = createHash('sha256');
    for (const column of columns) digest.update(column);
    yield {
      accountId: uuidOf(account!),
      participantId: uuidOf(participant!),
      history: toHistory(columns),
      sha256: digest.digest(),
    };
  }
}

const ARRAY_COLUMNS = [
  'activity_effective',
  'activity_posted',
  'activity_kind',
  'activity_cents',
  'activity_version',
  'balance_day',
  'balance_cents',
  'balance_version',
  'note_day',
  'note_cents',
  'note_version',
] as const;

function toHistory(columns: readonly Buffer[]): StoredHistory {
  const at = (name: (typeof ARRAY_COLUMNS)[number]) => new BinaryArray(columns[ARRAY_COLUMNS.indexOf(name)]!);
  const kind = at('activity_kind');
  return {
    activity: {
      effectiveDay: at('activity_effective').int32(),
      postedDay: at('activity_posted').int32(),
      kind: kind.int16(new Uint8Array(kind.length)),
      cents: at('activity_cents').int64AsCents(),
      ledgerVersion: at('activity_version').int32(),
    },
    balances: {
      day: at('balance_day').int32(),
      cents: at('balance_cents').int64AsCents(),
      ledgerVersion: at('balance_version').int32(),
    },
    loanNotes: {
      day: at('note_day').int32(),
      cents: at('note_cents').int64AsCents(),
      ledgerVersion: at('note_version').int32(),
    },
  };
}
