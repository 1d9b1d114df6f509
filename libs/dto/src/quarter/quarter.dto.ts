import { z } from 'zod';
import { civilDate } from '../civil-date.js';
import { importKind, importView } from '../import/import.dto.js';
import { runSummary } from '../run/run.dto.js';

export const QUARTER_STATES = ['collecting', 'ready', 'computing', 'in_review', 'signed_off', 'published'] as const;
export const quarterState = z.enum(QUARTER_STATES);
export type QuarterState = z.infer<typeof quarterState>;

export const quarterSummary = z.object({
  id: z.uuid(),
  planId: z.uuid(),
  /** Like 2026-Q3. */
  code: z.string(),
  opensOn: civilDate,
  closesOn: civilDate,
  state: quarterState,
  dueOn: civilDate,
  publishedAt: z.iso.datetime().nullable(),
});
export type QuarterSummary = z.infer<typeof quarterSummary>;

/** Something that the quarter's page tells: a finding of the data checks, with the count and the first few cases. */
export const dataFinding = z.object({
  code: z.enum([
    'file-missing',
    'balance-missing',
    'opening-differs',
    'late-effective-dates',
    'no-delivery-address',
    'figures-stale',
    'quarter-running',
  ]),
  severity: z.enum(['blocking', 'review', 'notice']),
  count: z.int(),
  /** Values for the sentence of this code, such as the kind of file. */
  figures: z.record(z.string(), z.union([z.string(), z.number()])),
  examples: z.array(z.object({ participantNumber: z.string(), name: z.string(), detail: z.string() })).max(20),
});
export type DataFinding = z.infer<typeof dataFinding>;

export const quarterEvent = z.object({
  at: z.iso.datetime(),
  personName: z.string().nullable(),
  action: z.string(),
  details: z.record(z.string(), z.unknown()),
});

/** Everything that the quarter's page shows. */
export const quarterView = quarterSummary.extend({
  plan: z.object({ id: z.uuid(), code: z.string(), name: z.string(), sponsorName: z.string() }),
  daysLeft: z.int(),
  /** Which hat has to act next. */
  nextActor: z.enum(['administrator', 'approver', 'service', 'nobody']),
  files: z.array(z.object({ kind: importKind, required: z.boolean(), latest: importView.nullable() })),
  findings: z.array(dataFinding),
  /** The newest complete run that counts; null before the first. */
  currentRun: runSummary.nullable(),
  runs: z.array(runSummary),
  signOff: z
    .object({ runId: z.uuid(), signedByName: z.string(), signedAt: z.iso.datetime(), remark: z.string() })
    .nullable(),
  publication: z
    .object({
      requestedByName: z.string(),
      requestedAt: z.iso.datetime(),
      completedAt: z.iso.datetime().nullable(),
      statementCount: z.int(),
      emailCount: z.int(),
      paperCount: z.int(),
      heldCount: z.int(),
    })
    .nullable(),
  delivery: z.object({ sent: z.int(), queued: z.int(), failed: z.int(), bounced: z.int(), read: z.int() }).nullable(),
  history: z.array(quarterEvent),
  /** What the reader may do now, decided by the state table and the reader's hat; a refusal carries its reason. */
  actions: z.array(
    z.object({
      action: z.enum(['import', 'run', 'rehearse', 'cancel-run', 'sign-off', 'publish']),
      allowed: z.boolean(),
      reason: z.string().nullable(),
    }),
  ),
});
export type QuarterView = z.infer<typeof quarterView>;
