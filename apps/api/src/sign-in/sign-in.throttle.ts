import { Injectable } from '@nestjs/common';
import { type Limit, RateLimit } from '../platform/limits/rate-limit.js';
import { ProblemException } from '../platform/problems/problem.exception.js';

const QUARTER_HOUR = 15 * 60;
/** Guesses at one person's password from one place. */
const PERSON_AND_PLACE: Limit = { name: 'sign-in-person', most: 10, windowSeconds: QUARTER_HOUR };
/** Guesses from one place at anybody's; offices share one address, so this is generous. */
const PLACE: Limit = { name: 'sign-in-place', most: 100, windowSeconds: QUARTER_HOUR };

/** Failed sign-ins are counted, successful ones are not; nobody can lock another person out from elsewhere. */
@Injectable()
export class SignInThrottle {
  constructor(private readonly limits: RateLimit) {}

  /** @throws ProblemException too-many-requests with the time to wait. */
  async check(email: string, ip: string): Promise<void> {
    const waits = await Promise.all(subjects(email, ip).map(([limit, subject]) => this.limits.waitFor(limit, subject)));
    const longest = Math.max(...waits.map((wait) => wait ?? 0));
    if (longest > 0) throw new ProblemException('too-many-requests', undefined, { retryAfterSeconds: longest });
  }

  async countFailure(email: string, ip: string): Promise<void> {
    await Promise.all(subjects(email, ip).map(([limit, subject]) => this.limits.count(limit, subject)));
  }

  async forgetFailures(email: string, ip: string): Promise<void> {
    await this.limits.forget(...subjects(email, ip)[0]);
  }
}

const subjects = (email: string, ip: string) =>
  [
    [PERSON_AND_PLACE, `${email.toLowerCase()} ${ip}`],
    [PLACE, ip],
  ] as const;
