import { type CanActivate, type ExecutionContext, Inject, Injectable } from '@nestjs/common';
import type { RouteDefinition } from '@quarterpoise/dto';
import type { FastifyRequest, Session } from 'fastify';
import { timingSafeEqual } from 'node:crypto';
import { ENVIRONMENT, type Environment } from '../../config/env.js';
import { ProblemException } from '../problems/problem.exception.js';
import { OPEN_ROUTE, ROUTE } from '../routing/route-of.decorator.js';
import type { CurrentPerson } from './current-person.decorator.js';
import { isSameOrigin } from './same-origin.js';

/**
 * Lets a request through only if its route says so: what is bound to no route is refused. Runs before anything is parsed.
 * Which rows a person may see is not decided here but by the database, in the scope of the person.
 */
@Injectable()
export class AccessGuard implements CanActivate {
  constructor(@Inject(ENVIRONMENT) private readonly environment: Environment) {}

  canActivate(context: ExecutionContext): boolean {
    const handler = context.getHandler();
    if (Reflect.getMetadata(OPEN_ROUTE, handler) === true) return true;
    const route = Reflect.getMetadata(ROUTE, handler) as RouteDefinition | undefined;
    if (!route) throw new ProblemException('forbidden');

    const request = context.switchToHttp().getRequest<FastifyRequest>();
    const isWrite = route.method !== 'GET';
    if (isWrite && !isSameOrigin(request.headers, this.environment.http.publicOrigin)) {
      throw new ProblemException('csrf-token-invalid', 'The request came from a page that is not ours.');
    }
    const person = personOf(request);
    if (person) request.person = person;
    if (route.access.kind === 'public') return true;
    if (!person) throw new ProblemException('not-signed-in');
    if (isWrite && !holdsToken(request.session, request.headers['x-csrf-token'])) {
      throw new ProblemException('csrf-token-invalid');
    }
    if (route.access.kind === 'hats' && !route.access.hats.includes(person.hat)) {
      throw new ProblemException('forbidden');
    }
    return true;
  }
}

function personOf(request: FastifyRequest): CurrentPerson | undefined {
  const { personId, hat } = request.session;
  return personId !== undefined && hat !== undefined
    ? { kind: 'person', personId, hat, requestId: request.id }
    : undefined;
}

function holdsToken({ csrfToken }: Session, given: string | string[] | undefined): boolean {
  if (csrfToken === undefined || typeof given !== 'string') return false;
  const expected = Buffer.from(csrfToken);
  const actual = Buffer.from(given);
  return expected.length === actual.length && timingSafeEqual(expected, actual);
}
