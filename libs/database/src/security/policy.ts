/** Whose transactions a policy lets through: the hats of people, and the two technical scopes. */
export type ScopeHat =
  'administrator' | 'approver' | 'participant' | 'support' | 'auditor' | 'operator' | 'worker' | 'relay';

export interface TablePolicy {
  /** Hats that may read rows of the plans in their scope. */
  readonly read?: readonly ScopeHat[];
  /** Hats that may add rows for the plans in their scope. */
  readonly add?: readonly ScopeHat[];
  /** Hats that may change rows of the plans in their scope, and the only columns that the grant covers. */
  readonly change?: { readonly hats: readonly ScopeHat[]; readonly columns: readonly string[] };
  /** Further conditions under which a row may be read; each is complete in itself. */
  readonly alsoRead?: readonly string[];
  /** Column that holds the plan; `plan_id` unless said. */
  readonly planColumn?: string;
}

/** The database role that API and worker connect as. It owns nothing. */
export const APPLICATION_ROLE = 'quarterpoise_app';
export const OWNER_ROLE = 'quarterpoise_owner';

/** True in a transaction that has entered one of these scopes. The sub-select makes PostgreSQL ask once per statement, not per row. */
export const inHat = (...hats: readonly ScopeHat[]) =>
  `(select app.hat()) in (${hats.map((hat) => `'${hat}'`).join(', ')})`;

/** True for rows whose plan is in the transaction's scope. */
export const inPlan = (column = 'plan_id') => `${column} = any ((select app.plan_ids())::uuid[])`;

/**
 * Switches row-level security on for a table and says who may do what: SQL for the migration that creates the table.
 * With no scope entered nothing is visible; what is not listed is refused; rows are never deleted by the application.
 */
export function tablePolicies(table: string, policy: TablePolicy): string {
  const own = inPlan(policy.planColumn);
  const statements = [`alter table ${table} enable row level security;`];
  const reads = [...(policy.read ? [`${own} and ${inHat(...policy.read)}`] : []), ...(policy.alsoRead ?? [])];
  if (reads.length > 0) {
    statements.push(
      `create policy ${table}_read on ${table} for select to ${APPLICATION_ROLE} using (${reads.map((r) => `(${r})`).join(' or ')});`,
      `grant select on ${table} to ${APPLICATION_ROLE};`,
    );
  }
  if (policy.add) {
    statements.push(
      `create policy ${table}_add on ${table} for insert to ${APPLICATION_ROLE} with check (${own} and ${inHat(...policy.add)});`,
      `grant insert on ${table} to ${APPLICATION_ROLE};`,
    );
  }
  if (policy.change) {
    const condition = `${own} and ${inHat(...policy.change.hats)}`;
    statements.push(
      `create policy ${table}_change on ${table} for update to ${APPLICATION_ROLE} using (${condition}) with check (${condition});`,
      `grant update (${policy.change.columns.join(', ')}) on ${table} to ${APPLICATION_ROLE};`,
    );
  }
  return statements.join('\n');
}

/** Makes a table append-only for everybody, its owner included. */
export const appendOnly = (table: string) =>
  `create trigger ${table}_append_only before update or delete or truncate on ${table} for each statement execute function app.refuse_change();`;
