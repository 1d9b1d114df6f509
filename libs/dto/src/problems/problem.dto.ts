import { z } from 'zod';
import { PROBLEMS, type ProblemCode } from './problem-codes.js';

export const problemCode = z.enum(Object.keys(PROBLEMS) as [ProblemCode, ...ProblemCode[]]);

/** One faulty place: an RFC 6901 pointer into the body, or `/query/<name>`. */
export const problemError = z.object({ pointer: z.string(), code: z.string(), detail: z.string() });

/** RFC 9457 problem details, `application/problem+json`. */
export const problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  instance: z.string(),
  code: problemCode,
  requestId: z.string(),
  errors: z.array(problemError).optional(),
});
export type Problem = z.infer<typeof problem>;
export type ProblemError = z.infer<typeof problemError>;
