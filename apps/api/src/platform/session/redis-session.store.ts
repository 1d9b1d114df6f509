import type { SessionStore } from '@fastify/session';
import type { Session } from 'fastify';
import type { Redis } from 'ioredis';

/** A sign-in ends after half an hour without a request … */
export const IDLE_SECONDS = 30 * 60;
/** … and after twelve hours in any case. */
export const ABSOLUTE_SECONDS = 12 * 60 * 60;

const keyOf = (id: string) => `session:${id}`;

type Done = (error?: unknown) => void;

/** Whether a sign-in is still there, without putting its end off: an open page that only listens is not somebody at work. */
export async function isSessionAlive(redis: Redis, id: string): Promise<boolean> {
  return (await redis.exists(keyOf(id))) === 1;
}

/**
 * Sign-ins in Redis. Reading one puts its idle end off in the same command, so that a request costs one round trip and no write of ours.
 */
export class RedisSessionStore implements SessionStore {
  constructor(
    private readonly redis: Redis,
    private readonly now: () => number = Date.now,
  ) {}

  get(id: string, done: (error: unknown, session?: Session | null) => void): void {
    this.read(id).then(
      (session) => done(null, session),
      (error: unknown) => done(error),
    );
  }

  set(id: string, session: Session, done: Done): void {
    // an empty one is what a regenerated id starts as; it is written once it holds somebody
    if (session.personId === undefined) return done();
    const left = this.secondsLeft(session);
    const writing =
      left > 0
        ? this.redis.set(keyOf(id), JSON.stringify(session), 'EX', Math.min(IDLE_SECONDS, left))
        : this.redis.del(keyOf(id));
    writing.then(() => done(), done);
  }

  destroy(id: string, done: Done): void {
    this.redis.del(keyOf(id)).then(() => done(), done);
  }

  private async read(id: string): Promise<Session | null> {
    const text = await this.redis.getex(keyOf(id), 'EX', IDLE_SECONDS);
    if (text === null) return null;
    const session = JSON.parse(text) as Session;
    if (this.secondsLeft(session) > 0) return session;
    await this.redis.del(keyOf(id));
    return null;
  }

  private secondsLeft(session: Session): number {
    return Math.ceil((session.signedInAt ?? 0) / 1_000 + ABSOLUTE_SECONDS - this.now() / 1_000);
  }
}
