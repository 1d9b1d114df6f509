import { Injectable } from '@nestjs/common';
import { type Limit, RateLimit } from '../platform/limits/rate-limit.js';
import { ProblemException } from '../platform/problems/problem.exception.js';

const QUARTER_HOUR = 15 * 60;
/** Guesses at one person's password from one place. */
const PERSON_AND_PLACE: Limit = { name: 'sign-in-person', most: 10, windowSeconds: QUARTER_HOUR };
/** Guesses from one place at anybody's; offices share one address, so this is generous. */
const PLACE: Limit = { name: 'sign-in-place', most: 100, windowSeconds: QUARTER_HOUR };

/** Only failures stay counted; nobody can lock another person out from elsewhere. */
@Injectable()
export class SignInThrottle {
  constructor(private readonly limits: RateLimit) {}

  /**
   * Counts a try as a failure until it turns out well.
   * @throws ProblemException too-many-requests with the time to wait.
   */
  async take(email: string, ip: string): Promise<void> {
    const waits = await Promise.all([
      this.limits.take(PERSON_AND_PLACE, personAndPlace(email, ip)),
      this.limits.take(PLACE, ip),
    ]);
    const longest = Math.max(...waits.map((wait) => wait ?? 0));
    if (longest > 0) throw new ProblemException('too-many-requests', undefined, { retryAfterSeconds: longest });
  }

  async turnedOutWell(email: string, ip: string): Promise<void> {
    await Promise.all([
      this.limits.forget(PERSON_AND_PLACE, personAndPlace(email, ip)),
      this.limits.giveBack(PLACE, ip),
    ]);
  }
}

const personAndPlace = (email: string, ip: string) => `${email.toLowerCase()} ${ip}`;
