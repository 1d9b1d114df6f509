import { defineEntity, type InferEntity, p } from '@mikro-orm/core';

export const SponsorEntity = defineEntity({
  name: 'Sponsor',
  tableName: 'sponsor',
  properties: {
    id: p.uuid().primary(),
    code: p.string(),
    name: p.string(),
    retentionYears: p.integer(),
    createdAt: p.datetime(),
  },
});
export type Sponsor = InferEntity<typeof SponsorEntity>;

export const PlanEntity = defineEntity({
  name: 'Plan',
  tableName: 'plan',
  properties: {
    id: p.uuid().primary(),
    sponsor: () => p.manyToOne(SponsorEntity),
    code: p.string(),
    name: p.string(),
    recordsBeginOn: p.date(),
    planYearStartMonth: p.integer(),
    statementDueDays: p.integer(),
    businessDayBalance: p.boolean(),
    ledgerVersion: p.integer(),
    createdAt: p.datetime(),
  },
});
export type Plan = InferEntity<typeof PlanEntity>;

export const ReturnPolicyVersionEntity = defineEntity({
  name: 'ReturnPolicyVersion',
  tableName: 'return_policy_version',
  properties: {
    id: p.uuid().primary(),
    planId: p.uuid(),
    version: p.integer(),
    effectiveFrom: p.date(),
    options: p.json(),
    madeBy: p.uuid().nullable(),
    madeAt: p.datetime(),
  },
});
export type ReturnPolicyVersion = InferEntity<typeof ReturnPolicyVersionEntity>;
