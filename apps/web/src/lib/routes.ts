import type {
  identityRoutes,
  importRoutes,
  planRoutes,
  quarterRoutes,
  reviewRoutes,
  runRoutes,
  signOffRoutes,
  statementRoutes,
  supportRoutes,
} from '@quarterpoise/dto';
import type { z } from 'zod';

type ValueOf<T> = T[keyof T];

/** Every route of the contract, as a type: the schemas themselves stay out of the browser. */
export type ApiRoute =
  | ValueOf<typeof identityRoutes>
  | ValueOf<typeof planRoutes>
  | ValueOf<typeof quarterRoutes>
  | ValueOf<typeof importRoutes>
  | ValueOf<typeof runRoutes>
  | ValueOf<typeof reviewRoutes>
  | ValueOf<typeof signOffRoutes>
  | ValueOf<typeof statementRoutes>
  | ValueOf<typeof supportRoutes>;

export type RouteId = ApiRoute['id'];
export type RouteOf<Id extends RouteId> = Extract<ApiRoute, { id: Id }>;

type SchemaInput<Route, Field extends string> =
  Route extends Record<Field, infer S extends z.ZodType> ? z.input<S> : undefined;

export type RouteParams<Id extends RouteId> = SchemaInput<RouteOf<Id>, 'params'>;
export type RouteQuery<Id extends RouteId> = SchemaInput<RouteOf<Id>, 'query'>;
export type RouteBody<Id extends RouteId> = SchemaInput<RouteOf<Id>, 'body'>;
export type RouteResponse<Id extends RouteId> =
  RouteOf<Id> extends { response: infer S extends z.ZodType } ? z.output<S> : undefined;

/**
 * Method and path of each route. Restated, because importing the route tables would bring every schema into the first load;
 * the type holds it to the contract letter by letter, so that a route that is added, moved or renamed there fails to compile here.
 */
export const API_ROUTES: { readonly [Id in RouteId]: Pick<RouteOf<Id>, 'method' | 'path'> } = {
  'identity.sign-in': { method: 'POST', path: '/auth/sign-in' },
  'identity.sign-out': { method: 'POST', path: '/auth/sign-out' },
  'identity.session': { method: 'GET', path: '/auth/session' },
  'identity.choose-hat': { method: 'POST', path: '/auth/hat' },
  'identity.choose-language': { method: 'POST', path: '/auth/language' },
  'identity.demo-accounts': { method: 'GET', path: '/auth/demo-accounts' },
  'plans.list': { method: 'GET', path: '/plans' },
  'plans.view': { method: 'GET', path: '/plans/:planId' },
  'quarters.list': { method: 'GET', path: '/plans/:planId/quarters' },
  'quarters.view': { method: 'GET', path: '/quarters/:id' },
  'imports.upload': { method: 'POST', path: '/plans/:planId/imports' },
  'imports.list': { method: 'GET', path: '/plans/:planId/imports' },
  'imports.view': { method: 'GET', path: '/imports/:id' },
  'imports.errors': { method: 'GET', path: '/imports/:id/errors' },
  'imports.errors-file': { method: 'GET', path: '/imports/:id/errors.csv' },
  'imports.commit': { method: 'POST', path: '/imports/:id/commit' },
  'imports.discard': { method: 'POST', path: '/imports/:id/discard' },
  'imports.events': { method: 'GET', path: '/imports/:id/events' },
  'runs.start': { method: 'POST', path: '/quarters/:id/runs' },
  'runs.view': { method: 'GET', path: '/runs/:id' },
  'runs.cancel': { method: 'POST', path: '/runs/:id/cancel' },
  'runs.events': { method: 'GET', path: '/runs/:id/events' },
  'runs.results': { method: 'GET', path: '/runs/:id/results' },
  'review.flags': { method: 'GET', path: '/runs/:id/flags' },
  'review.decide': { method: 'POST', path: '/runs/:id/flag-decisions' },
  'sign-off.sheet': { method: 'GET', path: '/quarters/:id/sign-off' },
  'sign-off.sign': { method: 'POST', path: '/quarters/:id/sign-off' },
  'publication.publish': { method: 'POST', path: '/quarters/:id/publication' },
  'statements.own-accounts': { method: 'GET', path: '/my/accounts' },
  'statements.own': { method: 'GET', path: '/my/statements' },
  'statements.view': { method: 'GET', path: '/statements/:id' },
  'support.find': { method: 'GET', path: '/participants' },
  'support.participant': { method: 'GET', path: '/participants/:id' },
};
