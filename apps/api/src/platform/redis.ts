import { Inject, Injectable, Logger, type OnApplicationShutdown, type Provider } from '@nestjs/common';
import { Redis } from 'ioredis';
import { ENVIRONMENT, type Environment } from '../config/env.js';

/** Token of the one connection to Redis. */
export const REDIS = Symbol('redis');

export const redisProvider: Provider = {
  provide: REDIS,
  inject: [ENVIRONMENT],
  useFactory: (environment: Environment) => {
    // one retry, then the request fails as "not available just now" instead of hanging for as long as Redis is away
    const redis = new Redis(environment.redis.url, { maxRetriesPerRequest: 1, connectTimeout: 5_000 });
    const logger = new Logger('Redis');
    redis.on('error', (error: Error) => logger.warn({ msg: 'redis is out of reach', reason: error.message }));
    return redis;
  },
};

@Injectable()
export class RedisShutdown implements OnApplicationShutdown {
  constructor(@Inject(REDIS) private readonly redis: Redis) {}

  async onApplicationShutdown(): Promise<void> {
    if (this.redis.status === 'ready') await this.redis.quit();
    else this.redis.disconnect();
  }
}
