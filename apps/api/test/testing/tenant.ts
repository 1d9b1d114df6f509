import { type Hat, HATS, type ResultData, type RunTotals, type StatementData } from '@quarterpoise/dto';
import { randomUUID } from 'node:crypto';
import type { TestApi } from './test-api.js';

/** A sponsor with one published quarter, a quarter in review, and one person for every hat: enough for every kind of id in the route table. */
export interface Tenant {
  readonly planId: string;
  readonly quarterId: string;
  readonly importId: string;
  readonly runId: string;
  readonly flagId: string;
  readonly participantId: string;
  readonly accountId: string;
  readonly statementId: string;
  /** Of another participant of the same plan. */
  readonly neighbourStatementId: string;
  readonly people: Readonly<Record<Hat, { personId: string; email: string }>>;
}

export async function createTenant(api: TestApi): Promise<Tenant> {
  const { factory } = api;
  const { owner } = api.database;
  const insert = async (sql: string, values: readonly unknown[]) =>
    (await owner.query<{ id: string }>(`${sql} returning id`, [...values])).rows[0]!.id;

  const sponsorId = await factory.sponsor();
  const planId = await factory.plan({ sponsorId });
  const people = {} as Record<Hat, { personId: string; email: string }>;
  for (const hat of HATS) if (hat !== 'participant') people[hat] = await api.person(hat, { planId });
  people.participant = await api.person('participant', { planId });
  const { rows } = await owner.query<{ participant_id: string; account_id: string }>(
    `select c.participant_id, a.id as account_id from participant_claim c join account a using (participant_id) where c.person_id = $1`,
    [people.participant.personId],
  );
  const own = { participantId: rows[0]!.participant_id, accountId: rows[0]!.account_id };
  const neighbour = await factory.participant(planId);

  const policyId = await factory.policy(planId);
  const ledgerVersion = await factory.ledger(planId, own.accountId, {
    balances: [
      { on: '2026-03-31', cents: 0 },
      { on: '2026-06-30', cents: 0 },
      { on: '2026-09-30', cents: 0 },
    ],
  });
  const published = await factory.quarter(planId, {
    opensOn: '2026-03-31',
    closesOn: '2026-06-30',
    state: 'published',
  });
  const quarterId = await factory.quarter(planId, { state: 'in_review' });
  const runOf = (quarter: string) =>
    insert(
      `insert into run (plan_id, quarter_id, is_rehearsal, state, ledger_version, policy_version_id, engine_version, slice_size,
         slice_count, account_count, started_by, started_via, finished_at, totals, results_sha256)
       values ($1, $2, false, 'completed', $3, $4, '1', 1000, 0, 2, $5, 'page', now(), $6, sha256('results'))`,
      [planId, quarter, ledgerVersion, policyId, people.administrator.personId, JSON.stringify(TOTALS)],
    );
  const publishedRunId = await runOf(published);
  const runId = await runOf(quarterId);
  await owner.query(
    `insert into result (run_id, account_id, plan_id, participant_id, status, reason, opening_cents, closing_cents, gain_cents,
       input_sha256, data) values ($1, $2, $3, $4, 'no-capital', 'nothing-at-work', 0, 0, 0, sha256('input'), $5)`,
    [runId, own.accountId, planId, own.participantId, JSON.stringify(RESULT)],
  );
  const statementOf = (account: { participantId: string; accountId: string }) =>
    insert(
      `insert into statement (plan_id, quarter_id, account_id, participant_id, version, run_id, data, data_sha256, check_code, check_key_id)
       values ($1, $2, $3, $4, 1, $5, $6, sha256('statement'), $7, 'k1')`,
      [
        planId,
        published,
        account.accountId,
        account.participantId,
        publishedRunId,
        JSON.stringify(STATEMENT),
        randomUUID(),
      ],
    );
  return {
    planId,
    quarterId,
    runId,
    ...own,
    people,
    importId: await insert(
      `insert into import (plan_id, quarter_id, kind, file_name, state, stated_rows, uploaded_by)
       values ($1, $2, 'roster', 'roster.csv', 'discarded', 0, $3)`,
      [planId, quarterId, people.administrator.personId],
    ),
    flagId: await insert(
      `insert into flag (run_id, plan_id, account_id, code, severity) values ($1, $2, $3, 'extreme-return', 'review')`,
      [runId, planId, own.accountId],
    ),
    statementId: await statementOf(own),
    neighbourStatementId: await statementOf(neighbour),
  };
}

const NOTHING = { dates: [], cents: [] };

const RESULT: ResultData = { flowTiming: 'end', windows: [], movements: null, flows: NOTHING, values: NOTHING };

const TOTALS: RunTotals = {
  openingCents: 0,
  closingCents: 0,
  gainCents: 0,
  netFlowCents: 0,
  solved: 0,
  notComputed: 0,
  byStatus: { 'no-capital': 1 },
  distribution: [],
  ties: [],
};

const STATEMENT: StatementData = {
  schema: 1,
  plan: { code: 'P', name: 'Plan', sponsorName: 'Sponsor', recordsBeginOn: '2018-10-01' },
  participant: { number: '1', givenName: 'Ada', familyName: 'Alder', joinedOn: null, leftOn: null, language: 'en' },
  quarter: { code: '2026-Q2', opensOn: '2026-03-31', closesOn: '2026-06-30' },
  version: 1,
  reason: null,
  issuedOn: '2026-07-20',
  engineVersion: '1',
  policy: { version: 1, fees: 'net', loans: 'outside', flowTiming: 'end', decimals: 2 },
  status: 'no-capital',
  statusReason: 'nothing-at-work',
  windows: [],
  movements: null,
  flows: NOTHING,
  values: NOTHING,
};
