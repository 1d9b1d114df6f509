import { identityRoutes } from '../identity/identity.routes.js';
import { importRoutes } from '../import/import.routes.js';
import { planRoutes } from '../plan/plan.routes.js';
import { quarterRoutes } from '../quarter/quarter.routes.js';
import { reviewRoutes } from '../review/review.routes.js';
import { runRoutes } from '../run/run.routes.js';
import { signOffRoutes } from '../sign-off/sign-off.routes.js';
import { statementRoutes } from '../statement/statement.routes.js';
import { supportRoutes } from '../support/support.routes.js';
import type { RouteDefinition } from './route.js';

/** Every route of the API. The access matrix and OpenAPI are generated from this list; a controller outside it does not start. */
export const ROUTES: readonly RouteDefinition[] = [
  identityRoutes,
  planRoutes,
  quarterRoutes,
  importRoutes,
  runRoutes,
  reviewRoutes,
  signOffRoutes,
  statementRoutes,
  supportRoutes,
].flatMap((area) => Object.values<RouteDefinition>(area));
