import { PROBLEMS, type ProblemCode, type ProblemError } from '@quarterpoise/dto';

/** A refusal that the caller is told about: a code of the closed list, what is the matter here, and which fields are at fault. */
export class ProblemException extends Error {
  override readonly name = 'ProblemException';
  readonly errors: readonly ProblemError[] | undefined;
  readonly retryAfterSeconds: number | undefined;

  constructor(
    readonly code: ProblemCode,
    detail: string = PROBLEMS[code].remedy,
    more: { errors?: readonly ProblemError[]; retryAfterSeconds?: number } = {},
  ) {
    super(detail);
    this.errors = more.errors;
    this.retryAfterSeconds = more.retryAfterSeconds;
  }

  get status(): number {
    return PROBLEMS[this.code].status;
  }
}

/** What is not there and what is not yours look the same from outside. */
export const notFound = () => new ProblemException('not-found');
