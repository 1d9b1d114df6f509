import { Inject, Injectable } from '@nestjs/common';
import { createHash } from 'node:crypto';
import type { Redis } from 'ioredis';
import { REDIS } from '../redis.js';

export interface Limit {
  /** What is counted, for the key: `sign-in-address`. */
  readonly name: string;
  readonly most: number;
  readonly windowSeconds: number;
}

/** Counts and sets the end of the window in one step, so that a crash in between cannot leave a counter that never ends. */
const COUNT = `
  local count = redis.call('INCR', KEYS[1])
  if count == 1 then redis.call('EXPIRE', KEYS[1], ARGV[1]) end
  return count
`;

/** Counters with an end, in Redis, so that all processes count together. Subjects are hashed: no addresses lie in Redis. */
@Injectable()
export class RateLimit {
  constructor(@Inject(REDIS) private readonly redis: Redis) {}

  /** Seconds until the subject may try again, or null while it may. Counts nothing. */
  async waitFor(limit: Limit, subject: string): Promise<number | null> {
    const key = this.key(limit, subject);
    const [[, count], [, seconds]] = (await this.redis.multi().get(key).ttl(key).exec()) as [
      [Error | null, string | null],
      [Error | null, number],
    ];
    return Number(count ?? 0) >= limit.most ? Math.max(seconds, 1) : null;
  }

  async count(limit: Limit, subject: string): Promise<void> {
    await this.redis.eval(COUNT, 1, this.key(limit, subject), limit.windowSeconds);
  }

  async forget(limit: Limit, subject: string): Promise<void> {
    await this.redis.del(this.key(limit, subject));
  }

  private key({ name }: Limit, subject: string): string {
    return `limit:${name}:${createHash('sha256').update(subject).digest('base64url')}`;
  }
}
