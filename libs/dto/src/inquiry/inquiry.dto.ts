import { z } from 'zod';
import { language } from '../identity/identity.routes.js';
import { windowCode } from '../plan/return-policy.dto.js';

export const INQUIRY_STATES = ['open', 'answered', 'handed_over', 'closed'] as const;
export const inquiryState = z.enum(INQUIRY_STATES);
export type InquiryState = z.infer<typeof inquiryState>;

export const inquiryMessage = z.object({
  id: z.uuid(),
  authorName: z.string(),
  authorHat: z.enum(['participant', 'support', 'administrator']),
  visibility: z.enum(['participant', 'internal']),
  body: z.string(),
  sentAt: z.iso.datetime(),
});

/** A question that hangs on a figure: the statement version and, where it was asked from one, the window. */
export const inquiry = z.object({
  id: z.uuid(),
  planId: z.uuid(),
  accountId: z.uuid(),
  participantId: z.uuid(),
  statementId: z.uuid().nullable(),
  windowCode: windowCode.nullable(),
  state: inquiryState,
  subject: z.string(),
  language,
  assignedToName: z.string().nullable(),
  openedAt: z.iso.datetime(),
  dueAt: z.iso.datetime(),
  closedAt: z.iso.datetime().nullable(),
  messages: z.array(inquiryMessage),
});
export type Inquiry = z.infer<typeof inquiry>;
