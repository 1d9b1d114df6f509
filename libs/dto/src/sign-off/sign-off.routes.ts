import { z } from 'zod';
import { idParams } from '../http/page.dto.js';
import { defineRoute, hats } from '../http/route.js';
import { resultRow, runSummary } from '../run/run.dto.js';
import { quarterSummary } from '../quarter/quarter.dto.js';

/** What the second person looks at before signing. */
export const signOffSheet = z.object({
  quarter: quarterSummary,
  run: runSummary,
  lastQuarter: z
    .object({ code: z.string(), distribution: z.array(z.object({ fromPct: z.number(), count: z.int() })) })
    .nullable(),
  /** Ten accounts drawn by a seed that the run's own digest gives, so that the sample can be drawn again. */
  sample: z.array(resultRow),
  undecidedFlagCount: z.int(),
  heldCount: z.int(),
  /** Why the reader may not sign, or null. */
  refusal: z.object({ code: z.string(), detail: z.string() }).nullable(),
});
export type SignOffSheet = z.infer<typeof signOffSheet>;

export const signOffBody = z.object({
  runId: z.uuid(),
  remark: z.string().trim().max(500).default(''),
  confirmed: z.literal(true),
});

export const signOffRoutes = {
  sheet: defineRoute({
    id: 'sign-off.sheet',
    method: 'GET',
    path: '/quarters/:id/sign-off',
    access: hats('administrator', 'approver', 'auditor'),
    summary: 'Totals, distribution and sample for the sign-off',
    params: idParams,
    response: signOffSheet,
  }),
  sign: defineRoute({
    id: 'sign-off.sign',
    method: 'POST',
    path: '/quarters/:id/sign-off',
    access: hats('approver'),
    summary: 'Sign a run off as the second person',
    params: idParams,
    body: signOffBody,
    response: quarterSummary,
  }),
  publish: defineRoute({
    id: 'publication.publish',
    method: 'POST',
    path: '/quarters/:id/publication',
    access: hats('administrator', 'approver'),
    summary: 'Publish the signed-off run',
    params: idParams,
    body: z.object({ runId: z.uuid() }),
    response: quarterSummary,
    status: 202,
  }),
};
