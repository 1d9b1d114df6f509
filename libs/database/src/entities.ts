import { PersonEntity } from './identity/person.entity.js';
import { ImportEntity } from './import/import.entity.js';
import { AccountEntity, ParticipantEntity } from './participant/participant.entity.js';
import { PlanEntity, ReturnPolicyVersionEntity, SponsorEntity } from './plan/plan.entity.js';
import { QuarterEntity } from './quarter/quarter.entity.js';
import { FlagDecisionEntity, FlagEntity, SignOffEntity } from './review/flag.entity.js';
import { ResultEntity, RunEntity, RunSliceEntity } from './run/run.entity.js';
import { NoticeEntity, PublicationEntity, StatementEntity } from './statement/statement.entity.js';

/** Every entity that MikroORM knows. What is only read or written in bulk (activity, balances, history, chunks) has readers and writers instead. */
export const ENTITIES = [
  AccountEntity,
  FlagDecisionEntity,
  FlagEntity,
  ImportEntity,
  NoticeEntity,
  ParticipantEntity,
  PersonEntity,
  PlanEntity,
  PublicationEntity,
  QuarterEntity,
  ResultEntity,
  ReturnPolicyVersionEntity,
  RunEntity,
  RunSliceEntity,
  SignOffEntity,
  SponsorEntity,
  StatementEntity,
];
