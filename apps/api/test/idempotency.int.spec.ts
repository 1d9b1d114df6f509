import type { RouteDefinition } from '@quarterpoise/dto';
import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { ProblemException } from '../src/platform/problems/problem.exception.js';
import { SignInModule } from '../src/sign-in/sign-in.module.js';
import { SampleModule, sampleRoutes, SampleState } from './testing/sample-feature.js';
import { routesOf, startTestApi, type TestApi } from './testing/test-api.js';
import { problemWith, type TestClient } from './testing/test-client.js';

describe('a write with an idempotency key', () => {
  let api: TestApi;
  let state: SampleState;
  let administrator: TestClient;
  let another: TestClient;
  const counts = `/sample/${randomUUID()}/counts`;
  const withKey = (key: string) => ({ 'idempotency-key': key });

  beforeAll(async () => {
    const features = [SignInModule, SampleModule];
    const routes = [...routesOf([SignInModule]), ...Object.values<RouteDefinition>(sampleRoutes)];
    api = await startTestApi({ features, routes });
    state = api.app.get(SampleState);
    administrator = await api.signIn((await api.person('administrator')).email);
    another = await api.signIn((await api.person('administrator')).email);
  });
  afterAll(() => api?.close());
  beforeEach(() => Object.assign(state, new SampleState()));

  it('is done once, and its answer given again', async () => {
    const key = randomUUID();
    const first = await administrator.post(counts, { note: 'a' }, withKey(key));
    const again = await administrator.post(counts, { note: 'a' }, withKey(key));
    expect(again).toMatchObject({ status: 201, body: first.body });
    expect(first.headers.get('idempotency-replayed')).toBeNull();
    expect(again.headers.get('idempotency-replayed')).toBe('true');
    expect(state.count).toBe(1);
  });

  it('is done once when it comes several times at the same moment', async () => {
    state.handlerMs = 150;
    const key = randomUUID();
    const answers = await Promise.all(
      Array.from({ length: 5 }, () => administrator.post(counts, { note: 'a' }, withKey(key))),
    );
    expect(answers.map(({ status, body }) => [status, body.count])).toEqual(Array.from({ length: 5 }, () => [201, 1]));
    expect(state.count).toBe(1);
  });

  it('is refused when the key was used for another body, another address or another route', async () => {
    const key = randomUUID();
    await administrator.post(counts, { note: 'a' }, withKey(key));
    const reused = { status: 409, body: problemWith('idempotency-key-reused') };
    expect(await administrator.post(counts, { note: 'b' }, withKey(key))).toMatchObject(reused);
    expect(await administrator.post(`${counts}?step=2`, { note: 'a' }, withKey(key))).toMatchObject(reused);
    expect(await administrator.post('/sample/nothing', undefined, withKey(key))).toMatchObject(reused);
    expect(state.count).toBe(1);
  });

  it('does not meet the key of another person', async () => {
    const key = randomUUID();
    await administrator.post(counts, { note: 'a' }, withKey(key));
    expect((await another.post(counts, { note: 'b' }, withKey(key))).body).toEqual({ count: 2 });
  });

  it('may use its key again after a refusal', async () => {
    const key = randomUUID();
    state.failure = new ProblemException('quarter-not-ready');
    expect((await administrator.post(counts, { note: 'a' }, withKey(key))).status).toBe(409);
    state.failure = null;
    expect(await administrator.post(counts, { note: 'a' }, withKey(key))).toMatchObject({ status: 201 });
  });

  it('repeats an answer without a body', async () => {
    const key = randomUUID();
    expect((await administrator.post('/sample/nothing', undefined, withKey(key))).status).toBe(204);
    expect((await administrator.post('/sample/nothing', undefined, withKey(key))).status).toBe(204);
    expect(state.count).toBe(1);
  });

  it('is recognised for an upload by its fields and the name of its file', async () => {
    const key = randomUUID();
    const fields = { kind: 'read', rows: '2' };
    const file = { name: 'a.csv', content: 'x,y\n1,2\n' };
    const first = await administrator.upload('/sample/uploads', fields, file, withKey(key));
    expect(await administrator.upload('/sample/uploads', fields, file, withKey(key))).toMatchObject({
      status: 200,
      body: first.body,
    });
    expect(await administrator.upload('/sample/uploads', { ...fields, rows: '3' }, file, withKey(key))).toMatchObject({
      status: 409,
    });
  });

  it('needs a key of a sensible length', async () => {
    expect(await administrator.post(counts, { note: 'a' }, withKey('k'.repeat(201)))).toMatchObject({
      status: 400,
      body: problemWith('malformed-request'),
    });
  });
});
