import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { EntityManager } from '@mikro-orm/postgresql';
import { type Scope, ScopeRefused, withScope } from '@quarterpoise/database';
import { createTestDatabase, Factory, type TestDatabase } from '@quarterpoise/database/testing';

let database: TestDatabase;
let factory: Factory;
let em: EntityManager;
let own: { planId: string; accountId: string; participantId: string };
let foreign: { planId: string; accountId: string; participantId: string };
let administrator: string;
let participant: string;
let support: string;

beforeAll(async () => {
  database = await createTestDatabase();
  em = database.orm.em as EntityManager;
  factory = new Factory(database.owner);
  const sponsorId = await factory.sponsor();
  const planId = await factory.plan({ sponsorId });
  administrator = await factory.person({ role: 'administrator', sponsorId });
  participant = await factory.person();
  support = await factory.person({ role: 'support', planId });
  own = {
    planId,
    ...(await factory.participant(planId, { claimedBy: participant, givenName: 'Íñigo', familyName: 'Peña' })),
  };
  await factory.participant(planId, { number: 'N_5%0' });
  const foreignPlan = await factory.plan();
  foreign = { planId: foreignPlan, ...(await factory.participant(foreignPlan)) };
  for (const { planId: id, accountId } of [own, foreign]) {
    await factory.ledger(id, accountId, {
      activity: [{ on: '2026-07-10', kind: 0, cents: 250_00 }],
      balances: [{ on: '2026-09-30', cents: 1_000_00 }],
    });
  }
});
afterAll(() => database.close());

const count = (scope: Scope, table: string) =>
  withScope(em, scope, async (tx) => {
    const [row] = await tx.execute<{ n: number }[]>(`select count(*) as n from ${table}`);
    return row!.n;
  });

