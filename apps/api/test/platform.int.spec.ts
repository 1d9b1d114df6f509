import { problem, type RouteDefinition, SIGNED_IN } from '@quarterpoise/dto';
import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { SignInModule } from '../src/sign-in/sign-in.module.js';
import { SampleModule, sampleRoutes, SampleState } from './testing/sample-feature.js';
import { routesOf, startTestApi, type TestApi } from './testing/test-api.js';
import { problemWith, type TestClient } from './testing/test-client.js';

const features = [SignInModule, SampleModule];
const routes: RouteDefinition[] = [...routesOf([SignInModule]), ...Object.values<RouteDefinition>(sampleRoutes)];

describe('the platform', () => {
  let api: TestApi;
  let state: SampleState;
  let administrator: TestClient;
  let participant: TestClient;
  const counts = `/sample/${randomUUID()}/counts`;

  beforeAll(async () => {
    api = await startTestApi({ features, routes });
    state = api.app.get(SampleState);
    administrator = await api.signIn((await api.person('administrator')).email);
    participant = await api.signIn((await api.person('participant')).email);
  });
  afterAll(() => api?.close());
  beforeEach(() => Object.assign(state, new SampleState()));

  describe('access', () => {
    it('lets the listed roles through, refuses others, and asks strangers to sign in', async () => {
      expect(await administrator.post(counts, { note: 'a' })).toMatchObject({ status: 201, body: { count: 1 } });
      expect(await participant.post(counts, { note: 'a' })).toMatchObject({
        status: 403,
        body: problemWith('forbidden'),
      });
      expect(await api.client().post(counts, { note: 'a' })).toMatchObject({
        status: 401,
        body: problemWith('not-signed-in'),
      });
      expect(state.count).toBe(1);
    });

    it('looks at the role before it looks at the input', async () => {
      expect((await participant.post(counts, { note: 1 })).status).toBe(403);
    });

    it.each([
      ['no token', { 'x-csrf-token': null }],
      ['another token', { 'x-csrf-token': 'x'.repeat(32) }],
      ['a page of somebody else', { 'sec-fetch-site': 'cross-site' }],
      ['a form of somebody else', { origin: 'https://elsewhere.example.test' }],
    ])('refuses a write with %s', async (_, headers) => {
      expect(await administrator.post(counts, { note: 'a' }, headers)).toMatchObject({
        status: 403,
        body: problemWith('csrf-token-invalid'),
      });
      expect(state.count).toBe(0);
    });

    it('refuses a sign-in that a page of somebody else sends', async () => {
      const answer = await api
        .client()
        .post(
          '/auth/sign-in',
          { email: 'a@example.test', password: 'p' },
          { origin: 'https://elsewhere.example.test' },
        );
      expect(answer).toMatchObject({ status: 403, body: problemWith('csrf-token-invalid') });
    });

    it('takes no token of another sign-in', async () => {
      const headers = { 'x-csrf-token': participant.csrfToken };
      expect((await administrator.post(counts, { note: 'a' }, headers)).status).toBe(403);
    });
  });

  describe('starting', () => {
    const start = (changed: readonly RouteDefinition[], modules = features) =>
      startTestApi({ features: modules, routes: changed }).then((started) => started.close());

    it('is refused when a route of the table has no handler', async () => {
      const orphan: RouteDefinition = { ...sampleRoutes.nothing, id: 'sample.orphan', path: '/sample/orphan' };
      await expect(start([...routes, orphan])).rejects.toThrow(/sample\.orphan has no handler/);
    });

    it('is refused when a handler stands outside the table', async () => {
      await expect(start(routesOf([SignInModule]))).rejects.toThrow(
        /SampleController\.count is bound to sample\.count/,
      );
    });

    it('is refused when a route does not say who may call it', async () => {
      const { access } = sampleRoutes.nothing;
      expect(access).toBe(SIGNED_IN);
      Object.assign(sampleRoutes.nothing, { access: undefined });
      try {
        await expect(start(routes)).rejects.toThrow(/does not say who may call it/);
      } finally {
        Object.assign(sampleRoutes.nothing, { access });
      }
    });
  });

  describe('input', () => {
    it('tells every fault of address, query and body at once', async () => {
      const answer = await administrator.post('/sample/none/counts?step=x', { note: 'A', list: ['b'] });
      expect(answer).toMatchObject({ status: 422, body: problemWith('validation-failed') });
      expect(answer.body.errors.map((error: { pointer: string }) => error.pointer)).toEqual([
        '/params/id',
        '/query/step',
        '/note',
        '/list/0',
      ]);
      expect(JSON.stringify(answer.body)).not.toContain('a-z');
    });

    it('takes a missing body for an empty one, so that the fields are named', async () => {
      expect((await administrator.post(counts)).body.errors).toEqual([
        { pointer: '/note', code: 'invalid-type', detail: 'This is required.' },
      ]);
    });

    it.each([
      ['application/json', '{"note":'],
      ['text/plain', 'note=a'],
      ['application/x-www-form-urlencoded', 'note=a'],
      ['application/json', '{"__proto__": {"isAdmin": true}, "note": "a"}'],
      ['application/json', `{"note": "${'a'.repeat(300_000)}"}`],
    ])('refuses what it cannot read: %s', async (type, body) => {
      const answer = await administrator.send('POST', counts, { body, headers: { 'content-type': type } });
      expect(answer.status).toBe(400);
      expect(await answer.json()).toMatchObject(problemWith('malformed-request'));
    });
  });

  describe('problems', () => {
    it.each([
      ['/sample/faults/none', 404, 'not-found'],
      ['/sample/faults/move', 409, 'illegal-move'],
      ['/sample/faults/unforeseen', 500, 'internal-error'],
      ['/sample/faults/contract', 500, 'internal-error'],
      ['/sample/faults/database', 500, 'internal-error'],
      ['/no/such/route', 404, 'not-found'],
    ])('%s is told as problem details', async (path, status, code) => {
      const answer = await api.client().get(`${path}?search=Ada`);
      expect(answer.status).toBe(status);
      expect(answer.headers.get('content-type')).toBe('application/problem+json; charset=utf-8');
      expect(problem.parse(answer.body)).toMatchObject({
        code,
        status,
        instance: `/api/v1${path}`,
        requestId: answer.headers.get('x-request-id'),
      });
      expect(JSON.stringify(answer.body)).not.toMatch(/plum|seven|Ada|select/);
    });

    it('gives the reason of a refused move', async () => {
      expect((await api.client().get('/sample/faults/move')).body.detail).toBe('The run has ended.');
    });
  });

  describe('answers', () => {
    it('carry the fields of the schema and no others, and are not kept', async () => {
      const answer = await administrator.post(counts, { note: 'a' });
      expect(answer.body).toEqual({ count: 1 });
      expect(answer.headers.get('cache-control')).toBe('no-store');
    });

    it('that never change are not sent twice', async () => {
      const first = await administrator.get('/sample/tagged');
      expect(first).toMatchObject({ status: 200, body: { count: 7 } });
      expect(first.headers.get('etag')).toBe('"seven"');
      const again = await administrator.get('/sample/tagged', { 'if-none-match': '"other", W/"seven"' });
      expect(again).toMatchObject({ status: 304, body: '' });
      expect((await administrator.get('/sample/tagged', { 'if-none-match': '"other"' })).status).toBe(200);
    });

    it('that are not one’s own are not confirmed by their tag', async () => {
      expect((await api.client().get('/sample/tagged', { 'if-none-match': '"seven"' })).status).toBe(401);
    });

    it('that the database prepared go out as they are, after a check outside production', async () => {
      const good = await api.client().get('/sample/prepared/good');
      expect(good).toMatchObject({ status: 200, body: { count: 7 } });
      expect(good.headers.get('content-type')).toContain('application/json');
      expect((await api.client().get('/sample/prepared/bad')).status).toBe(500);
    });

    it('can be a file', async () => {
      const answer = await administrator.get('/sample/file.csv');
      expect(answer.body).toBe('line,column\r\n1,"ä"\r\n');
      expect(answer.headers.get('content-type')).toBe('text/csv; charset=utf-8');
      expect(answer.headers.get('content-disposition')).toBe('attachment; filename="rows__of__today.csv"');
    });
  });
});
