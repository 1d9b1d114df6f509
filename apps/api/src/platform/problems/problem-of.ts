import { HttpException } from '@nestjs/common';
import { IllegalMove, refusalOf, ScopeRefused, SubjectNotFound } from '@quarterpoise/database';
import { ProblemException } from './problem.exception.js';

/** Codes of node's network errors: the other side is down or going down. */
const NETWORK = new Set(['ECONNREFUSED', 'ECONNRESET', 'ENOTFOUND', 'ETIMEDOUT', 'EPIPE', 'EAI_AGAIN', 'EHOSTUNREACH']);

/**
 * SQLSTATEs after which the same request may well succeed: connection lost (08), out of connections (53300), shutting down or starting
 * (57P01 to 57P03), and transactions that lost a race (40001, 40P01). PostgreSQL manual, appendix A.
 */
const PASSING_SQLSTATE = /^(08...|53300|57P0[123]|40001|40P01)$/;

const PASSING_MESSAGE =
  /^Connection is closed\.?$|^Connection terminated|^Reached the max retries per request limit|Timeout acquiring a connection/;

const RETRY_AFTER_SECONDS = 2;

/** An error and what caused it, outermost first. */
function* chain(error: unknown): Generator<Error> {
  for (let link = error, depth = 0; link instanceof Error && depth < 10; link = link.cause, depth += 1) {
    yield link;
    if (link instanceof AggregateError) for (const inner of link.errors) yield* chain(inner);
  }
}

function isPassing(error: unknown): boolean {
  for (const link of chain(error)) {
    const code = 'code' in link ? String(link.code) : '';
    if (NETWORK.has(code) || PASSING_SQLSTATE.test(code) || PASSING_MESSAGE.test(link.message)) return true;
  }
  return false;
}

/** Refusals of the HTTP layer itself: unreadable JSON, a foreign content type, an address that is none. */
function fromTransport(status: number): ProblemException | null {
  if (status === 404 || status === 405) return new ProblemException('not-found', 'There is nothing at this address.');
  if (status === 413) return new ProblemException('malformed-request', 'The request is larger than allowed here.');
  if (status >= 400 && status < 500) return new ProblemException('malformed-request');
  return null;
}

/** The problem that an error stands for; null when nobody foresaw it, which is an internal error. */
export function problemOf(error: unknown): ProblemException | null {
  if (error instanceof ProblemException) return error;
  if (error instanceof IllegalMove) return new ProblemException('illegal-move', error.reason);
  if (error instanceof SubjectNotFound) return new ProblemException('not-found');
  if (error instanceof ScopeRefused) return new ProblemException('forbidden');
  const refusal = refusalOf(error);
  if (refusal) return new ProblemException(refusal.code, refusal.detail);
  if (error instanceof HttpException) return fromTransport(error.getStatus());
  if (isPassing(error)) {
    return new ProblemException('service-unavailable', undefined, { retryAfterSeconds: RETRY_AFTER_SECONDS });
  }
  if (error instanceof Error && 'statusCode' in error && typeof error.statusCode === 'number') {
    return fromTransport(error.statusCode);
  }
  return null;
}
