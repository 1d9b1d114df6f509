import type { EntityManager } from '@mikro-orm/postgresql';
import type { JobDefinition } from '@quarterpoise/dto';
import type { z } from 'zod';

/** Asks for a job in the caller's transaction; the relay queues it after the commit. Nothing is ever queued inside a transaction. */
export async function requestJob<P extends z.ZodType<{ planId: string }>>(
  tx: EntityManager,
  job: JobDefinition<P>,
  payload: z.infer<P>,
): Promise<void> {
  await tx.execute('insert into outbox (plan_id, job, payload) values (?, ?, ?::jsonb)', [
    payload.planId,
    job.name,
    JSON.stringify(payload),
  ]);
}
