import type { Problem, ProblemCode } from '@quarterpoise/dto';

/** `unreachable` is ours: no answer came at all, so there is no code of the service's. */
export type ShownProblemCode = ProblemCode | 'unreachable';

export type FieldFault = NonNullable<Problem['errors']>[number];

/** A refusal or failure as the service told it. Its title and remedy for people stand under `problems:<code>`. */
export class ProblemError extends Error {
  override readonly name = 'ProblemError';
  readonly code: ShownProblemCode;
  readonly status: number;
  readonly detail: string;
  readonly requestId: string | null;
  readonly errors: readonly FieldFault[];
  /** From the Retry-After header of a 429 or 503. */
  readonly retryAfterSeconds: number | null;

  constructor(fields: {
    code: ShownProblemCode;
    status: number;
    detail?: string;
    requestId?: string | null;
    errors?: readonly FieldFault[];
    retryAfterSeconds?: number | null;
  }) {
    super(fields.detail ?? fields.code);
    this.code = fields.code;
    this.status = fields.status;
    this.detail = fields.detail ?? '';
    this.requestId = fields.requestId ?? null;
    this.errors = fields.errors ?? [];
    this.retryAfterSeconds = fields.retryAfterSeconds ?? null;
  }
}

/** Code for an answer that carries no problem document, such as a proxy's own error page. */
function codeOfStatus(status: number): ProblemCode {
  if (status === 401) return 'not-signed-in';
  if (status === 403) return 'forbidden';
  if (status === 404) return 'not-found';
  if (status === 413) return 'import-too-large';
  if (status === 429) return 'too-many-requests';
  if (status === 502 || status === 503 || status === 504) return 'service-unavailable';
  return 'internal-error';
}

export function problemFrom(status: number, text: string, retryAfter: string | null): ProblemError {
  const seconds = retryAfter === null ? Number.NaN : Number(retryAfter);
  const retryAfterSeconds = Number.isFinite(seconds) ? seconds : null;
  try {
    const body = JSON.parse(text) as Partial<Problem>;
    if (typeof body.code === 'string') {
      return new ProblemError({
        code: body.code,
        status,
        detail: body.detail ?? '',
        requestId: body.requestId ?? null,
        errors: body.errors ?? [],
        retryAfterSeconds,
      });
    }
  } catch {
    // Not JSON: the status has to do.
  }
  return new ProblemError({ code: codeOfStatus(status), status, retryAfterSeconds });
}

/** Anything thrown, as a problem. A fault of our own is named as such; its inner words are for the console, not for people. */
export function asProblem(error: unknown): ProblemError {
  return error instanceof ProblemError ? error : new ProblemError({ code: 'internal-error', status: 0 });
}

/** The fault of one field, by the last part of its pointer (`/body/statedRows` and `/statedRows` both name `statedRows`). */
export function faultOf(problem: ProblemError | null, field: string): string | undefined {
  return problem?.errors.find((fault) => fault.pointer.split('/').at(-1) === field)?.detail;
}
