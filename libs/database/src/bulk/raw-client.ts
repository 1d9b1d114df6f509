import type { EntityManager } from '@mikro-orm/postgresql';
import type { ClientBase } from 'pg';

/**
 * The pg client on which a transaction of {@link withScope} runs, for COPY. It belongs to the transaction: never release it.
 * @throws Error outside a transaction, where a COPY would run without a scope.
 */
export async function rawClient(tx: EntityManager): Promise<ClientBase> {
  const transaction = tx.getTransactionContext<{ client: { acquireConnection(): Promise<ClientBase> } }>();
  if (!transaction) throw new Error('COPY needs a transaction that has entered a scope');
  return transaction.client.acquireConnection();
}
