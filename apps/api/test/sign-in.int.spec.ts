import { randomUUID } from 'node:crypto';
import { writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { SignInModule } from '../src/sign-in/sign-in.module.js';
import { PASSWORD, startTestApi, type TestApi } from './testing/test-api.js';
import { problemWith } from './testing/test-client.js';

describe('signing in', () => {
  let api: TestApi;
  const demoFile = join(tmpdir(), `demo-accounts-${randomUUID()}.json`);
  const demo = {
    items: [{ hat: 'auditor', displayName: 'A', email: 'a@example.test', password: 'p', organisation: 'O' }],
  };

  beforeAll(async () => {
    await writeFile(demoFile, JSON.stringify(demo));
    api = await startTestApi({ features: [SignInModule] }, { DEMO: '1', DEMO_ACCOUNTS_FILE: demoFile });
  });
  afterAll(() => api?.close());

  const auditOf = async (personId: string) =>
    (
      await api.database.owner.query<{ action: string; details: object }>(
        'select action, details from audit_entry where person_id = $1 order by id',
        [personId],
      )
    ).rows;

  it('gives the session, a cookie that scripts cannot read, and an entry on the audit trail', async () => {
    const { personId, email } = await api.person('administrator');
    const client = api.client();
    const answer = await client.post('/auth/sign-in', { email: email.toUpperCase(), password: PASSWORD });
    expect(answer).toMatchObject({
      status: 200,
      body: { person: { id: personId, email }, hat: 'administrator', hats: ['administrator'] },
    });
    const [cookie] = answer.headers.getSetCookie();
    expect(cookie).toMatch(/; Path=\/api; HttpOnly; SameSite=Lax$/);
    expect((await client.get('/auth/session')).body).toEqual(answer.body);
    expect(await auditOf(personId)).toEqual([{ action: 'person.signed_in', details: {} }]);
  });

  it('makes cookies strict when the address is https', async () => {
    const secure = await startTestApi({ features: [SignInModule] }, { PUBLIC_URL: 'https://statements.example.test' });
    try {
      const person = await secure.person('auditor');
      const client = secure.client();
      const answer = await client.post(
        '/auth/sign-in',
        { email: person.email, password: PASSWORD },
        { 'x-forwarded-proto': 'https' },
      );
      expect(answer.headers.getSetCookie()[0]).toContain('; Secure');
      expect(answer.headers.get('strict-transport-security')).toContain('max-age');
    } finally {
      await secure.close();
    }
  });

  it('answers a wrong password, an unknown address and a switched-off person alike', async () => {
    const { personId, email } = await api.person('auditor');
    const off = await api.person('auditor');
    await api.database.owner.query('update person set disabled_at = now() where id = $1', [off.personId]);
    const refusals = [
      { email, password: 'wrong' },
      { email: 'nobody@example.test', password: PASSWORD },
      { email: off.email, password: PASSWORD },
    ];
    const told = new Set<string>();
    for (const body of refusals) {
      const startedAt = performance.now();
      const answer = await api.client().post('/auth/sign-in', body);
      expect(performance.now() - startedAt).toBeGreaterThan(245);
      expect(answer).toMatchObject({ status: 401, body: problemWith('wrong-credentials') });
      expect(answer.headers.getSetCookie()).toEqual([]);
      const { requestId, ...rest } = answer.body;
      told.add(JSON.stringify(rest));
      expect(requestId).toBeTruthy();
    }
    expect(told.size).toBe(1);
    expect(await auditOf(personId)).toEqual([
      { action: 'person.sign_in_refused', details: { reason: 'wrong-password' } },
    ]);
    expect(await auditOf(off.personId)).toEqual([
      { action: 'person.sign_in_refused', details: { reason: 'disabled' } },
    ]);
  });

  it('gives a fresh session id, whatever cookie came along', async () => {
    const first = await api.person('auditor');
    const second = await api.person('administrator');
    const attacker = await api.signIn(first.email);
    const planted = attacker.cookie!;

    const victim = api.client();
    victim.cookie = planted;
    await victim.post('/auth/sign-in', { email: second.email, password: PASSWORD });
    expect(victim.cookie).not.toBe(planted);
    expect((await victim.get('/auth/session')).body.person.id).toBe(second.personId);
    // the planted id is worth nothing afterwards
    expect((await attacker.get('/auth/session')).status).toBe(401);
  });

  it('does not take an id that it has not given', async () => {
    const client = api.client();
    client.cookie = 'quarterpoise_session=made-up.signature';
    expect(await client.get('/auth/session')).toMatchObject({ status: 401, body: problemWith('not-signed-in') });
  });

  it('asks for a pause after ten wrong passwords from one place, even with the right one then', async () => {
    const { email } = await api.person('auditor');
    const client = api.client();
    const wrong = () => client.post('/auth/sign-in', { email, password: 'wrong' });
    const statuses = (await Promise.all(Array.from({ length: 10 }, wrong))).map((answer) => answer.status);
    expect(statuses).toEqual(Array(10).fill(401));
    const answer = await client.post('/auth/sign-in', { email, password: PASSWORD });
    expect(answer).toMatchObject({ status: 429, body: problemWith('too-many-requests') });
    expect(Number(answer.headers.get('retry-after'))).toBeGreaterThan(800);
    // elsewhere the person is not locked out
    await api.signIn(email);
  });

  it('counts guesses that come at the same moment', async () => {
    const { email } = await api.person('auditor');
    const client = api.client();
    const guesses = Array.from({ length: 25 }, (_, n) =>
      client.post('/auth/sign-in', { email, password: `guess ${n}` }),
    );
    const statuses = (await Promise.all(guesses)).map((answer) => answer.status).toSorted();
    expect(statuses).toEqual([...Array(10).fill(401), ...Array(15).fill(429)]);
  });

  it('does not count what turned out well', async () => {
    const { email } = await api.person('auditor');
    const client = api.client();
    for (let n = 0; n < 12; n += 1) {
      expect((await client.post('/auth/sign-in', { email, password: PASSWORD })).status).toBe(200);
    }
  });

  it('ends with signing out, for whoever kept the cookie as well', async () => {
    const { personId, email } = await api.person('auditor');
    const client = await api.signIn(email);
    const kept = client.cookie;
    expect((await client.post('/auth/sign-out')).status).toBe(204);
    expect(client.cookie).toBeNull();
    client.cookie = kept;
    expect((await client.get('/auth/session')).status).toBe(401);
    expect((await auditOf(personId)).map((entry) => entry.action)).toEqual(['person.signed_in', 'person.signed_out']);
  });

  it('ends when the person is switched off', async () => {
    const { personId, email } = await api.person('auditor');
    const client = await api.signIn(email);
    await api.database.owner.query('update person set disabled_at = now() where id = $1', [personId]);
    expect((await client.get('/auth/session')).status).toBe(401);
  });

  it('lets a person choose among their own hats and no others', async () => {
    const { personId, email } = await api.person('administrator');
    const plan = await api.factory.plan();
    await api.factory.participant(plan, { claimedBy: personId });
    const client = await api.signIn(email);
    const worn = await client.post('/auth/hat', { hat: 'participant' });
    expect(worn.body).toMatchObject({ hat: 'participant', hats: ['administrator', 'participant'] });
    expect((await client.get('/auth/session')).body.hat).toBe('participant');
    expect(await client.post('/auth/hat', { hat: 'operator' })).toMatchObject({
      status: 403,
      body: problemWith('forbidden'),
    });
    expect((await client.get('/auth/session')).body.hat).toBe('participant');
  });

  it('keeps the language of the screens', async () => {
    const { email } = await api.person('participant');
    const client = await api.signIn(email);
    expect((await client.post('/auth/language', { language: 'es' })).body.person.language).toBe('es');
    expect((await (await api.signIn(email)).get('/auth/session')).body.person.language).toBe('es');
  });

  it('lets nobody in who has no role', async () => {
    const { personId, email } = await api.person('auditor');
    await api.database.owner.query('delete from role_assignment where person_id = $1', [personId]);
    expect(await api.client().post('/auth/sign-in', { email, password: PASSWORD })).toMatchObject({
      status: 403,
      body: problemWith('forbidden'),
    });
  });

  it('lists demo sign-ins in a demo', async () => {
    expect((await api.client().get('/auth/demo-accounts')).body).toEqual(demo);
  });

  it('lists none otherwise', async () => {
    const plain = await startTestApi({ features: [SignInModule] }, { DEMO_ACCOUNTS_FILE: demoFile });
    try {
      expect((await plain.client().get('/auth/demo-accounts')).body).toEqual({ items: [] });
    } finally {
      await plain.close();
    }
  });
});
