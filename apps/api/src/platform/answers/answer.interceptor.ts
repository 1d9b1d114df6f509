import {
  type CallHandler,
  type ExecutionContext,
  Inject,
  Injectable,
  type NestInterceptor,
  StreamableFile,
} from '@nestjs/common';
import type { RouteDefinition } from '@quarterpoise/dto';
import type { FastifyReply, FastifyRequest } from 'fastify';
import type { Redis } from 'ioredis';
import { Readable } from 'node:stream';
import { mergeMap, type Observable } from 'rxjs';
import { ENVIRONMENT, type Environment } from '../../config/env.js';
import { ProblemException } from '../problems/problem.exception.js';
import { REDIS } from '../redis.js';
import { ROUTE } from '../routing/route-of.decorator.js';
import { isSessionAlive } from '../session/redis-session.store.js';
import { CsvDownload, PreparedJson, ProgressStream, Tagged } from './answers.js';
import { ProgressStreams } from './progress-streams.js';

/** Puts what a handler returned on the wire: bodies by the schema of the route and nothing beyond it, tags, files and event streams. */
@Injectable()
export class AnswerInterceptor implements NestInterceptor {
  private readonly isProduction: boolean;

  constructor(
    private readonly streams: ProgressStreams,
    @Inject(REDIS) private readonly redis: Redis,
    @Inject(ENVIRONMENT) environment: Environment,
  ) {
    this.isProduction = environment.mode === 'production';
  }

  intercept(context: ExecutionContext, next: CallHandler): Observable<unknown> {
    const route = Reflect.getMetadata(ROUTE, context.getHandler()) as RouteDefinition | undefined;
    if (!route) return next.handle();
    const http = context.switchToHttp();
    const request = http.getRequest<FastifyRequest>();
    const reply = http.getResponse<FastifyReply>();
    return next.handle().pipe(mergeMap((answer) => this.send(route, answer, request, reply)));
  }

  /** A stream outlives the request's own check of the sign-in, so each look checks again. */
  private whileSignedIn({ look }: ProgressStream, { session, person }: FastifyRequest): ProgressStream {
    if (!person) return new ProgressStream(look);
    return new ProgressStream(async () => {
      if (!(await isSessionAlive(this.redis, session.sessionId))) throw new ProblemException('not-signed-in');
      return look();
    });
  }

  private async send(route: RouteDefinition, answer: unknown, request: FastifyRequest, reply: FastifyReply) {
    if (answer instanceof ProgressStream) {
      reply.header('cache-control', 'no-cache').header('x-accel-buffering', 'no');
      const stream = await this.streams.start(this.whileSignedIn(answer, request));
      return new StreamableFile(stream, { type: 'text/event-stream' });
    }
    reply.header('cache-control', 'no-store');
    if (answer instanceof CsvDownload) {
      reply.header('content-disposition', `attachment; filename="${answer.fileName.replace(/[^\w.-]/g, '_')}"`);
      return new StreamableFile(Readable.from(answer.lines, { objectMode: false }), {
        type: 'text/csv; charset=utf-8',
      });
    }
    const tag = answer instanceof Tagged || answer instanceof PreparedJson ? answer.tag : null;
    if (tag !== null && isStillGood(request, reply, tag)) return undefined;
    if (answer instanceof PreparedJson) {
      if (!this.isProduction) inContract(route, JSON.parse(answer.text));
      reply.header('content-type', 'application/json; charset=utf-8');
      return answer.text;
    }
    return inContract(route, answer instanceof Tagged ? answer.body : answer);
  }
}

/** Sets the tag; true when the client has it already, and the answer is then 304 without a body (RFC 9110, section 13.1.2). */
function isStillGood(request: FastifyRequest, reply: FastifyReply, tag: string): boolean {
  const etag = `"${tag}"`;
  // kept by the client alone, and asked about each time: the right to see it may have gone meanwhile
  reply.header('etag', etag).header('cache-control', 'private, no-cache');
  const known = request.headers['if-none-match'];
  if (known === undefined) return false;
  const isKnown = known.trim() === '*' || known.split(',').some((entry) => entry.trim().replace(/^W\//, '') === etag);
  if (isKnown) reply.status(304);
  return isKnown;
}

/**
 * The answer with the fields of the route's schema and no others.
 * @throws Error when the answer is not what the route promises: a fault of ours. The message names places, never values.
 */
export function inContract(route: RouteDefinition, answer: unknown): unknown {
  if (!route.response) return undefined;
  const parsed = route.response.safeParse(answer);
  if (parsed.success) return parsed.data;
  const places = parsed.error.issues.map((issue) => `/${issue.path.join('/')} ${issue.code}`);
  throw new Error(`${route.id} did not answer by its schema: ${places.join('; ')}`);
}
