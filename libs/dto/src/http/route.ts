import type { z } from 'zod';
import type { Hat } from '../identity/hat.dto.js';

/** Who may call a route: anybody, anybody signed in, or the listed hats. Nothing is assumed: a route without it cannot be written. */
export type Access =
  | { readonly kind: 'public' }
  | { readonly kind: 'signed-in' }
  | { readonly kind: 'hats'; readonly hats: readonly Hat[] };

export const PUBLIC: Access = { kind: 'public' };
export const SIGNED_IN: Access = { kind: 'signed-in' };
export const hats = (...list: [Hat, ...Hat[]]): Access => ({ kind: 'hats', hats: list });

export interface RouteDefinition {
  /** Stable name, `<area>.<verb>`; also the OpenAPI operation id. */
  readonly id: string;
  readonly method: 'GET' | 'POST' | 'PUT' | 'DELETE';
  /** Path below /api/v1 with `:parameters`. */
  readonly path: string;
  readonly access: Access;
  readonly summary: string;
  readonly params?: z.ZodObject;
  readonly query?: z.ZodObject;
  readonly body?: z.ZodType;
  /** What a success carries; absent for 204, for a file and for an event stream. */
  readonly response?: z.ZodType;
  /** The status of a success; 200 unless said. */
  readonly status?: 200 | 201 | 202 | 204;
  /** `json` unless said. */
  readonly produces?: 'json' | 'csv' | 'events';
  /** `json` unless said; `multipart` bodies are streamed and their fields checked by the body schema. */
  readonly consumes?: 'json' | 'multipart';
}

/** Keeps the literal types of a route so that `request(route, …)` and the Nest DTO classes read their shapes from it. */
export const defineRoute = <const R extends RouteDefinition>(route: R): R => route;
