import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type { ResultData, ResultStatus, RunState, RunTotals } from '@quarterpoise/dto';
import { CentsType } from '../cents.type.js';

/** A quarter-end run with the inputs that it froze: ledger version, policy version, engine version. */
export const RunEntity = defineEntity({
  name: 'Run',
  tableName: 'run',
  properties: {
    id: p.uuid().primary(),
    planId: p.uuid(),
    quarterId: p.uuid(),
    isRehearsal: p.boolean(),
    state: p.string().$type<RunState>(),
    ledgerVersion: p.integer(),
    policyVersionId: p.uuid(),
    engineVersion: p.string(),
    sliceSize: p.integer(),
    sliceCount: p.integer(),
    accountCount: p.integer(),
    startedBy: p.uuid(),
    startedVia: p.string().$type<'page' | 'terminal' | 'api_key'>(),
    startedAt: p.datetime(),
    computedAt: p.datetime().nullable(),
    finishedAt: p.datetime().nullable(),
    failure: p.text().nullable(),
    totals: p.json().$type<RunTotals>().nullable(),
    resultsSha256: p.blob().nullable(),
  },
});
export type Run = InferEntity<typeof RunEntity>;

/** Accounts `firstAccountId` … `lastAccountId` of a run: the unit of work of one job. */
export const RunSliceEntity = defineEntity({
  name: 'RunSlice',
  tableName: 'run_slice',
  properties: {
    runId: p.uuid().primary(),
    sliceNumber: p.integer().primary(),
    planId: p.uuid(),
    firstAccountId: p.uuid(),
    lastAccountId: p.uuid(),
    accountCount: p.integer(),
    state: p.string().$type<'pending' | 'done'>(),
    doneAt: p.datetime().nullable(),
    solvedCount: p.integer(),
    notComputedCount: p.integer(),
    flagCount: p.integer(),
  },
});
export type RunSlice = InferEntity<typeof RunSliceEntity>;

export const ResultEntity = defineEntity({
  name: 'Result',
  tableName: 'result',
  properties: {
    runId: p.uuid().primary(),
    accountId: p.uuid().primary(),
    planId: p.uuid(),
    participantId: p.uuid(),
    status: p.string().$type<ResultStatus>(),
    reason: p.text().nullable(),
    openingCents: p.type(CentsType).nullable(),
    closingCents: p.type(CentsType).nullable(),
    gainCents: p.type(CentsType).nullable(),
    periodReturn: p.string().nullable(),
    periodReturnBp: p.type(CentsType).nullable(),
    firstEstimate: p.string().nullable(),
    inputSha256: p.blob(),
    data: p.json().$type<ResultData>(),
  },
});
export type Result = InferEntity<typeof ResultEntity>;
