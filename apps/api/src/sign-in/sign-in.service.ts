import { Injectable, Logger } from '@nestjs/common';
import { EntityManager } from '@mikro-orm/postgresql';
import { hash, verify } from '@node-rs/argon2';
import type { AuditAction, Hat } from '@quarterpoise/dto';
import { randomBytes } from 'node:crypto';
import { setTimeout as pause } from 'node:timers/promises';
import { ProblemException } from '../platform/problems/problem.exception.js';
import { IdentityReader } from './identity.reader.js';
import { SignInThrottle } from './sign-in.throttle.js';

/** Every refusal takes at least this long, whatever was found out on the way: longer than one check of a password. */
const REFUSAL_MS = 250;

type SignInFact = Extract<AuditAction, `person.${string}`>;

export interface SignedIn {
  readonly personId: string;
  readonly hat: Hat;
}

/**
 * Checks e-mail address and password (Argon2id). A wrong address, a wrong password and a switched-off person are one answer that takes
 * one time: an unknown address is checked against the hash of a password that nobody knows.
 */
@Injectable()
export class SignInService {
  private readonly logger = new Logger(SignInService.name);
  private readonly nobodysHash = hash(randomBytes(32));

  constructor(
    private readonly em: EntityManager,
    private readonly identity: IdentityReader,
    private readonly throttle: SignInThrottle,
  ) {}

  /** @throws ProblemException wrong-credentials, too-many-requests, or forbidden for a person without any role. */
  async signIn(email: string, password: string, from: { ip: string; requestId: string }): Promise<SignedIn> {
    const noSoonerThan = pause(REFUSAL_MS);
    await this.throttle.take(email, from.ip);
    const credentials = await this.identity.credentialsOf(email);
    const isRight = await verify(credentials?.passwordHash ?? (await this.nobodysHash), password);
    if (!credentials || !isRight || credentials.isDisabled) {
      if (credentials) {
        const reason = isRight ? 'disabled' : 'wrong-password';
        await this.record('person.sign_in_refused', credentials.personId, from.requestId, { reason });
      }
      this.logger.warn({ msg: 'sign-in refused', requestId: from.requestId });
      await noSoonerThan;
      throw new ProblemException('wrong-credentials');
    }
    await this.throttle.turnedOutWell(email, from.ip);
    const [hat] = await this.identity.hatsOf(credentials.personId);
    if (!hat) throw new ProblemException('forbidden', 'No role has been given to this sign-in yet.');
    await this.record('person.signed_in', credentials.personId, from.requestId);
    return { personId: credentials.personId, hat };
  }

  async recordSignOut(personId: string, requestId: string): Promise<void> {
    await this.record('person.signed_out', personId, requestId);
  }

  private async record(fact: SignInFact, personId: string, requestId: string, details: object = {}): Promise<void> {
    await this.em
      .fork()
      .execute('select app.record_sign_in(?, ?, ?::jsonb, ?)', [personId, fact, JSON.stringify(details), requestId]);
  }
}
