import type { Problem, ProblemCode } from '@quarterpoise/dto';
import { vi } from 'vitest';
import { API_ROUTES, type RouteId, type RouteResponse } from '../lib/routes';

export interface Call {
  id: RouteId;
  params: Record<string, string>;
  query: Record<string, string>;
  body: unknown;
  headers: Record<string, string>;
}

export class Refusal {
  constructor(
    readonly status: number,
    readonly code: ProblemCode,
    readonly more: Partial<Problem> & { retryAfter?: number } = {},
  ) {}
}

type Answers = { [Id in RouteId]?: (call: Call) => RouteResponse<Id> | Refusal };

interface FakeApi {
  calls: Call[];
  callsOf(id: RouteId): Call[];
  answer(more: Answers): void;
}

const patterns = Object.entries(API_ROUTES).map(([id, { method, path }]) => ({
  id: id as RouteId,
  method,
  names: Array.from(path.matchAll(/:(\w+)/g), ([, name = '']) => name),
  pattern: new RegExp(`^/api/v1${path.replace(/:\w+/g, '([^/]+)').replace('.', '\\.')}$`),
}));

/** Stands in for the service: answers by route, keeps what was asked, and fails the test on a route without an answer. */
export function fakeApi(answers: Answers): FakeApi {
  const known: Answers = { ...answers };
  const calls: Call[] = [];
  const fetchLike = async (address: string, init: RequestInit = {}): Promise<Response> => {
    const url = new URL(address, 'http://localhost');
    for (const { id, method, names, pattern } of patterns) {
      const match = method === (init.method ?? 'GET') ? pattern.exec(url.pathname) : null;
      if (!match) continue;
      const call: Call = {
        id,
        params: Object.fromEntries(names.map((name, index) => [name, match[index + 1] ?? ''])),
        query: Object.fromEntries(url.searchParams),
        body: typeof init.body === 'string' ? JSON.parse(init.body) : undefined,
        headers: (init.headers ?? {}) as Record<string, string>,
      };
      calls.push(call);
      const answer = known[id];
      if (!answer) throw new Error(`the test gives no answer to ${id}`);
      return respond(answer(call));
    }
    throw new Error(`no route of the contract is ${init.method ?? 'GET'} ${url.pathname}`);
  };
  vi.stubGlobal('fetch', vi.fn(fetchLike));
  return {
    calls,
    callsOf: (id) => calls.filter((call) => call.id === id),
    answer: (more) => void Object.assign(known, more),
  };
}

function respond(answer: unknown): Response {
  if (!(answer instanceof Refusal)) {
    return new Response(answer === undefined ? null : JSON.stringify(answer), {
      status: answer === undefined ? 204 : 200,
    });
  }
  const { retryAfter, ...more } = answer.more;
  const problem: Problem = {
    type: `/problems/${answer.code}`,
    title: answer.code,
    status: answer.status,
    detail: '',
    instance: '',
    code: answer.code,
    requestId: 'request-1',
    ...more,
  };
  return new Response(JSON.stringify(problem), {
    status: answer.status,
    headers: {
      'content-type': 'application/problem+json',
      ...(retryAfter !== undefined && { 'retry-after': String(retryAfter) }),
    },
  });
}
