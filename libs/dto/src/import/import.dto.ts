import { z } from 'zod';
import { problemCode } from '../problems/problem.dto.js';

export const IMPORT_KINDS = ['roster', 'activity', 'balances', 'prices'] as const;
export const importKind = z.enum(IMPORT_KINDS);
export type ImportKind = z.infer<typeof importKind>;

export const IMPORT_STATES = [
  'received',
  'checking',
  'refused',
  'preview',
  'committing',
  'committed',
  'discarded',
  'unchanged',
] as const;
export const importState = z.enum(IMPORT_STATES);
export type ImportState = z.infer<typeof importState>;

/** Kinds of activity, in the order of their stored codes; new ones are only ever appended. */
export const ACTIVITY_KINDS = [
  'employee_contribution',
  'employer_contribution',
  'rollover_in',
  'rollover_out',
  'transfer_in',
  'transfer_out',
  'withdrawal',
  'distribution',
  'loan_issued',
  'loan_repaid',
  'loan_interest',
  'loan_defaulted',
  'fee',
  'forfeiture',
  'earnings',
  'exchange_in',
  'exchange_out',
  'adjustment',
] as const;
export const activityKind = z.enum(ACTIVITY_KINDS);
export type ActivityKind = z.infer<typeof activityKind>;

/** Columns of the four files: what must be there and what may be. */
export const IMPORT_COLUMNS: Record<ImportKind, { required: readonly string[]; optional: readonly string[] }> = {
  roster: {
    required: [
      'participant_number',
      'given_name',
      'family_name',
      'email',
      'joined_on',
      'left_on',
      'language',
      'delivery',
    ],
    optional: [
      'email_kind',
      'delivery_basis',
      'delivery_basis_on',
      'address_line_1',
      'address_line_2',
      'address_line_3',
      'address_line_4',
      'previous_number',
    ],
  },
  activity: {
    required: ['reference', 'participant_number', 'effective_on', 'posted_on', 'kind', 'source', 'fund', 'amount'],
    optional: ['group', 'action'],
  },
  balances: { required: ['participant_number', 'as_of', 'source', 'fund', 'balance'], optional: ['earnings'] },
  prices: { required: ['fund', 'as_of', 'unit_price'], optional: ['income_per_unit', 'split_factor'] },
};

/** Fields beside the file in the multipart upload; they must come before it, since the file is streamed. */
export const importUploadFields = z.object({
  kind: importKind,
  quarterId: z.uuid().optional(),
  statedRows: z.coerce.number().int().min(0),
  /** Plain decimal; required for activity and balances. */
  statedSum: z
    .string()
    .regex(/^-?\d{1,15}(\.\d{1,2})?$/, 'a plain decimal amount with at most two places')
    .optional(),
});

export const importNotice = z.object({
  code: z.enum(['extra-column-ignored', 'byte-order-mark-removed', 'semicolon-separated']),
  value: z.string(),
});

export const importView = z.object({
  id: z.uuid(),
  planId: z.uuid(),
  quarterId: z.uuid().nullable(),
  kind: importKind,
  fileName: z.string(),
  byteSize: z.int(),
  state: importState,
  /** Share of the file that has been read, 0 to 1, while checking or committing. */
  progress: z.number(),
  stated: z.object({ rows: z.int(), sum: z.string().nullable() }),
  /** What was counted; null until the file has been read. */
  counted: z.object({ rows: z.int(), sum: z.string().nullable() }).nullable(),
  /** What a commit would change (or has changed). */
  changes: z.object({ new: z.int(), changed: z.int(), reversed: z.int(), unchanged: z.int() }).nullable(),
  totalsByKind: z.array(z.object({ kind: z.string(), rows: z.int(), sum: z.string() })),
  errorCount: z.int(),
  notices: z.array(importNotice),
  /** Why the file was refused. */
  problem: z.object({ code: problemCode, detail: z.string() }).nullable(),
  uploadedByName: z.string(),
  uploadedAt: z.iso.datetime(),
  committedByName: z.string().nullable(),
  committedAt: z.iso.datetime().nullable(),
});
export type ImportView = z.infer<typeof importView>;

/** Event `progress` of an import's stream. */
export const importProgress = importView.pick({ state: true, progress: true });
export type ImportProgress = z.infer<typeof importProgress>;

/** One faulty place in a file: where, what stands there, why it cannot be taken, how to mend it. */
export const importRowError = z.object({
  line: z.int(),
  column: z.string(),
  value: z.string(),
  code: z.enum([
    'required',
    'unknown-kind',
    'unknown-action',
    'unknown-participant',
    'unknown-fund',
    'not-a-date',
    'date-order',
    'not-an-amount',
    'too-many-decimals',
    'negative-amount',
    'not-a-price',
    'not-a-choice',
    'duplicate-in-file',
    'too-long',
    'void-without-original',
    'before-records-begin',
    'in-the-future',
    'column-count',
    'not-an-email',
  ]),
  reason: z.string(),
  remedy: z.string(),
});
export type ImportRowError = z.infer<typeof importRowError>;
