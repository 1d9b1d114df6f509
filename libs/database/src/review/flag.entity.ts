import { defineEntity, type InferEntity, p } from '@mikro-orm/core';

export const FlagEntity = defineEntity({
  name: 'Flag',
  tableName: 'flag',
  properties: {
    id: p.uuid().primary(),
    runId: p.uuid(),
    planId: p.uuid(),
    accountId: p.uuid().nullable(),
    code: p.string(),
    severity: p.string().$type<'blocking' | 'review' | 'notice'>(),
    figures: p.json().$type<Record<string, string | number | null>>(),
  },
});
export type Flag = InferEntity<typeof FlagEntity>;

/** Decisions are only ever added; the newest one of a flag is in force. */
export const FlagDecisionEntity = defineEntity({
  name: 'FlagDecision',
  tableName: 'flag_decision',
  properties: {
    id: p.uuid().primary().defaultRaw('gen_random_uuid()'),
    flagId: p.uuid(),
    planId: p.uuid(),
    decision: p.string().$type<'accepted' | 'held' | 'reopened'>(),
    reason: p.text(),
    message: p.text().nullable(),
    decidedBy: p.uuid(),
    decidedAt: p.datetime().defaultRaw('clock_timestamp()'),
  },
});
export type FlagDecision = InferEntity<typeof FlagDecisionEntity>;

export const SignOffEntity = defineEntity({
  name: 'SignOff',
  tableName: 'sign_off',
  properties: {
    id: p.uuid().primary().defaultRaw('gen_random_uuid()'),
    runId: p.uuid(),
    quarterId: p.uuid(),
    planId: p.uuid(),
    signedBy: p.uuid(),
    signedAt: p.datetime().defaultRaw('now()'),
    resultsSha256: p.blob(),
    totals: p.json(),
    sampleAccountIds: p.array(),
    remark: p.text(),
  },
});
export type SignOff = InferEntity<typeof SignOffEntity>;
