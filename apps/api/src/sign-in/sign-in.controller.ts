import { Controller, Req, Res } from '@nestjs/common';
import { identityRoutes, type SessionView } from '@quarterpoise/dto';
import type { FastifyReply, FastifyRequest } from 'fastify';
import type { CurrentPerson } from '../platform/access/current-person.decorator.js';
import { Person } from '../platform/access/current-person.decorator.js';
import { Input } from '../platform/routing/input.decorator.js';
import type { InputOf } from '../platform/routing/route-input.js';
import { RouteOf } from '../platform/routing/route-of.decorator.js';
import { SESSION_COOKIE, SESSION_PATH } from '../platform/session/session.setup.js';
import { DemoAccountsReader } from './demo-accounts.reader.js';
import { SessionService } from './session.service.js';
import { SignInService } from './sign-in.service.js';

@Controller()
export class SignInController {
  constructor(
    private readonly signIns: SignInService,
    private readonly sessions: SessionService,
    private readonly demo: DemoAccountsReader,
  ) {}

  @RouteOf(identityRoutes.signIn)
  async signIn(
    @Input() { body }: InputOf<typeof identityRoutes.signIn>,
    @Req() request: FastifyRequest,
  ): Promise<SessionView> {
    const signedIn = await this.signIns.signIn(body.email, body.password, { ip: request.ip, requestId: request.id });
    return this.sessions.begin(request, signedIn);
  }

  @RouteOf(identityRoutes.signOut)
  async signOut(
    @Person() person: CurrentPerson,
    @Req() request: FastifyRequest,
    @Res({ passthrough: true }) reply: FastifyReply,
  ): Promise<void> {
    await request.session.destroy();
    reply.clearCookie(SESSION_COOKIE, { path: SESSION_PATH });
    await this.signIns.recordSignOut(person.personId, person.requestId);
  }

  @RouteOf(identityRoutes.session)
  session(@Person() person: CurrentPerson, @Req() request: FastifyRequest): Promise<SessionView> {
    return this.sessions.view(request, person);
  }

  @RouteOf(identityRoutes.chooseHat)
  chooseHat(
    @Person() person: CurrentPerson,
    @Input() { body }: InputOf<typeof identityRoutes.chooseHat>,
    @Req() request: FastifyRequest,
  ): Promise<SessionView> {
    return this.sessions.chooseHat(request, person, body.hat);
  }

  @RouteOf(identityRoutes.chooseLanguage)
  chooseLanguage(
    @Person() person: CurrentPerson,
    @Input() { body }: InputOf<typeof identityRoutes.chooseLanguage>,
    @Req() request: FastifyRequest,
  ): Promise<SessionView> {
    return this.sessions.chooseLanguage(request, person, body.language);
  }

  @RouteOf(identityRoutes.demoAccounts)
  demoAccounts() {
    return this.demo.list();
  }
}
