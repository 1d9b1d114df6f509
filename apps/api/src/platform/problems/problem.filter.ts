import { type ArgumentsHost, Catch, type ExceptionFilter, Logger } from '@nestjs/common';
import { type Problem, PROBLEMS } from '@quarterpoise/dto';
import type { FastifyReply, FastifyRequest } from 'fastify';
import { loggableError } from './loggable-error.js';
import { ProblemException } from './problem.exception.js';
import { problemOf } from './problem-of.js';

/** Every error leaves here as problem details (RFC 9457). What nobody foresaw is logged and tells the caller nothing but its request id. */
@Catch()
export class ProblemFilter implements ExceptionFilter {
  private readonly logger = new Logger(ProblemFilter.name);

  catch(error: unknown, host: ArgumentsHost): void {
    const request = host.switchToHttp().getRequest<FastifyRequest>();
    const reply = host.switchToHttp().getResponse<FastifyReply>();
    const foreseen = problemOf(error);
    if (!foreseen || foreseen.status >= 500) {
      this.logger.error({
        msg: foreseen ? 'request could not be served' : 'request failed unforeseen',
        requestId: request.id,
        error: loggableError(error),
      });
    }
    if (reply.sent) return;
    const exception = foreseen ?? new ProblemException('internal-error');
    const problem: Problem = {
      type: `/problems/${exception.code}`,
      title: PROBLEMS[exception.code].title,
      status: exception.status,
      detail: exception.message,
      instance: request.url.split('?', 1)[0]!,
      code: exception.code,
      requestId: request.id,
      ...(exception.errors && { errors: [...exception.errors] }),
    };
    if (exception.retryAfterSeconds !== undefined) reply.header('retry-after', String(exception.retryAfterSeconds));
    void reply
      .status(exception.status)
      .header('content-type', 'application/problem+json; charset=utf-8')
      .header('cache-control', 'no-store')
      .send(JSON.stringify(problem));
  }
}
