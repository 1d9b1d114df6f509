import type { EntityManager } from '@mikro-orm/postgresql';
import type { Hat } from '@quarterpoise/dto';

/** In whose name a transaction works. A person wears one hat; a worker serves one plan; the relay carries ids between plans and sees no figures. */
export type Scope =
  | { readonly kind: 'person'; readonly personId: string; readonly hat: Hat }
  | { readonly kind: 'worker'; readonly planId: string }
  | { readonly kind: 'relay' };

/** The person does not hold the hat (any longer), is switched off, or the plan does not exist. */
export class ScopeRefused extends Error {
  override readonly name = 'ScopeRefused';
  constructor(readonly scope: Scope) {
    super(scope.kind === 'person' ? `This person does not hold the role ${scope.hat}` : 'There is no such scope');
  }
}

/**
 * The one way to the data: opens a transaction, enters the scope as its first statement and hands over an EntityManager bound to it.
 * The scope is transaction-local, so a pooled connection carries nothing over to the next user.
 * @throws ScopeRefused when the scope may not be entered; nothing has been read then.
 */
export async function withScope<T>(
  em: EntityManager,
  scope: Scope,
  work: (tx: EntityManager) => Promise<T>,
): Promise<T> {
  return em.fork().transactional(async (tx) => {
    if (!(await enterScope(tx, scope))) throw new ScopeRefused(scope);
    return work(tx);
  });
}

async function enterScope(tx: EntityManager, scope: Scope): Promise<boolean> {
  const [sql, parameters] =
    scope.kind === 'person'
      ? ['select app.enter_person(?, ?) as entered', [scope.personId, scope.hat]]
      : scope.kind === 'worker'
        ? ['select app.enter_worker(?) as entered', [scope.planId]]
        : ['select app.enter_relay() as entered', []];
  const [row] = await tx.execute<{ entered: boolean }[]>(sql as string, parameters as string[]);
  return row?.entered === true;
}
