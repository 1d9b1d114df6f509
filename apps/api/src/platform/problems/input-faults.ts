import type { ProblemError } from '@quarterpoise/dto';
import type { z } from 'zod';

/** A pointer's tokens escape `~` and `/` (RFC 6901, section 3). */
const token = (part: PropertyKey) => String(part).replaceAll('~', '~0').replaceAll('/', '~1');

/** Zod's own sentence for a pattern shows the pattern, which says nothing to people. */
function sentence(issue: z.core.$ZodIssue): string {
  if (issue.code === 'invalid_type' && issue.message.endsWith('received undefined')) return 'This is required.';
  if (issue.code === 'invalid_format' && issue.message.includes('must match pattern')) {
    return 'This is not written in the expected form.';
  }
  return issue.message;
}

/**
 * The faults of one part of a request as places and sentences.
 * @param prefix '' for the body; `/query` or `/params` for the others.
 */
export function inputFaults(error: z.core.$ZodError, prefix: '' | '/query' | '/params'): ProblemError[] {
  return error.issues.map((issue) => ({
    pointer: [prefix, ...issue.path.map(token)].join('/'),
    code: issue.code.replaceAll('_', '-'),
    detail: sentence(issue),
  }));
}
