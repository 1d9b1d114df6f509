import type { IncomingMessage, ServerResponse } from 'node:http';
import type { Params } from 'nestjs-pino';
import type { Environment } from '../config/env.js';

/** What hides in a log line if anybody ever logs a whole request. */
const SECRETS = [
  'req.headers.cookie',
  'req.headers.authorization',
  'req.headers["x-csrf-token"]',
  'res.headers["set-cookie"]',
  'email',
  'password',
  '*.email',
  '*.password',
];

/** Middleware sees an address that has lost its beginning; the whole one is kept beside it. */
function addressOf(request: IncomingMessage & { originalUrl?: string }): string {
  return request.originalUrl ?? request.url ?? '';
}

/** One JSON line per request: id, method, address without its query (searches hold names), status and time. No person, no amounts. */
export function loggingOptions(environment: Environment): Params {
  return {
    pinoHttp: {
      level: environment.log.level,
      base: { service: 'api' },
      redact: { paths: SECRETS, censor: '[hidden]' },
      genReqId: (request: IncomingMessage) => request.id ?? '',
      serializers: {
        req: (request: { id: unknown; method: string; url: string }) => ({
          id: request.id,
          method: request.method,
          path: request.url.split('?', 1)[0],
        }),
        res: (response: ServerResponse) => ({ status: response.statusCode }),
      },
      autoLogging: { ignore: (request: IncomingMessage) => !addressOf(request).startsWith('/api/v1/') },
    },
  };
}
