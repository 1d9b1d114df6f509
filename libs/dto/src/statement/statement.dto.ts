import { z } from 'zod';
import { civilDate } from '../civil-date.js';
import { language } from '../identity/identity.routes.js';
import { cents } from '../money.js';
import { movements, resultStatus, resultWindow } from '../run/run.dto.js';

/**
 * The immutable content of a statement version. Its canonical JSON (keys in this order, no blanks) is what the digest and the check
 * code are taken over; screen, PDF and support render from it and from nothing else.
 */
export const statementData = z.object({
  schema: z.literal(1),
  plan: z.object({ code: z.string(), name: z.string(), sponsorName: z.string(), recordsBeginOn: civilDate }),
  participant: z.object({
    number: z.string(),
    givenName: z.string(),
    familyName: z.string(),
    joinedOn: civilDate.nullable(),
    leftOn: civilDate.nullable(),
    language,
  }),
  quarter: z.object({ code: z.string(), opensOn: civilDate, closesOn: civilDate }),
  version: z.int().min(1),
  reason: z.string().nullable(),
  issuedOn: civilDate,
  engineVersion: z.string(),
  policy: z.object({
    version: z.int(),
    fees: z.enum(['net', 'gross']),
    loans: z.enum(['outside', 'inside']),
    flowTiming: z.enum(['start', 'mid', 'end']),
    decimals: z.union([z.literal(1), z.literal(2)]),
  }),
  status: resultStatus,
  statusReason: z.string().nullable(),
  windows: z.array(resultWindow),
  movements: movements.nullable(),
  /** Treated flows of the longest window, oldest first; + is into the account. Every window is re-computed from these. */
  flows: z.object({ dates: z.array(civilDate), cents: z.array(cents) }),
  /** Balances at quarter ends, oldest first, for the picture over time. */
  values: z.object({ dates: z.array(civilDate), cents: z.array(cents) }),
});
export type StatementData = z.infer<typeof statementData>;

/** What the PDF of a statement shows: the same data, plus what identifies the paper. */
export const statementPdfData = z.object({
  statement: statementData,
  checkCode: z.string(),
  checkAddress: z.string(),
  language,
});
export type StatementPdfData = z.infer<typeof statementPdfData>;

export const statementSummary = z.object({
  id: z.uuid(),
  planName: z.string(),
  planCode: z.string(),
  accountId: z.uuid(),
  quarterCode: z.string(),
  opensOn: civilDate,
  closesOn: civilDate,
  version: z.int(),
  isReplaced: z.boolean(),
  issuedAt: z.iso.datetime(),
  status: resultStatus,
  periodReturnPct: z.string().nullable(),
  closingCents: cents.nullable(),
});
export type StatementSummary = z.infer<typeof statementSummary>;

export const statementView = z.object({
  id: z.uuid(),
  issuedAt: z.iso.datetime(),
  checkCode: z.string(),
  data: statementData,
  /** Every version of this account and quarter, oldest first. */
  versions: z.array(
    z.object({ id: z.uuid(), version: z.int(), issuedAt: z.iso.datetime(), reason: z.string().nullable() }),
  ),
});
export type StatementView = z.infer<typeof statementView>;

/** One step of Newton's method as the working shows it; factors as decimal strings over the effective span. */
export const workingStep = z.object({ step: z.int(), factor: z.string(), residualCents: z.string() });

/** The derivation of one window: what screen, PDF and support's workbench show. It holds no sentences, only codes and figures. */
export const working = z.object({
  window: resultWindow,
  flows: z.array(
    z.object({ date: civilDate, cents, daysAtWork: z.number(), weight: z.string(), weightedCents: z.string() }),
  ),
  gainCents: cents,
  averageCapitalCents: z.string().nullable(),
  firstEstimatePct: z.string().nullable(),
  steps: z.array(workingStep),
  interval: z.object({ low: z.string(), high: z.string() }).nullable(),
  rounding: z.object({ exactPct: z.string(), printedPct: z.string() }).nullable(),
});
export type Working = z.infer<typeof working>;
