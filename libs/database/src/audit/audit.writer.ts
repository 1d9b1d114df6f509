import type { EntityManager } from '@mikro-orm/postgresql';
import type { AuditAction } from '@quarterpoise/dto';

export interface AuditFact {
  readonly planId: string;
  readonly action: AuditAction;
  readonly subjectType: string;
  readonly subjectId: string;
  /** Ids, counts and states only: never amounts, names or addresses. */
  readonly details?: Readonly<Record<string, unknown>>;
  readonly requestId?: string | undefined;
}

/** Puts a fact on the audit trail in the caller's transaction, in the name of the scope's person and hat. */
export async function recordAudit(tx: EntityManager, fact: AuditFact): Promise<void> {
  await tx.execute(
    `insert into audit_entry (sponsor_id, plan_id, person_id, hat, action, subject_type, subject_id, details, request_id)
     select sponsor_id, id, app.person_id(), app.hat(), ?, ?, ?, ?::jsonb, ? from plan where id = ?`,
    [
      fact.action,
      fact.subjectType,
      fact.subjectId,
      JSON.stringify(fact.details ?? {}),
      fact.requestId ?? null,
      fact.planId,
    ],
  );
}
