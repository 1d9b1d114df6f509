import { z } from 'zod';

/** A job carries ids only: what it has to do is read from the database, which alone is the truth. */
export interface JobDefinition<P extends z.ZodType = z.ZodType> {
  /** Verb and noun, kebab-case. */
  readonly name: string;
  /** Plural noun: one queue per kind of work. */
  readonly queue: string;
  readonly version: number;
  readonly payload: P;
  /** The id that makes a job queued twice one job; no colon, never digits only. */
  readonly id: (payload: z.infer<P>) => string;
}

const defineJob = <P extends z.ZodType>(job: JobDefinition<P>): JobDefinition<P> => job;

const plan = z.object({ planId: z.uuid() });

export const JOBS = {
  checkImport: defineJob({
    name: 'check-import',
    queue: 'imports',
    version: 1,
    payload: plan.extend({ importId: z.uuid() }),
    id: (p) => `check-${p.importId}`,
  }),
  commitImport: defineJob({
    name: 'commit-import',
    queue: 'imports',
    version: 1,
    payload: plan.extend({ importId: z.uuid() }),
    id: (p) => `commit-${p.importId}`,
  }),
  startRun: defineJob({
    name: 'start-run',
    queue: 'runs',
    version: 1,
    payload: plan.extend({ runId: z.uuid() }),
    id: (p) => `start-${p.runId}`,
  }),
  finishRun: defineJob({
    name: 'finish-run',
    queue: 'runs',
    version: 1,
    payload: plan.extend({ runId: z.uuid() }),
    id: (p) => `finish-${p.runId}`,
  }),
  computeSlice: defineJob({
    name: 'compute-slice',
    queue: 'run-slices',
    version: 1,
    payload: plan.extend({ runId: z.uuid(), sliceNumber: z.int() }),
    id: (p) => `slice-${p.runId}-${p.sliceNumber}`,
  }),
  publishQuarter: defineJob({
    name: 'publish-quarter',
    queue: 'publications',
    version: 1,
    payload: plan.extend({ publicationId: z.uuid() }),
    id: (p) => `publish-${p.publicationId}`,
  }),
  sendNotice: defineJob({
    name: 'send-notice',
    queue: 'notices',
    version: 1,
    payload: plan.extend({ noticeId: z.uuid() }),
    id: (p) => `notice-${p.noticeId}`,
  }),
};

export const QUEUES = [...new Set(Object.values(JOBS).map((job) => job.queue))];
