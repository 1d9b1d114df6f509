import type { Hat } from '@quarterpoise/dto';
import type { CurrentPerson as Person } from './access/current-person.decorator.js';
import type { RouteInput } from './routing/route-input.js';

declare module 'fastify' {
  /** What a sign-in keeps in Redis: ids only, nothing about the person. */
  interface Session {
    personId?: string;
    hat?: Hat;
    csrfToken?: string;
    /** Milliseconds since 1970, from which the absolute end is counted. */
    signedInAt?: number;
  }

  interface FastifyRequest {
    /** Set by the access guard for whoever is signed in. */
    person?: Person;
    /** Set by the input interceptor. */
    routeInput?: RouteInput;
  }
}
