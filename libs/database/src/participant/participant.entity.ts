import { defineEntity, type InferEntity, p } from '@mikro-orm/core';

export const ParticipantEntity = defineEntity({
  name: 'Participant',
  tableName: 'participant',
  properties: {
    id: p.uuid().primary(),
    planId: p.uuid(),
    participantNumber: p.string(),
    givenName: p.string(),
    familyName: p.string(),
    email: p.string().nullable(),
    emailKind: p.string().nullable(),
    joinedOn: p.date().nullable(),
    leftOn: p.date().nullable(),
    language: p.string().$type<'en' | 'es'>(),
    delivery: p.string().$type<'email' | 'paper'>(),
    deliveryBasis: p.string().nullable(),
    deliveryBasisOn: p.date().nullable(),
    chosenDelivery: p.string().$type<'email' | 'paper'>().nullable(),
    postalLines: p.array(),
    previousNumber: p.string().nullable(),
    importId: p.uuid().nullable(),
    createdAt: p.datetime(),
    updatedAt: p.datetime(),
  },
});
export type Participant = InferEntity<typeof ParticipantEntity>;

export const AccountEntity = defineEntity({
  name: 'Account',
  tableName: 'account',
  properties: {
    id: p.uuid().primary(),
    planId: p.uuid(),
    participant: () => p.manyToOne(ParticipantEntity),
    kind: p.string().$type<'participant' | 'alternate_payee' | 'beneficiary'>(),
    createdAt: p.datetime(),
  },
});
export type Account = InferEntity<typeof AccountEntity>;
