import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { EntityManager } from '@mikro-orm/postgresql';
import { recordAudit, withScope } from '@quarterpoise/database';
import { createTestDatabase, Factory, type TestDatabase } from '@quarterpoise/database/testing';

let database: TestDatabase;
let em: EntityManager;
let planId: string;
let sponsorId: string;
let administrator: string;

beforeAll(async () => {
  database = await createTestDatabase();
  em = database.orm.em as EntityManager;
  const factory = new Factory(database.owner);
  sponsorId = await factory.sponsor();
  planId = await factory.plan({ sponsorId });
  administrator = await factory.person({ role: 'administrator', sponsorId });
});
afterAll(() => database.close());

const FACT = { action: 'run.started', subjectType: 'run', subjectId: 'r1', details: { accounts: 3 } } as const;
const seal = async () =>
  (await database.owner.query<{ n: number }>('select app.seal_audit($1) as n', [sponsorId])).rows[0]!.n;
const firstBroken = async () =>
  (await database.owner.query<{ at: number | null }>('select app.verify_audit($1) as at', [sponsorId])).rows[0]!.at;
const record = () =>
  withScope(em, { kind: 'person', personId: administrator, hat: 'administrator' }, (tx) =>
    recordAudit(tx, { ...FACT, planId }),
  );

describe('the audit trail', () => {
  it('records in the name of the scope’s person and hat', async () => {
    await record();
    const { rows } = await database.owner.query(
      'select person_id, hat, action, details from audit_entry order by id desc limit 1',
    );
    expect(rows[0]).toEqual({
      person_id: administrator,
      hat: 'administrator',
      action: 'run.started',
      details: { accounts: 3 },
    });
  });

  it('refuses an entry in somebody else’s name', async () => {
    await expect(
      withScope(em, { kind: 'person', personId: administrator, hat: 'administrator' }, (tx) =>
        tx.execute(
          `insert into audit_entry (sponsor_id, plan_id, person_id, hat, action, subject_type) values (?, ?, null, 'worker', 'run.started', 'run')`,
          [sponsorId, planId],
        ),
      ),
    ).rejects.toThrow(/row-level security/);
  });

  it('seals each entry once and in a chain that verifies, whatever time zone the connection has', async () => {
    await record();
    await seal();
    for (let i = 0; i < 5; i += 1) await record();
    expect(await seal()).toBe(5);
    expect(await seal()).toBe(0);
    await database.owner.query(`set timezone = 'Pacific/Auckland'`);
    expect(await firstBroken()).toBeNull();
  });

  it('tells where the chain breaks when somebody with full rights changes or removes an entry', async () => {
    await record();
    await seal();
    await database.owner.query('alter table audit_entry disable trigger audit_entry_append_only');
    await database.owner.query(
      `update audit_entry set details = '{"accounts": 4}' where id = (select entry_id from audit_seal where sponsor_id = $1 and sequence = 2)`,
      [sponsorId],
    );
    expect(await firstBroken()).toBe(2);
    await database.owner.query(
      `update audit_entry set details = '{"accounts": 3}' where id = (select entry_id from audit_seal where sponsor_id = $1 and sequence = 2)`,
      [sponsorId],
    );
    expect(await firstBroken()).toBeNull();
    await database.owner.query('alter table audit_seal disable trigger audit_seal_append_only');
    await database.owner.query('delete from audit_seal where sponsor_id = $1 and sequence = 3', [sponsorId]);
    expect(await firstBroken()).toBe(3);
  });
});
