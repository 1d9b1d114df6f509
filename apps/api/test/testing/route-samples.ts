import type { RouteDefinition } from '@quarterpoise/dto';
import type { Tenant } from './tenant.js';

/** Which id stands behind `:id` of an address, by the word before it. */
const ID_OF: Readonly<Record<string, keyof Tenant>> = {
  plans: 'planId',
  quarters: 'quarterId',
  imports: 'importId',
  runs: 'runId',
  statements: 'statementId',
  participants: 'participantId',
};

/** The address of a route with ids of a tenant filled in. */
export function addressIn(route: RouteDefinition, tenant: Tenant): string {
  return route.path.replace(/\/([\w-]+)\/:\w+/g, (_, noun: string) => {
    const key = ID_OF[noun];
    if (!key) throw new Error(`${route.id}: say in ID_OF which id of a tenant stands in ${route.path}`);
    return `/${noun}/${String(tenant[key])}`;
  });
}

/** A query without which a route answers nothing. */
export const SAMPLE_QUERIES: Readonly<Record<string, string>> = { 'support.find': '?search=Alder' };

/** A body that a route's schema takes, naming ids of the tenant where the body names any. */
export const SAMPLE_BODIES: Readonly<Record<string, (tenant: Tenant) => Record<string, unknown>>> = {
  'identity.sign-in': () => ({ email: 'nobody@example.test', password: 'wrong' }),
  'identity.choose-hat': () => ({ hat: 'operator' }),
  'identity.choose-language': () => ({ language: 'en' }),
  'imports.upload': () => ({ kind: 'roster', statedRows: '1' }),
  'runs.start': () => ({ isRehearsal: true }),
  'review.decide': ({ flagId }) => ({ flagIds: [flagId], decision: 'accepted', reason: 'Looked at.' }),
  'sign-off.sign': ({ runId }) => ({ runId, confirmed: true }),
  'publication.publish': ({ runId }) => ({ runId }),
};
