import { problemFrom, ProblemError } from './problem';
import {
  API_ROUTES,
  type RouteBody,
  type RouteId,
  type RouteParams,
  type RouteQuery,
  type RouteResponse,
} from './routes';

const BASE = '/api/v1';

type Given<Name extends string, Value> = [Value] extends [undefined]
  ? { [K in Name]?: undefined }
  : { [K in Name]: Value };
type Optional<Name extends string, Value> = { [K in Name]?: Value | undefined };

/** What a call has to say, read from its route: parameters and body must be given, the query may be. */
export type RequestInput<Id extends RouteId> = Given<'params', RouteParams<Id>> &
  Optional<'query', RouteQuery<Id>> &
  Given<'body', RouteBody<Id>> & {
    signal?: AbortSignal;
    /** Given on writes, so that a repeat after a lost answer does not do the work twice. */
    idempotencyKey?: string;
  };

let csrfToken: string | null = null;

/** Every write carries the token of the session; whoever learns of a session hands it in here. */
export function rememberCsrfToken(token: string | null): void {
  csrfToken = token;
}

export function csrfHeaders(): Record<string, string> {
  return csrfToken === null ? {} : { 'x-csrf-token': csrfToken };
}

/** A fresh key for one intention; `crypto.randomUUID` exists in secure contexts only, and a plain-http intranet is not one. */
export function newIdempotencyKey(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16));
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
}

export function addressOf<Id extends RouteId>(
  id: Id,
  params?: Record<string, unknown> | undefined,
  query?: Record<string, unknown> | undefined,
): string {
  const path = API_ROUTES[id].path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(String(params?.[name])));
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query ?? {})) {
    if (value !== undefined && value !== null && value !== '') search.set(name, String(value));
  }
  const tail = search.toString();
  return `${BASE}${path}${tail === '' ? '' : `?${tail}`}`;
}

/** One call of the API. Resolves with the answer's body, rejects with a {@link ProblemError} and with nothing else. */
export async function request<Id extends RouteId>(id: Id, input: RequestInput<Id>): Promise<RouteResponse<Id>> {
  const { method } = API_ROUTES[id];
  const headers: Record<string, string> = { accept: 'application/json' };
  if (method !== 'GET') Object.assign(headers, csrfHeaders());
  if (input.body !== undefined) headers['content-type'] = 'application/json';
  if (input.idempotencyKey !== undefined) headers['idempotency-key'] = input.idempotencyKey;

  let response: Response;
  let text: string;
  try {
    response = await fetch(addressOf(id, input.params, input.query as Record<string, unknown> | undefined), {
      method,
      headers,
      credentials: 'same-origin',
      ...(input.body !== undefined && { body: JSON.stringify(input.body) }),
      ...(input.signal && { signal: input.signal }),
    });
    text = await response.text();
  } catch {
    throw new ProblemError({ code: 'unreachable', status: 0 });
  }
  if (!response.ok) throw problemFrom(response.status, text, response.headers.get('retry-after'));
  return (text === '' ? undefined : JSON.parse(text)) as RouteResponse<Id>;
}
