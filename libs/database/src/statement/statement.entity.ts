import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type { StatementData } from '@quarterpoise/dto';

export const PublicationEntity = defineEntity({
  name: 'Publication',
  tableName: 'publication',
  properties: {
    id: p.uuid().primary(),
    quarterId: p.uuid(),
    runId: p.uuid(),
    planId: p.uuid(),
    requestedBy: p.uuid(),
    requestedAt: p.datetime(),
    completedAt: p.datetime().nullable(),
    statementCount: p.integer(),
    emailCount: p.integer(),
    paperCount: p.integer(),
    heldCount: p.integer(),
  },
});
export type Publication = InferEntity<typeof PublicationEntity>;

/** An immutable version of what a participant was told. */
export const StatementEntity = defineEntity({
  name: 'Statement',
  tableName: 'statement',
  properties: {
    id: p.uuid().primary(),
    planId: p.uuid(),
    quarterId: p.uuid(),
    accountId: p.uuid(),
    participantId: p.uuid(),
    version: p.integer(),
    runId: p.uuid(),
    issuedAt: p.datetime(),
    data: p.json().$type<StatementData>(),
    dataSha256: p.blob(),
    checkCode: p.string(),
    checkKeyId: p.string(),
    replacesId: p.uuid().nullable(),
    reason: p.text().nullable(),
  },
});
export type Statement = InferEntity<typeof StatementEntity>;

export const NoticeEntity = defineEntity({
  name: 'Notice',
  tableName: 'notice',
  properties: {
    id: p.uuid().primary(),
    planId: p.uuid(),
    statementId: p.uuid(),
    template: p.string(),
    language: p.string().$type<'en' | 'es'>(),
    recipientEmail: p.string(),
    messageId: p.string(),
    state: p.string().$type<'queued' | 'sent' | 'failed' | 'bounced'>(),
    attempts: p.integer(),
    lastError: p.text().nullable(),
    sentAt: p.datetime().nullable(),
    createdAt: p.datetime(),
  },
});
export type Notice = InferEntity<typeof NoticeEntity>;
