import fastifyCookie from '@fastify/cookie';
import fastifySession from '@fastify/session';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import type { Redis } from 'ioredis';
import type { Environment } from '../../config/env.js';
import { RedisSessionStore } from './redis-session.store.js';

export const SESSION_COOKIE = 'quarterpoise_session';
/** The cookie goes to the API only, so that pages and their files cost no look-up. */
export const SESSION_PATH = '/api';

export async function setUpSessions(app: NestFastifyApplication, environment: Environment, redis: Redis) {
  await app.register(fastifyCookie);
  await app.register(fastifySession, {
    secret: environment.session.secret,
    cookieName: SESSION_COOKIE,
    store: new RedisSessionStore(redis),
    // nobody gets a cookie or a place in Redis before signing in
    saveUninitialized: false,
    // the store puts the idle end off; the browser forgets the cookie when it is closed
    rolling: false,
    cookie: { path: SESSION_PATH, httpOnly: true, sameSite: 'lax', secure: environment.http.isSecure },
  });
}
