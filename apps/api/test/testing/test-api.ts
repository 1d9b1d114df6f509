import type { Type } from '@nestjs/common';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import { hash } from '@node-rs/argon2';
import { createTestDatabase, Factory, type TestDatabase, testServices } from '@quarterpoise/database/testing';
import { type Hat, type RouteDefinition, ROUTES } from '@quarterpoise/dto';
import { randomInt, randomUUID } from 'node:crypto';
import { FEATURES, type Composition } from '../../src/api.module.js';
import { parseEnvironment } from '../../src/config/env.js';
import { createApp } from '../../src/create-app.js';
import { handlersOf } from '../../src/platform/routing/route-table.check.js';
import { TestClient } from './test-client.js';

export const PASSWORD = 'correct horse battery staple';
/** Cheap to check: the tests are about signing in, not about how dear guessing is. */
const passwordHash = hash(PASSWORD, { memoryCost: 1_024, timeCost: 1 });

/** The routes of the table that the controllers of these modules answer. */
export function routesOf(features: readonly Type[]): RouteDefinition[] {
  const bound = new Set(
    features
      .flatMap((feature) => (Reflect.getMetadata('controllers', feature) as Type[] | undefined) ?? [])
      .flatMap((controller) => handlersOf(controller).map(({ route }) => route)),
  );
  return ROUTES.filter((route) => bound.has(route));
}

export interface TestApi {
  readonly app: NestFastifyApplication;
  readonly database: TestDatabase;
  readonly factory: Factory;
  readonly url: string;
  /** Somebody with this hat; `on` says where, a participant gets an account on the plan. */
  person(hat: Hat, on?: { sponsorId?: string; planId?: string }): Promise<{ personId: string; email: string }>;
  /** A client without a sign-in, as a browser on a machine of its own. */
  client(): TestClient;
  signIn(email: string): Promise<TestClient>;
  close(): Promise<void>;
}

/** The API of `createApp` on a database of its own and the shared Redis, listening on a free port. */
export async function startTestApi(
  composition: Partial<Composition> = {},
  variables: Record<string, string> = {},
): Promise<TestApi> {
  const features = composition.features ?? FEATURES;
  const routes = composition.routes ?? routesOf(features);
  const database = await createTestDatabase();
  const environment = parseEnvironment({
    NODE_ENV: 'test',
    LOG_LEVEL: 'silent',
    DATABASE_URL: database.appUrl,
    DATABASE_POOL_SIZE: '5',
    REDIS_URL: testServices().redisUrl,
    PUBLIC_URL: 'http://127.0.0.1:3000',
    SESSION_SECRET: randomUUID(),
    // each client comes from an address of its own, so that limits of one test do not reach into another
    TRUSTED_PROXIES: '127.0.0.1',
    ...variables,
  });
  const app = await createApp(environment, { features, routes }).catch(async (error: unknown) => {
    await database.close();
    throw error;
  });
  await app.listen(0, '127.0.0.1');
  const url = await app.getUrl();
  const factory = new Factory(database.owner);
  const client = () => new TestClient(url, `10.${randomInt(256)}.${randomInt(256)}.${randomInt(256)}`);
  return {
    app,
    database,
    factory,
    url,
    client,
    async person(hat, on = {}) {
      const email = `${hat}-${randomUUID()}@example.test`;
      const shared = { email, passwordHash: await passwordHash };
      if (hat === 'participant') {
        const personId = await factory.person(shared);
        await factory.participant(on.planId ?? (await factory.plan()), { claimedBy: personId });
        return { personId, email };
      }
      const isPlaced = on.sponsorId !== undefined || on.planId !== undefined;
      const where = hat === 'operator' ? {} : isPlaced ? on : { planId: await factory.plan() };
      return { personId: await factory.person({ ...shared, ...where, role: hat }), email };
    },
    async signIn(email) {
      const signedIn = client();
      const answer = await signedIn.post('/auth/sign-in', { email, password: PASSWORD });
      if (answer.status !== 200) throw new Error(`The sign-in of a test failed with ${answer.status}`);
      return signedIn;
    },
    async close() {
      await app.close();
      await database.close();
    },
  };
}
