import { testServices } from '@quarterpoise/database/testing';
import type { Session } from 'fastify';
import { Redis } from 'ioredis';
import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import {
  ABSOLUTE_SECONDS,
  IDLE_SECONDS,
  isSessionAlive,
  RedisSessionStore,
} from '../src/platform/session/redis-session.store.js';

describe('sign-ins in Redis', () => {
  let redis: Redis;
  let now = Date.now();
  let store: RedisSessionStore;

  beforeAll(() => {
    redis = new Redis(testServices().redisUrl);
    store = new RedisSessionStore(redis, () => now);
  });
  afterAll(() => redis.quit());

  const set = (id: string, session: Partial<Session>) =>
    new Promise<void>((resolve, reject) =>
      store.set(id, session as Session, (error) => (error ? reject(error as Error) : resolve())),
    );
  const get = (id: string) =>
    new Promise<Session | null | undefined>((resolve, reject) =>
      store.get(id, (error, session) => (error ? reject(error as Error) : resolve(session))),
    );
  const ttl = (id: string) => redis.ttl(`session:${id}`);

  it('end half an hour after the last request', async () => {
    const id = randomUUID();
    await set(id, { personId: 'p', signedInAt: now });
    expect(await ttl(id)).toBe(IDLE_SECONDS);
    await redis.expire(`session:${id}`, 5);
    expect(await get(id)).toMatchObject({ personId: 'p' });
    expect(await ttl(id)).toBe(IDLE_SECONDS);
  });

  it('end twelve hours after signing in, however busy', async () => {
    const id = randomUUID();
    const signedInAt = now;
    await set(id, { personId: 'p', signedInAt });
    now = signedInAt + (ABSOLUTE_SECONDS - 60) * 1_000;
    expect(await get(id)).not.toBeNull();
    await set(id, { personId: 'p', signedInAt });
    expect(await ttl(id)).toBe(60);
    now = signedInAt + ABSOLUTE_SECONDS * 1_000;
    expect(await get(id)).toBeNull();
    expect(await isSessionAlive(redis, id)).toBe(false);
  });

  it('are not put off by asking whether they are there', async () => {
    const id = randomUUID();
    await set(id, { personId: 'p', signedInAt: now });
    await redis.expire(`session:${id}`, 5);
    expect(await isSessionAlive(redis, id)).toBe(true);
    expect(await ttl(id)).toBeLessThanOrEqual(5);
  });

  it('take no place before anybody has signed in', async () => {
    const id = randomUUID();
    await set(id, {});
    expect(await isSessionAlive(redis, id)).toBe(false);
  });
});
