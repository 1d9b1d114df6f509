import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type { QuarterState } from '@quarterpoise/dto';

/** One plan's quarter: it works from the end of `opensOn` to the end of `closesOn`. */
export const QuarterEntity = defineEntity({
  name: 'Quarter',
  tableName: 'quarter',
  properties: {
    id: p.uuid().primary(),
    planId: p.uuid(),
    opensOn: p.date(),
    closesOn: p.date(),
    state: p.string().$type<QuarterState>(),
    dueOn: p.date(),
    publishedAt: p.datetime().nullable(),
    createdAt: p.datetime(),
  },
});
export type Quarter = InferEntity<typeof QuarterEntity>;
