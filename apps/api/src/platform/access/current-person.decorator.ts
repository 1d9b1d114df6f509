import { createParamDecorator, type ExecutionContext } from '@nestjs/common';
import type { Hat } from '@quarterpoise/dto';
import type { FastifyRequest } from 'fastify';
import { ProblemException } from '../problems/problem.exception.js';

/** Who is asking and in which role. It is a scope as well: `withScope(em, person, …)`. */
export interface CurrentPerson {
  readonly kind: 'person';
  readonly personId: string;
  readonly hat: Hat;
  /** For the audit trail. */
  readonly requestId: string;
}

/** The signed-in person; only for routes that are not public. */
export const Person = createParamDecorator((_: unknown, context: ExecutionContext): CurrentPerson => {
  const { person } = context.switchToHttp().getRequest<FastifyRequest>();
  if (!person) throw new ProblemException('not-signed-in');
  return person;
});
