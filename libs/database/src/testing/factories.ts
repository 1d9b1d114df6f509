import type { Client } from 'pg';
import { DEFAULT_POLICY_OPTIONS } from '../plan/default-policy.js';

let serial = 0;
const next = () => (serial += 1);

/** Builders of rows, each with sensible defaults and unique names; they write as the owner and return ids. */
export class Factory {
  constructor(private readonly owner: Client) {}

  async sponsor(values: { code?: string; name?: string } = {}): Promise<string> {
    const n = next();
    return this.id('insert into sponsor (code, name) values ($1, $2) returning id', [
      values.code ?? `SPONSOR-${n}`,
      values.name ?? `Sponsor ${n}`,
    ]);
  }

  async plan(values: { sponsorId?: string; code?: string; recordsBeginOn?: string } = {}): Promise<string> {
    const n = next();
    const sponsorId = values.sponsorId ?? (await this.sponsor());
    const planId = await this.id(
      'insert into plan (sponsor_id, code, name, records_begin_on) values ($1, $2, $3, $4) returning id',
      [sponsorId, values.code ?? `PLAN-${n}`, `Plan ${n}`, values.recordsBeginOn ?? '2018-10-01'],
    );
    await this.owner.query(`insert into plan_fund (plan_id, code, name) values ($1, 'LARCH', 'Larch Balanced')`, [
      planId,
    ]);
    return planId;
  }

  async policy(planId: string, options: object = {}, madeBy: string | null = null): Promise<string> {
    return this.id(
      `insert into return_policy_version (plan_id, version, effective_from, options, made_by)
       values ($1, (select coalesce(max(version), 0) + 1 from return_policy_version where plan_id = $1), '2018-12-31', $2, $3) returning id`,
      [planId, JSON.stringify({ ...DEFAULT_POLICY_OPTIONS, ...options }), madeBy],
    );
  }

  async person(
    values: {
      email?: string;
      displayName?: string;
      role?: string;
      sponsorId?: string;
      planId?: string;
      passwordHash?: string;
    } = {},
  ): Promise<string> {
    const n = next();
    const personId = await this.id('insert into person (email, display_name) values ($1, $2) returning id', [
      values.email ?? `person-${n}@example.test`,
      values.displayName ?? `Person ${n}`,
    ]);
    if (values.passwordHash) {
      await this.owner.query('insert into person_credential (person_id, password_hash) values ($1, $2)', [
        personId,
        values.passwordHash,
      ]);
    }
    if (values.role) await this.role(personId, values.role, values);
    return personId;
  }

  async role(personId: string, role: string, on: { sponsorId?: string; planId?: string } = {}): Promise<void> {
    await this.owner.query(
      'insert into role_assignment (person_id, role, sponsor_id, plan_id) values ($1, $2, $3, $4)',
      [personId, role, on.planId ? null : (on.sponsorId ?? null), on.planId ?? null],
    );
  }

  /** A participant with one account; `claimedBy` joins them to a person's sign-in. */
  async participant(
    planId: string,
    values: { number?: string; givenName?: string; familyName?: string; email?: string; claimedBy?: string } = {},
  ): Promise<{ participantId: string; accountId: string }> {
    const n = next();
    const participantId = await this.id(
      `insert into participant (plan_id, participant_number, given_name, family_name, email, delivery)
       values ($1, $2, $3, $4, $5, 'email') returning id`,
      [
        planId,
        values.number ?? `N${String(n).padStart(5, '0')}`,
        values.givenName ?? 'Ada',
        values.familyName ?? `Alder ${n}`,
        values.email ?? `member-${n}@example.test`,
      ],
    );
    const accountId = await this.id('insert into account (plan_id, participant_id) values ($1, $2) returning id', [
      planId,
      participantId,
    ]);
    if (values.claimedBy) {
      await this.owner.query('insert into participant_claim (participant_id, plan_id, person_id) values ($1, $2, $3)', [
        participantId,
        planId,
        values.claimedBy,
      ]);
    }
    return { participantId, accountId };
  }

  async quarter(planId: string, values: { opensOn?: string; closesOn?: string; state?: string } = {}): Promise<string> {
    const state = values.state ?? 'collecting';
    return this.id(
      `insert into quarter (plan_id, opens_on, closes_on, state, due_on, published_at)
       values ($1, $2, $3::date, $4, $3::date + 45, $5) returning id`,
      [
        planId,
        values.opensOn ?? '2026-06-30',
        values.closesOn ?? '2026-09-30',
        state,
        state === 'published' ? '2026-11-01T00:00:00Z' : null,
      ],
    );
  }

  /** A ledger version made outside of imports. */
  async ledgerVersion(planId: string): Promise<number> {
    const { rows } = await this.owner.query<{ ledger_version: number }>(
      'update plan set ledger_version = ledger_version + 1 where id = $1 returning ledger_version',
      [planId],
    );
    const version = rows[0]!.ledger_version;
    await this.owner.query(`insert into ledger_version (plan_id, version, reason) values ($1, $2, 'seed')`, [
      planId,
      version,
    ]);
    return version;
  }

  /** Postings and balances of one account under a new ledger version, with the history rebuilt. Kinds are stored codes. */
  async ledger(
    planId: string,
    accountId: string,
    rows: {
      activity?: readonly { on: string; postedOn?: string; kind: number; cents: number; reference?: string }[];
      balances?: readonly { on: string; cents: number; fund?: string }[];
    },
  ): Promise<number> {
    const version = await this.ledgerVersion(planId);
    for (const row of rows.activity ?? []) {
      await this.owner.query(
        `insert into activity (plan_id, account_id, reference, effective_on, posted_on, kind, source, fund, amount_cents, ledger_version)
         values ($1, $2, $3, $4, $5, $6, 'employee', 'LARCH', $7, $8)`,
        [
          planId,
          accountId,
          row.reference ?? `R${next()}`,
          row.on,
          row.postedOn ?? row.on,
          row.kind,
          row.cents,
          version,
        ],
      );
    }
    for (const row of rows.balances ?? []) {
      await this.owner.query(
        `insert into balance (plan_id, account_id, as_of, source, fund, balance_cents, ledger_version)
         values ($1, $2, $3, 'employee', $4, $5, $6)`,
        [planId, accountId, row.on, row.fund ?? 'LARCH', row.cents, version],
      );
    }
    await this.owner.query('select app.rebuild_account_history($1, $2, array[$3]::uuid[])', [
      planId,
      version,
      accountId,
    ]);
    return version;
  }

  private async id(sql: string, values: readonly unknown[]): Promise<string> {
    const { rows } = await this.owner.query<{ id: string }>(sql, [...values]);
    return rows[0]!.id;
  }
}
