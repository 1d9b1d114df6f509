import type { OpenAPIObject } from '@nestjs/swagger';
import { problem, PROBLEMS, type RouteDefinition } from '@quarterpoise/dto';
import { z } from 'zod';
import { API_PREFIX } from '../platform/routing/route-of.decorator.js';
import { SESSION_COOKIE } from '../platform/session/session.setup.js';

type Schema = Record<string, unknown>;

const schemaOf = (schema: z.ZodType, io: 'input' | 'output'): Schema => {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any' }) as Schema;
  return rest;
};

/** The OpenAPI 3.1 description of a route table: what the routes check by is what they are described by. */
export function openApiDocument(routes: readonly RouteDefinition[]): OpenAPIObject {
  const paths: Record<string, Record<string, unknown>> = {};
  for (const route of routes) {
    const path = `${API_PREFIX}${route.path.replace(/:(\w+)/g, '{$1}')}`;
    (paths[path] ??= {})[route.method.toLowerCase()] = operation(route);
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Quarterpoise',
      version: '1',
      description: [
        'Amounts are whole cents; dates are ISO civil dates; rates are decimal strings in percent.',
        'Writes carry the x-csrf-token of the session, and may carry an Idempotency-Key.',
        'Errors are problem details (RFC 9457) with one of these codes:',
        Object.entries(PROBLEMS)
          .map(([code, { status, title, remedy }]) => `- \`${code}\` (${status}): ${title}. ${remedy}`)
          .join('\n'),
      ].join('\n\n'),
    },
    paths: paths as OpenAPIObject['paths'],
    components: {
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: SESSION_COOKIE } },
      schemas: { Problem: schemaOf(problem, 'output') },
    } as NonNullable<OpenAPIObject['components']>,
  };
}

function operation(route: RouteDefinition): Schema {
  const isOpen = route.access.kind === 'public';
  return {
    operationId: route.id,
    summary: route.summary,
    tags: [route.id.split('.', 1)[0]],
    description: whoMay(route),
    security: isOpen ? [] : [{ session: [] }],
    parameters: [
      ...parameters(route.params, 'path'),
      ...parameters(route.query, 'query'),
      ...(route.method === 'GET' || isOpen ? [] : WRITE_HEADERS),
    ],
    ...(route.body && {
      requestBody: {
        required: true,
        content: {
          [route.consumes === 'multipart' ? 'multipart/form-data' : 'application/json']: { schema: bodyOf(route) },
        },
      },
    }),
    responses: {
      [route.status ?? 200]: success(route),
      default: {
        description: 'A problem',
        content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
      },
    },
  };
}

const WRITE_HEADERS = [
  { name: 'x-csrf-token', in: 'header', required: true, schema: { type: 'string' } },
  { name: 'idempotency-key', in: 'header', required: false, schema: { type: 'string', maxLength: 200 } },
];

function whoMay({ access }: RouteDefinition): string {
  if (access.kind === 'public') return 'Anybody.';
  return access.kind === 'signed-in' ? 'Anybody signed in.' : `Roles: ${access.hats.join(', ')}.`;
}

function parameters(schema: z.ZodObject | undefined, place: 'path' | 'query'): Schema[] {
  if (!schema) return [];
  const { properties = {}, required = [] } = schemaOf(schema, 'input') as {
    properties?: Record<string, Schema>;
    required?: string[];
  };
  return Object.entries(properties).map(([name, described]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: described,
  }));
}

function bodyOf(route: RouteDefinition): Schema {
  const schema = schemaOf(route.body!, 'input');
  if (route.consumes !== 'multipart') return schema;
  const file = { type: 'string', contentMediaType: 'application/octet-stream', description: 'Comes last.' };
  return {
    ...schema,
    properties: { ...(schema['properties'] as Schema), file },
    required: [...((schema['required'] as string[] | undefined) ?? []), 'file'],
  };
}

function success(route: RouteDefinition): Schema {
  if (route.produces === 'csv') return { description: 'A CSV file', content: { 'text/csv': {} } };
  if (route.produces === 'events') {
    return { description: 'Events progress and finished', content: { 'text/event-stream': {} } };
  }
  if (!route.response) return { description: 'Done' };
  return { description: 'Done', content: { 'application/json': { schema: schemaOf(route.response, 'output') } } };
}
