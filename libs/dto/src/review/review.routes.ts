import { z } from 'zod';
import { idParams, pageOf, pageQuery } from '../http/page.dto.js';
import { defineRoute, hats } from '../http/route.js';
import { resultStatus } from '../run/run.dto.js';

export const flagDecision = z.enum(['accepted', 'held', 'reopened']);

export const flagRow = z.object({
  id: z.uuid(),
  accountId: z.uuid().nullable(),
  participantNumber: z.string().nullable(),
  name: z.string().nullable(),
  code: z.string(),
  severity: z.enum(['blocking', 'review', 'notice']),
  /** Values for the sentence of this code. */
  figures: z.record(z.string(), z.union([z.string(), z.number(), z.null()])),
  status: resultStatus.nullable(),
  periodReturnPct: z.string().nullable(),
  firstEstimatePct: z.string().nullable(),
  decision: z
    .object({
      decision: flagDecision,
      reason: z.string(),
      message: z.string().nullable(),
      decidedByName: z.string(),
      decidedAt: z.iso.datetime(),
    })
    .nullable(),
});
export type FlagRow = z.infer<typeof flagRow>;

/** Decides several flags of one run at once. A hold needs the message that the participant will read. */
export const flagDecisionsBody = z.object({
  flagIds: z.array(z.uuid()).min(1).max(500),
  decision: flagDecision,
  reason: z.string().trim().min(1).max(500),
  message: z.string().trim().min(1).max(1000).optional(),
});

export const reviewRoutes = {
  flags: defineRoute({
    id: 'review.flags',
    method: 'GET',
    path: '/runs/:id/flags',
    access: hats('administrator', 'approver', 'auditor'),
    summary: 'Flags of a run, worst first',
    params: idParams,
    query: pageQuery.extend({ undecided: z.stringbool().optional(), code: z.string().max(60).optional() }),
    response: pageOf(flagRow),
  }),
  decide: defineRoute({
    id: 'review.decide',
    method: 'POST',
    path: '/runs/:id/flag-decisions',
    access: hats('administrator'),
    summary: 'Accept flags with a reason, hold accounts back, or reopen a decision',
    params: idParams,
    body: flagDecisionsBody,
    response: z.object({ decided: z.int() }),
  }),
};