describe('row-level security', () => {
  it('is on for every table, and the migration that creates a table switches it on', async () => {
    const { rows } = await database.owner.query<{ relname: string; relrowsecurity: boolean; owner: string }>(
      `select relname, relrowsecurity, pg_get_userbyid(relowner) as owner from pg_class
       where relkind in ('r', 'p') and relnamespace = 'public'::regnamespace and relname <> 'schema_migration'`,
    );
    expect(rows.length).toBeGreaterThan(25);
    expect(rows.filter((row) => !row.relrowsecurity).map((row) => row.relname)).toEqual([]);
    expect(rows.filter((row) => row.owner !== 'quarterpoise_owner')).toEqual([]);
    const folder = join(__dirname, '../src/migrations');
    const sources = readdirSync(folder)
      .filter((name) => name.startsWith('Migration'))
      .map((name) => readFileSync(join(folder, name), 'utf8'));
    for (const { relname } of rows) {
      const creating = sources.filter((source) => source.includes(`create table ${relname} (`));
      expect(creating, relname).toHaveLength(1);
      expect(
        creating[0]!.includes(`tablePolicies('${relname}'`) ||
          creating[0]!.includes(`alter table ${relname} enable row level security`),
        relname,
      ).toBe(true);
    }
  });

  it('shows nothing of any table when no scope was entered', async () => {
    const { rows } = await database.owner.query<{ relname: string }>(
      `select relname from pg_class where relkind in ('r', 'v') and relnamespace = 'public'::regnamespace
       and has_table_privilege('quarterpoise_app', oid, 'select') and relname <> 'schema_migration'`,
    );
    for (const { relname } of rows) {
      const [row] = await em.fork().execute<{ n: number }[]>(`select count(*) as n from ${relname}`);
      expect(row!.n, relname).toBe(0);
    }
  });

  it('gives the application’s role no rights that step around it', async () => {
    const [role] = (
      await database.owner.query(
        `select rolsuper, rolbypassrls, rolcreaterole, rolcreatedb from pg_roles where rolname = 'quarterpoise_app'`,
      )
    ).rows;
    expect(role).toEqual({ rolsuper: false, rolbypassrls: false, rolcreaterole: false, rolcreatedb: false });
    await expect(em.fork().execute('select password_hash from person_credential')).rejects.toThrow(/permission denied/);
    await expect(em.fork().execute('alter table activity disable row level security')).rejects.toThrow(/must be owner/);
    await expect(
      em.fork().execute(`select app.set_scope('worker', null, array[]::uuid[], '{}', '{}')`),
    ).rejects.toThrow(/permission denied/);
  });

  it.each(['plan', 'participant', 'account', 'activity', 'balance', 'ledger_version'])(
    'shows an administrator the %s rows of the own sponsor only',
    async (table) => {
      const scope: Scope = { kind: 'person', personId: administrator, hat: 'administrator' };
      const column = table === 'plan' ? 'id' : 'plan_id';
      const rows = await withScope(em, scope, (tx) =>
        tx.execute<{ plan: string }[]>(`select ${column} as plan from ${table}`),
      );
      expect(new Set(rows.map((row) => row.plan))).toEqual(new Set([own.planId]));
    },
  );

  it('shows a participant the own row and account, and no ledger', async () => {
    const scope: Scope = { kind: 'person', personId: participant, hat: 'participant' };
    expect(await withScope(em, scope, (tx) => tx.execute('select id from participant'))).toEqual([
      { id: own.participantId },
    ]);
    expect(await withScope(em, scope, (tx) => tx.execute('select id from account'))).toEqual([{ id: own.accountId }]);
    for (const table of ['activity', 'balance', 'result', 'flag', 'run', 'import', 'audit_entry', 'account_history']) {
      expect(await count(scope, table), table).toBe(0);
    }
  });

  it('refuses a hat that the person does not hold, and anybody who is switched off', async () => {
    await expect(count({ kind: 'person', personId: support, hat: 'administrator' }, 'plan')).rejects.toThrow(
      ScopeRefused,
    );
    await expect(count({ kind: 'person', personId: administrator, hat: 'participant' }, 'plan')).rejects.toThrow(
      ScopeRefused,
    );
    const leaver = await factory.person({ role: 'administrator', planId: own.planId });
    await database.owner.query('update person set disabled_at = now() where id = $1', [leaver]);
    await expect(count({ kind: 'person', personId: leaver, hat: 'administrator' }, 'plan')).rejects.toThrow(
      ScopeRefused,
    );
  });

  it('shows the operator configuration and nobody’s data', async () => {
    const operator = await factory.person({ role: 'operator' });
    const scope: Scope = { kind: 'person', personId: operator, hat: 'operator' };
    expect(await count(scope, 'plan')).toBe(2);
    for (const table of ['participant', 'account', 'activity', 'balance', 'statement', 'result']) {
      expect(await count(scope, table), table).toBe(0);
    }
  });

  it('confines a worker to its plan for reading and for writing', async () => {
    const scope: Scope = { kind: 'worker', planId: own.planId };
    expect(await count(scope, 'activity')).toBe(1);
    await expect(
      withScope(em, scope, (tx) =>
        tx.execute('insert into account (plan_id, participant_id, kind) values (?, ?, ?)', [
          foreign.planId,
          foreign.participantId,
          'beneficiary',
        ]),
      ),
    ).rejects.toThrow(/row-level security/);
  });

  it('leaves nothing behind on the pooled connection', async () => {
    await count({ kind: 'person', personId: administrator, hat: 'administrator' }, 'plan');
    for (let i = 0; i < 6; i += 1) {
      const [row] = await em
        .fork()
        .execute<{ hat: string; plans: string }[]>('select app.hat() as hat, app.plan_ids()::text as plans');
      expect(row).toEqual({ hat: '', plans: '{}' });
    }
  });

  it('finds participants within the scope, without regard to accents, and takes wildcards literally', async () => {
    const find = (personId: string, hat: 'support' | 'participant', search: string) =>
      withScope(em, { kind: 'person', personId, hat }, async (tx) => {
        const rows = await tx.execute<{ id: string }[]>('select app.find_participants(?, 50) as id', [search]);
        return rows.map((row) => row.id);
      });
    expect(await find(support, 'support', 'inigo pena')).toEqual([own.participantId]);
    expect(await find(support, 'support', 'Alder')).toHaveLength(1);
    expect(await find(support, 'support', '%')).toHaveLength(1);
    expect(await find(support, 'support', 'N_5')).toHaveLength(1);
    expect(await find(support, 'support', `' or true --`)).toEqual([]);
    expect(await find(support, 'support', '\\')).toEqual([]);
    expect(await find(participant, 'participant', 'peña')).toEqual([]);
  });
});
