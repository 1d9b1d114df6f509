import { type Hat, HATS, type RouteDefinition, ROUTES } from '@quarterpoise/dto';
import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { FEATURES } from '../src/api.module.js';
import { addressIn, SAMPLE_BODIES, SAMPLE_QUERIES } from './testing/route-samples.js';
import { createTenant, type Tenant } from './testing/tenant.js';
import { routesOf, startTestApi, type TestApi } from './testing/test-api.js';
import { problemWith, type TestClient } from './testing/test-client.js';

/** Every route × every hat × one's own, a foreign and nobody's ids, from the route table: a new route is in here by being in the table. */
const bound = routesOf(FEATURES);
const limited = bound.filter((route) => route.access.kind === 'hats');
const behindSignIn = bound.filter((route) => route.access.kind !== 'public');
const withIds = limited.filter((route) => route.path.includes(':'));
const reads = limited.filter((route) => route.method === 'GET');

const mayCall = (route: RouteDefinition, hat: Hat) => route.access.kind === 'hats' && route.access.hats.includes(hat);
const pairs = (routes: readonly RouteDefinition[], isWanted: (route: RouteDefinition, hat: Hat) => boolean) =>
  routes.flatMap((route) =>
    HATS.filter((hat) => isWanted(route, hat)).map((hat) => [route.id, hat, route] as [string, Hat, RouteDefinition]),
  );

describe('access matrix', () => {
  let api: TestApi;
  let own: Tenant;
  let foreign: Tenant;
  const clients = {} as Record<Hat, TestClient>;

  beforeAll(async () => {
    api = await startTestApi();
    own = await createTenant(api);
    foreign = await createTenant(api);
    for (const hat of HATS) clients[hat] = await api.signIn(own.people[hat].email);
  });
  afterAll(() => api?.close());

  async function call(client: TestClient, route: RouteDefinition, tenant: Tenant) {
    const path = addressIn(route, tenant) + (SAMPLE_QUERIES[route.id] ?? '');
    const body = SAMPLE_BODIES[route.id]?.(tenant);
    if (route.consumes === 'multipart') {
      const file = { name: 'roster.csv', content: 'participant_number\r\n1\r\n' };
      return client.upload(path, body as Record<string, string>, file);
    }
    if (route.produces !== 'events') {
      return route.method === 'GET' ? client.get(path) : client.post(path, body);
    }
    // an open stream is enough of an answer
    const response = await client.send('GET', path);
    const isStream = response.headers.get('content-type') === 'text/event-stream';
    const answer = isStream ? '' : await response.json();
    await response.body?.cancel().catch(() => undefined);
    return { status: response.status, headers: response.headers, body: answer };
  }

  /** Everything that a write could change of a tenant. */
  async function stateOf(tenant: Tenant): Promise<unknown> {
    const { rows } = await api.database.owner.query(
      `select (select array_agg(state order by id) from quarter where plan_id = $1) as quarters,
              (select array_agg(state order by id) from run where plan_id = $1) as runs,
              (select array_agg(state order by id) from import where plan_id = $1) as imports,
              (select count(*) from flag_decision where plan_id = $1) as decisions,
              (select count(*) from sign_off where plan_id = $1) as sign_offs,
              (select count(*) from publication where plan_id = $1) as publications,
              (select count(*) from outbox where plan_id = $1) as jobs,
              (select count(*) from audit_entry where plan_id = $1) as facts`,
      [tenant.planId],
    );
    return rows[0];
  }

  it('knows a body for every route that takes one', () => {
    const missing = ROUTES.filter((route) => route.body && !SAMPLE_BODIES[route.id]).map((route) => route.id);
    expect(missing).toEqual([]);
  });

  it.each(behindSignIn.map((route) => [route.id, route] as const))(
    '%s asks a stranger to sign in',
    async (_, route) => {
      expect(await call(api.client(), route, own)).toMatchObject({ status: 401, body: problemWith('not-signed-in') });
    },
  );

  const forbidden = pairs(limited, (route, hat) => !mayCall(route, hat));
  it.each(forbidden)('%s is forbidden to %s', async (_, hat, route) => {
    expect(await call(clients[hat], route, own)).toMatchObject({ status: 403, body: problemWith('forbidden') });
  });

  const crossing = pairs(withIds, mayCall);
  it.each(crossing)('%s shows %s neither a foreign thing nor whether it exists', async (_, hat, route) => {
    const before = await stateOf(foreign);
    const answers = [];
    for (const ids of [foreign, nobodys(foreign)]) {
      const { status, body } = await call(clients[hat], route, ids);
      expect({ status, body }).toMatchObject({ status: 404, body: problemWith('not-found') });
      const { requestId, instance, ...told } = body;
      expect([typeof requestId, typeof instance]).toEqual(['string', 'string']);
      answers.push(told);
    }
    expect(answers[0]).toEqual(answers[1]);
    expect(await stateOf(foreign)).toEqual(before);
  });

  const allowedReads = pairs(reads, mayCall);
  it.each(allowedReads)('%s lets %s see what is their own, and nothing foreign in it', async (_, hat, route) => {
    const { status, body } = await call(clients[hat], route, own);
    expect(status).toBe(200);
    const text = JSON.stringify(body);
    for (const id of Object.values(foreign)) if (typeof id === 'string') expect(text).not.toContain(id);
  });

  const participantReads = withIds.filter(
    (route) => mayCall(route, 'participant') && route.path.includes('statements'),
  );
  it.each(participantReads.map((route) => [route.id, route] as const))(
    '%s does not show a participant the statement of a colleague',
    async (_, route) => {
      const colleague = { ...own, statementId: own.neighbourStatementId };
      expect(await call(clients.participant, route, colleague)).toMatchObject({ status: 404 });
      expect((await call(clients.administrator, route, colleague)).status).toBe(200);
    },
  );
});

/** Ids that nobody has. */
const nobodys = (tenant: Tenant): Tenant =>
  Object.fromEntries(
    Object.entries(tenant).map(([key, value]) => [key, typeof value === 'string' ? randomUUID() : value]),
  ) as unknown as Tenant;
