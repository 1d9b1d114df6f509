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
const TAKE = `
  local count = redis.call('INCR', KEYS[1])
  if count == 1 then redis.call('EXPIRE', KEYS[1], ARGV[2]) end
  if count <= tonumber(ARGV[1]) then return 0 end
  return math.max(redis.call('TTL', KEYS[1]), 1)
`;

const GIVE_BACK = `if redis.call('EXISTS', KEYS[1]) == 1 then redis.call('DECR', KEYS[1]) end`;

/** Counters with an end, in Redis, so that all processes count together. Subjects are hashed: no addresses lie in Redis. */
@Injectable()
export class RateLimit {
  constructor(@Inject(REDIS) private readonly redis: Redis) {}

  /**
   * Counts one try before it is made, so that many at the same moment are not all let through.
   * @returns Seconds until the subject may try again, or null when this try may go ahead.
   */
  async take(limit: Limit, subject: string): Promise<number | null> {
    const seconds = await this.redis.eval(TAKE, 1, this.key(limit, subject), limit.most, limit.windowSeconds);
    return Number(seconds) === 0 ? null : Number(seconds);
  }

  /** Takes one counted try back. */
  async giveBack(limit: Limit, subject: string): Promise<void> {
    await this.redis.eval(GIVE_BACK, 1, this.key(limit, subject));
  }

  async forget(limit: Limit, subject: string): Promise<void> {
    await this.redis.del(this.key(limit, subject));
  }

  private key({ name }: Limit, subject: string): string {
    return `limit:${name}:${createHash('sha256').update(subject).digest('base64url')}`;
  }
}
