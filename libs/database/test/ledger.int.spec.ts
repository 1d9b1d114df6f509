import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { EntityManager } from '@mikro-orm/postgresql';
import { type AccountRow, readHistories, withScope } from '@quarterpoise/database';
import { createTestDatabase, Factory, type TestDatabase } from '@quarterpoise/database/testing';

let database: TestDatabase;
let factory: Factory;
let em: EntityManager;
let planId: string;

beforeAll(async () => {
  database = await createTestDatabase();
  em = database.orm.em as EntityManager;
  factory = new Factory(database.owner);
  planId = await factory.plan();
});
afterAll(() => database.close());

const day = (date: string) => Date.parse(date) / 86_400_000;

async function historyAt(accountId: string, ledgerVersion: number): Promise<AccountRow> {
  return withScope(em, { kind: 'worker', planId }, async (tx) => {
    for await (const row of readHistories(tx, {
      planId,
      ledgerVersion,
      firstAccountId: accountId,
      lastAccountId: accountId,
    })) {
      return row;
    }
    throw new Error('no such account');
  });
}

describe('the ledger', () => {
  it.each(['activity', 'balance', 'ledger_version', 'account_history'])(
    'never changes or loses a row of %s',
    async (table) => {
      const { accountId } = await factory.participant(planId);
      await factory.ledger(planId, accountId, {
        activity: [{ on: '2026-07-10', kind: 0, cents: 1 }],
        balances: [{ on: '2026-09-30', cents: 2 }],
      });
      await expect(database.owner.query(`delete from ${table}`)).rejects.toThrow(/append-only/);
      await expect(database.owner.query(`update ${table} set plan_id = plan_id`)).rejects.toThrow(/append-only/);
      await expect(database.owner.query(`truncate ${table} cascade`)).rejects.toThrow(/append-only/);
    },
  );

  it('refuses what contradicts itself: a negative contribution, a reference twice, an account of another plan', async () => {
    const { accountId } = await factory.participant(planId);
    const row = (cents: number, reference: string) =>
      factory.ledger(planId, accountId, { activity: [{ on: '2026-07-10', kind: 0, cents, reference }] });
    await expect(row(-5, 'X1')).rejects.toThrow(/check constraint/);
    await row(5, 'X2');
    await expect(row(5, 'X2')).rejects.toThrow(/unique constraint/);
    const other = await factory.plan();
    await expect(
      factory.ledger(other, accountId, { activity: [{ on: '2026-07-10', kind: 0, cents: 5 }] }),
    ).rejects.toThrow(/foreign key/);
  });

  it('gives versions one after the other, however many ask at once', async () => {
    const plan = await factory.plan();
    const versions = await Promise.all(
      Array.from({ length: 12 }, () =>
        withScope(em, { kind: 'worker', planId: plan }, async (tx) => {
          const [row] = await tx.execute<{ version: number }[]>(
            `select app.next_ledger_version(?, 'freeze', null, null) as version`,
            [plan],
          );
          return row!.version;
        }),
      ),
    );
    expect(versions.toSorted((a, b) => a - b)).toEqual(Array.from({ length: 12 }, (_, i) => i + 1));
    await expect(
      withScope(em, { kind: 'worker', planId }, (tx) =>
        tx.execute(`select app.next_ledger_version(?, 'freeze', null, null)`, [plan]),
      ),
    ).rejects.toThrow(/not in scope/);
  });
});

describe('the account history', () => {
  it('comes back through binary COPY exactly as it was posted', async () => {
    const { accountId, participantId } = await factory.participant(planId);
    const version = await factory.ledger(planId, accountId, {
      activity: [
        { on: '2026-07-24', postedOn: '2026-07-27', kind: 1, cents: 9_007_199_254_740_991 },
        { on: '2026-07-10', kind: 0, cents: 100 },
        { on: '2026-07-10', kind: 0, cents: 23 },
        { on: '1969-12-30', kind: 14, cents: -4_294_967_297 },
      ],
      balances: [
        { on: '2026-06-30', cents: -5 },
        { on: '2026-09-30', cents: 7 },
        { on: '2026-09-30', cents: 40, fund: 'loan_note' },
      ],
    });
    const row = await historyAt(accountId, version);
    expect(row).toMatchObject({ accountId, participantId });
    expect(row.history).toEqual({
      activity: {
        effectiveDay: Int32Array.of(-2, day('2026-07-10'), day('2026-07-24')),
        postedDay: Int32Array.of(-2, day('2026-07-10'), day('2026-07-27')),
        kind: Uint8Array.of(14, 0, 1),
        cents: Float64Array.of(-4_294_967_297, 123, 9_007_199_254_740_991),
        ledgerVersion: Int32Array.of(version, version, version),
      },
      balances: {
        day: Int32Array.of(day('2026-06-30'), day('2026-09-30')),
        cents: Float64Array.of(-5, 7),
        ledgerVersion: Int32Array.of(version, version),
      },
      loanNotes: {
        day: Int32Array.of(day('2026-09-30')),
        cents: Float64Array.of(40),
        ledgerVersion: Int32Array.of(version),
      },
    });
  });

  it('stays as it was at an earlier version when later rows come in, and the newest balance counts', async () => {
    const { accountId } = await factory.participant(planId);
    const first = await factory.ledger(planId, accountId, { balances: [{ on: '2026-09-30', cents: 700 }] });
    const before = await historyAt(accountId, first);
    const second = await factory.ledger(planId, accountId, {
      activity: [{ on: '2026-08-07', kind: 0, cents: 50 }],
      balances: [{ on: '2026-09-30', cents: 750 }],
    });
    const again = await historyAt(accountId, first);
    expect(again.history).toEqual(before.history);
    expect(again.sha256.equals(before.sha256)).toBe(true);
    const after = await historyAt(accountId, second);
    expect([...after.history.balances.cents]).toEqual([750]);
    expect(after.sha256.equals(before.sha256)).toBe(false);
  });

  it('is empty, not absent, for an account without any row', async () => {
    const { accountId } = await factory.participant(planId);
    const row = await historyAt(accountId, 1_000_000);
    expect(row.history.activity.cents).toHaveLength(0);
    expect(row.history.balances.day).toHaveLength(0);
  });

  it('survives rows that are split anywhere between chunks', async () => {
    const accounts: string[] = [];
    for (let i = 0; i < 40; i += 1) {
      const { accountId } = await factory.participant(planId);
      accounts.push(accountId);
      await factory.ledger(planId, accountId, {
        activity: Array.from({ length: 30 }, (_, n) => ({
          on: `2026-07-${String((n % 28) + 1).padStart(2, '0')}`,
          kind: n % 5,
          cents: i * 100 + n,
        })),
      });
    }
    const read = await withScope(em, { kind: 'worker', planId }, async (tx) => {
      const sums = new Map<string, number>();
      const range = {
        planId,
        ledgerVersion: 1_000_000,
        firstAccountId: '00000000-0000-0000-0000-000000000000',
        lastAccountId: 'ffffffff-ffff-ffff-ffff-ffffffffffff',
      };
      for await (const row of readHistories(tx, range))
        sums.set(
          row.accountId,
          row.history.activity.cents.reduce((a, b) => a + b, 0),
        );
      return sums;
    });
    accounts.forEach((id, i) => expect(read.get(id)).toBe(30 * i * 100 + 435));
  });
});
