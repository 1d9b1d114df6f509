import { z } from 'zod';
import { idParams, pageOf, pageQuery } from '../http/page.dto.js';
import { defineRoute, hats } from '../http/route.js';
import { civilDate } from '../civil-date.js';
import { statementSummary, statementView } from './statement.dto.js';

/** An account of the signed-in participant; `held` tells that this quarter's figure is held back, with the sponsor's message. */
export const ownAccount = z.object({
  accountId: z.uuid(),
  planCode: z.string(),
  planName: z.string(),
  sponsorName: z.string(),
  participantNumber: z.string(),
  joinedOn: civilDate.nullable(),
  leftOn: civilDate.nullable(),
  latestStatementId: z.uuid().nullable(),
  held: z.object({ quarterCode: z.string(), message: z.string() }).nullable(),
});
export type OwnAccount = z.infer<typeof ownAccount>;

export const statementRoutes = {
  ownAccounts: defineRoute({
    id: 'statements.own-accounts',
    method: 'GET',
    path: '/my/accounts',
    access: hats('participant'),
    summary: 'One’s own accounts',
    response: pageOf(ownAccount),
  }),
  own: defineRoute({
    id: 'statements.own',
    method: 'GET',
    path: '/my/statements',
    access: hats('participant'),
    summary: 'One’s own statements, newest first',
    query: pageQuery.extend({ accountId: z.uuid().optional() }),
    response: pageOf(statementSummary),
  }),
  view: defineRoute({
    id: 'statements.view',
    method: 'GET',
    path: '/statements/:id',
    access: hats('participant', 'support', 'administrator', 'approver', 'auditor'),
    summary: 'One statement',
    params: idParams,
    response: statementView,
  }),
};
