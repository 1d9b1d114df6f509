import { type CallHandler, type ExecutionContext, Inject, Injectable, type NestInterceptor } from '@nestjs/common';
import { EntityManager } from '@mikro-orm/postgresql';
import { withScope } from '@quarterpoise/database';
import type { RouteDefinition } from '@quarterpoise/dto';
import type { FastifyReply, FastifyRequest } from 'fastify';
import type { Redis } from 'ioredis';
import { createHash } from 'node:crypto';
import { setTimeout as pause } from 'node:timers/promises';
import { from, lastValueFrom, type Observable } from 'rxjs';
import type { CurrentPerson } from './access/current-person.decorator.js';
import { ProblemException } from './problems/problem.exception.js';
import { REDIS } from './redis.js';
import { ROUTE } from './routing/route-of.decorator.js';
import type { RouteInput } from './routing/route-input.js';

interface StoredAnswer {
  route_id: string;
  request_sha256: Buffer;
  status: number;
  response: unknown;
}

/** Longer than any write takes; the lock of a process that died is gone after this. */
const LOCK_SECONDS = 60;
/** Only by whoever holds it: after its end another request may. */
const RELEASE = `if redis.call('GET', KEYS[1]) == ARGV[1] then redis.call('DEL', KEYS[1]) end`;
const WAIT_SECONDS = 20;
const WAIT_STEP_MS = 100;

/**
 * Writes with an Idempotency-Key header are done once: a repeat gets the stored answer, and two at the same time are done one after the
 * other. Refusals are not stored, so that a mended request may use its key again. A process that dies between the write and the storing
 * leaves the repeat to the rules of the write itself, which refuse a second move from the same state.
 * Of an upload the fields and the file's name stand for the request, since the file itself is never held.
 */
@Injectable()
export class IdempotencyInterceptor implements NestInterceptor {
  constructor(
    private readonly em: EntityManager,
    @Inject(REDIS) private readonly redis: Redis,
  ) {}

  intercept(context: ExecutionContext, next: CallHandler): Observable<unknown> {
    const http = context.switchToHttp();
    const request = http.getRequest<FastifyRequest>();
    const key = request.headers['idempotency-key'];
    const route = Reflect.getMetadata(ROUTE, context.getHandler()) as RouteDefinition | undefined;
    if (route?.method !== 'POST' || key === undefined || !request.person) return next.handle();
    if (typeof key !== 'string' || key.length > 200 || key === '') {
      throw new ProblemException('malformed-request', 'An idempotency key has 1 to 200 characters.');
    }
    return from(this.once(key, route, request.person, request, http.getResponse<FastifyReply>(), next));
  }

  private async once(
    key: string,
    route: RouteDefinition,
    person: CurrentPerson,
    request: FastifyRequest,
    reply: FastifyReply,
    next: CallHandler,
  ): Promise<unknown> {
    const digest = digestOf(request.routeInput);
    const lock = `idempotency:${person.personId}:${createHash('sha256').update(key).digest('base64url')}`;
    await this.take(lock, request.id);
    try {
      const stored = await this.stored(person, key);
      if (stored) {
        if (stored.route_id !== route.id || !stored.request_sha256.equals(digest)) {
          throw new ProblemException('idempotency-key-reused');
        }
        reply.status(stored.status).header('idempotency-replayed', 'true').header('cache-control', 'no-store');
        return stored.response ?? undefined;
      }
      const answer: unknown = await lastValueFrom(next.handle());
      await this.store(person, key, route, digest, answer);
      return answer;
    } finally {
      await this.redis.eval(RELEASE, 1, lock, request.id).catch(() => undefined);
    }
  }

  private async take(lock: string, holder: string): Promise<void> {
    const givenUpAt = Date.now() + WAIT_SECONDS * 1_000;
    while ((await this.redis.set(lock, holder, 'EX', LOCK_SECONDS, 'NX')) === null) {
      if (Date.now() > givenUpAt) {
        throw new ProblemException('service-unavailable', 'The same request is still being worked on.', {
          retryAfterSeconds: WAIT_SECONDS,
        });
      }
      await pause(WAIT_STEP_MS);
    }
  }

  private async stored(person: CurrentPerson, key: string): Promise<StoredAnswer | undefined> {
    return withScope(this.em, person, async (tx) => {
      const [row] = await tx.execute<StoredAnswer[]>(
        'select route_id, request_sha256, status, response from idempotency_key where person_id = ? and key = ?',
        [person.personId, key],
      );
      return row;
    });
  }

  private async store(person: CurrentPerson, key: string, route: RouteDefinition, digest: Buffer, answer: unknown) {
    await withScope(this.em, person, (tx) =>
      tx.execute(
        `insert into idempotency_key (person_id, key, route_id, request_sha256, status, response)
         values (?, ?, ?, ?, ?, ?::jsonb) on conflict do nothing`,
        [person.personId, key, route.id, digest, route.status ?? 200, JSON.stringify(answer ?? null)],
      ),
    );
  }
}

function digestOf(input: RouteInput | undefined): Buffer {
  const { params, query, body, file } = input ?? {};
  return createHash('sha256')
    .update(JSON.stringify([params, query, body, file?.fileName]))
    .digest();
}
