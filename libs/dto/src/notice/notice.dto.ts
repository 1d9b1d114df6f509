import { z } from 'zod';
import { language } from '../identity/identity.routes.js';

export const noticeTemplate = z.enum([
  'statement_ready',
  'statement_restated',
  'inquiry_answered',
  'invitation',
  'password_reset',
]);
export type NoticeTemplate = z.infer<typeof noticeTemplate>;
export const noticeState = z.enum(['queued', 'sent', 'failed', 'bounced']);

/** All that a notice may carry: no figure, no personal data beyond the name. Templates see these fields and no others. */
export const noticeFields = z.object({
  givenName: z.string(),
  planName: z.string(),
  documentName: z.string(),
  link: z.url(),
  preferencesLink: z.url(),
  sponsorName: z.string(),
});
export type NoticeFields = z.infer<typeof noticeFields>;

/** A versioned wording: subject, text and HTML bodies in Handlebars; `planId` null is the product's own default. */
export const wordingTemplate = z.object({
  id: z.uuid(),
  planId: z.uuid().nullable(),
  template: noticeTemplate,
  language,
  version: z.int(),
  subject: z.string(),
  bodyText: z.string(),
  bodyHtml: z.string(),
});
export type WordingTemplate = z.infer<typeof wordingTemplate>;
