import { Injectable } from '@nestjs/common';
import type { Hat, Language, SessionView } from '@quarterpoise/dto';
import type { FastifyRequest } from 'fastify';
import { randomBytes } from 'node:crypto';
import type { CurrentPerson } from '../platform/access/current-person.decorator.js';
import { ProblemException } from '../platform/problems/problem.exception.js';
import { IdentityReader } from './identity.reader.js';
import type { SignedIn } from './sign-in.service.js';

/** What a sign-in is between requests: begun under a new id, seen, moved to another role. */
@Injectable()
export class SessionService {
  constructor(private readonly identity: IdentityReader) {}

  /** Begins a sign-in under a fresh id, so that an id known beforehand is worth nothing (session fixation). */
  async begin(request: FastifyRequest, { personId, hat }: SignedIn): Promise<SessionView> {
    await request.session.regenerate();
    Object.assign(request.session, {
      personId,
      hat,
      csrfToken: randomBytes(24).toString('base64url'),
      signedInAt: Date.now(),
    });
    return this.view(request, { kind: 'person', personId, hat, requestId: request.id });
  }

  /** @throws ProblemException not-signed-in, and the sign-in has ended, when the person is off or no longer holds the hat. */
  async view(request: FastifyRequest, person: CurrentPerson): Promise<SessionView> {
    const view = await this.identity.sessionView(person, request.session.csrfToken ?? '');
    if (view) return view;
    await request.session.destroy();
    throw new ProblemException('not-signed-in', 'This sign-in may no longer act in its role. Sign in again.');
  }

  async chooseHat(request: FastifyRequest, person: CurrentPerson, hat: Hat): Promise<SessionView> {
    const hats = await this.identity.hatsOf(person.personId);
    if (!hats.includes(hat)) throw new ProblemException('forbidden', 'This role has not been given to you.');
    request.session.hat = hat;
    return this.view(request, { ...person, hat });
  }

  async chooseLanguage(request: FastifyRequest, person: CurrentPerson, language: Language): Promise<SessionView> {
    await this.identity.chooseLanguage(person, language);
    return this.view(request, person);
  }
}
