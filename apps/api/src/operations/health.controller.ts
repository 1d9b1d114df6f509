import { type BeforeApplicationShutdown, Controller, Inject, Res } from '@nestjs/common';
import { EntityManager } from '@mikro-orm/postgresql';
import type { FastifyReply } from 'fastify';
import type { Redis } from 'ioredis';
import { setTimeout as pause } from 'node:timers/promises';
import { REDIS } from '../platform/redis.js';
import { OpenRoute } from '../platform/routing/route-of.decorator.js';
import { SchemaGate } from './schema.gate.js';

type Check = 'up' | 'down' | 'behind';

const PATIENCE_MS = 2_000;

/** Probes of the platform: `live` says that the process answers, `ready` that it can do its work now. */
@Controller()
export class HealthController implements BeforeApplicationShutdown {
  private isStopping = false;

  constructor(
    private readonly em: EntityManager,
    private readonly schema: SchemaGate,
    @Inject(REDIS) private readonly redis: Redis,
  ) {}

  @OpenRoute('/api/health/live')
  live() {
    return { status: 'up' };
  }

  @OpenRoute('/api/health/ready')
  async ready(@Res({ passthrough: true }) reply: FastifyReply) {
    const [database, redis, schema] = await Promise.all([
      this.check(() => this.em.fork().execute('select 1')),
      this.check(() => this.redis.ping()),
      this.check(async () => ((await this.schema.missing()).length > 0 ? 'behind' : 'up')),
    ]);
    const isReady = !this.isStopping && [database, redis, schema].every((state) => state === 'up');
    reply.status(isReady ? 200 : 503).header('cache-control', 'no-store');
    return { status: isReady ? 'up' : 'down', checks: { database, redis, schema } };
  }

  /** Tells the platform to send nobody here any more while the open requests are finished. */
  beforeApplicationShutdown(): void {
    this.isStopping = true;
  }

  private async check(probe: () => Promise<unknown>): Promise<Check> {
    try {
      const found = await Promise.race([probe(), pause(PATIENCE_MS, 'down', { ref: false })]);
      return found === 'down' || found === 'behind' ? found : 'up';
    } catch {
      return 'down';
    }
  }
}
