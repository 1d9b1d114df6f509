import type { ProblemCode } from '@quarterpoise/dto';

/** Rules that the database keeps raise an SQLSTATE of our own class; this is what each means to the outside. */
const CODES: Readonly<Record<string, ProblemCode>> = {
  QP001: 'second-person-needed',
  QP002: 'sign-off-stale',
  QP003: 'own-account',
  QP005: 'flags-undecided',
  QP006: 'illegal-move',
};

/** The refusal that an error of the database stands for, or null when it is none. */
export function refusalOf(error: unknown): { code: ProblemCode; detail: string } | null {
  let cause = error;
  while (cause instanceof Error && cause.cause instanceof Error) cause = cause.cause;
  if (!(cause instanceof Error) || !('code' in cause)) return null;
  const code = CODES[String(cause.code)];
  if (!code) return null;
  const text = cause.message.split(' - ').at(-1) ?? cause.message;
  return { code, detail: text.charAt(0).toUpperCase() + text.slice(1) };
}
