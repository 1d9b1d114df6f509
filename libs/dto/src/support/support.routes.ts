import { z } from 'zod';
import { civilDate } from '../civil-date.js';
import { idParams, pageOf } from '../http/page.dto.js';
import { defineRoute, hats } from '../http/route.js';
import { statementSummary } from '../statement/statement.dto.js';

export const participantMatch = z.object({
  id: z.uuid(),
  planCode: z.string(),
  planName: z.string(),
  participantNumber: z.string(),
  givenName: z.string(),
  familyName: z.string(),
  email: z.string().nullable(),
  leftOn: civilDate.nullable(),
});
export type ParticipantMatch = z.infer<typeof participantMatch>;

export const participantView = participantMatch.extend({
  joinedOn: civilDate.nullable(),
  language: z.enum(['en', 'es']),
  delivery: z.enum(['email', 'paper']),
  statements: z.array(statementSummary),
});
export type ParticipantView = z.infer<typeof participantView>;

export const supportRoutes = {
  find: defineRoute({
    id: 'support.find',
    method: 'GET',
    path: '/participants',
    access: hats('support'),
    summary: 'Find a participant by name, number or e-mail address',
    query: z.object({ search: z.string().trim().min(2).max(80) }),
    response: pageOf(participantMatch),
  }),
  participant: defineRoute({
    id: 'support.participant',
    method: 'GET',
    path: '/participants/:id',
    access: hats('support'),
    summary: 'One participant and their statements; the look is on the audit trail',
    params: idParams,
    response: participantView,
  }),
};
