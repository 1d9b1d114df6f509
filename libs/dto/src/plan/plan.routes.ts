import { z } from 'zod';
import { civilDate } from '../civil-date.js';
import { pageOf, planParams } from '../http/page.dto.js';
import { defineRoute, hats } from '../http/route.js';
import { quarterState } from '../quarter/quarter.dto.js';
import { returnPolicy } from './return-policy.dto.js';

export const planSummary = z.object({
  id: z.uuid(),
  code: z.string(),
  name: z.string(),
  sponsorName: z.string(),
  accountCount: z.int(),
  /** The quarter that needs attention: the oldest not yet published; null when none is open. */
  openQuarter: z.object({ id: z.uuid(), code: z.string(), state: quarterState, dueOn: civilDate }).nullable(),
});
export type PlanSummary = z.infer<typeof planSummary>;

export const planView = planSummary.extend({
  recordsBeginOn: civilDate,
  statementDueDays: z.int(),
  policy: z.object({ version: z.int(), effectiveFrom: civilDate, options: returnPolicy }),
});
export type PlanView = z.infer<typeof planView>;

const staff = hats('administrator', 'approver', 'auditor');

export const planRoutes = {
  list: defineRoute({
    id: 'plans.list',
    method: 'GET',
    path: '/plans',
    access: staff,
    summary: 'The plans in one’s care, most pressing first',
    response: pageOf(planSummary),
  }),
  view: defineRoute({
    id: 'plans.view',
    method: 'GET',
    path: '/plans/:planId',
    access: staff,
    summary: 'One plan with the policy in force',
    params: planParams,
    response: planView,
  }),
};
