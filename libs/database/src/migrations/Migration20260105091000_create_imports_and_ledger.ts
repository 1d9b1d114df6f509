import { Migration } from '@mikro-orm/migrations';
import { APPLICATION_ROLE, appendOnly, inHat, inPlan, tablePolicies } from '../security/policy.js';

/** Uploaded files, the append-only ledger with its versions, and the compact history that a run reads. */
export class Migration20260105091000_create_imports_and_ledger extends Migration {
  override up(): void {
    this.addSql(QUARTERS);
    this.addSql(IMPORTS);
    this.addSql(LEDGER);
    this.addSql(HISTORY);
  }
}

const QUARTERS = `
  create table quarter (
    id uuid primary key default gen_random_uuid(),
    plan_id uuid not null references plan (id),
    -- the quarter works from the end of opens_on to the end of closes_on
    opens_on date not null,
    closes_on date not null,
    state text not null default 'collecting' check (state in ('collecting', 'ready', 'computing', 'in_review', 'signed_off', 'published')),
    due_on date not null,
    published_at timestamptz,
    created_at timestamptz not null default now(),
    check (opens_on < closes_on),
    check ((state = 'published') = (published_at is not null)),
    unique (plan_id, closes_on),
    unique (id, plan_id),
    exclude using gist (plan_id with =, daterange(opens_on, closes_on, '(]') with &&)
  );
  ${tablePolicies('quarter', {
    read: ['administrator', 'approver', 'auditor', 'support', 'worker'],
    alsoRead: [`plan_id = any ((select app.member_plan_ids())::uuid[])`],
    add: ['worker'],
    change: { hats: ['administrator', 'approver', 'worker'], columns: ['state', 'published_at'] },
  })}
`;

const IMPORTS = `
  create table import (
    id uuid primary key default gen_random_uuid(),
    plan_id uuid not null references plan (id),
    quarter_id uuid,
    kind text not null check (kind in ('roster', 'activity', 'balances', 'prices')),
    file_name text not null check (file_name <> '' and length(file_name) <= 255),
    byte_size bigint not null default 0 check (byte_size >= 0),
    sha256 bytea,
    state text not null default 'received'
      check (state in ('received', 'checking', 'refused', 'preview', 'committing', 'committed', 'discarded', 'unchanged')),
    stated_rows int not null check (stated_rows >= 0),
    stated_sum_cents bigint,
    progress_bytes bigint not null default 0,
    row_count int,
    sum_cents bigint,
    new_count int,
    changed_count int,
    reversed_count int,
    unchanged_count int,
    error_count int not null default 0,
    notices jsonb not null default '[]',
    totals_by_kind jsonb not null default '[]',
    problem_code text,
    problem_detail text,
    ledger_version int,
    uploaded_by uuid not null references person (id),
    uploaded_at timestamptz not null default now(),
    checked_at timestamptz,
    committed_by uuid references person (id),
    committed_at timestamptz,
    foreign key (quarter_id, plan_id) references quarter (id, plan_id),
    check ((state in ('refused')) = (problem_code is not null)),
    check (state <> 'committed' or (ledger_version is not null and committed_by is not null and committed_at is not null)),
    unique (id, plan_id)
  );
  create index import_plan on import (plan_id, uploaded_at desc);
  create index import_quarter on import (quarter_id, kind);
  -- the same file twice is harmless because it cannot be loaded twice
  create unique index import_committed_once on import (plan_id, kind, sha256) where state = 'committed';
  ${tablePolicies('import', {
    read: ['administrator', 'approver', 'auditor', 'worker'],
    add: ['administrator', 'worker'],
    change: {
      hats: ['administrator', 'worker'],
      columns: [
        'byte_size',
        'sha256',
        'state',
        'progress_bytes',
        'row_count',
        'sum_cents',
        'new_count',
        'changed_count',
        'reversed_count',
        'unchanged_count',
        'error_count',
        'notices',
        'totals_by_kind',
        'problem_code',
        'problem_detail',
        'ledger_version',
        'checked_at',
        'committed_by',
        'committed_at',
      ],
    },
  })}

  create table import_chunk (
    import_id uuid not null,
    plan_id uuid not null,
    sequence int not null check (sequence >= 0),
    bytes bytea not null,
    primary key (import_id, sequence),
    foreign key (import_id, plan_id) references import (id, plan_id)
  );
  alter table import_chunk alter column bytes set storage external;
  ${tablePolicies('import_chunk', { read: ['worker'], add: ['administrator', 'worker'] })}
  ${appendOnly('import_chunk')}

  create table import_row_error (
    id bigint generated always as identity primary key,
    import_id uuid not null,
    plan_id uuid not null,
    line int not null check (line >= 1),
    column_name text not null,
    value text not null,
    code text not null,
    reason text not null,
    remedy text not null,
    foreign key (import_id, plan_id) references import (id, plan_id)
  );
  create index import_row_error_order on import_row_error (import_id, line, id);
  ${tablePolicies('import_row_error', { read: ['administrator', 'approver', 'auditor', 'worker'], add: ['worker'] })}
  alter table participant add foreign key (import_id, plan_id) references import (id, plan_id);
`;

const LEDGER = `
  create table ledger_version (
    plan_id uuid not null references plan (id),
    version int not null check (version >= 1),
    reason text not null check (reason in ('import', 'freeze', 'seed')),
    import_id uuid,
    made_by uuid references person (id),
    made_at timestamptz not null default now(),
    primary key (plan_id, version),
    foreign key (import_id, plan_id) references import (id, plan_id),
    check ((reason = 'import') = (import_id is not null))
  );
  ${tablePolicies('ledger_version', { read: ['administrator', 'approver', 'auditor', 'worker'] })}
  ${appendOnly('ledger_version')}

  -- Versions are given under the lock of the plan's row: a bare sequence would let a later number commit first.
  create function app.next_ledger_version(wanted_plan uuid, why text, from_import uuid, by_person uuid) returns int
  language plpgsql security definer set search_path = pg_catalog, public as $$
  declare new_version int;
  begin
    if not (wanted_plan = any (app.plan_ids())) or app.hat() not in ('administrator', 'worker') then
      raise exception 'this plan is not in scope' using errcode = '42501';
    end if;
    update plan set ledger_version = ledger_version + 1 where id = wanted_plan returning ledger_version into new_version;
    insert into ledger_version (plan_id, version, reason, import_id, made_by) values (wanted_plan, new_version, why, from_import, by_person);
    return new_version;
  end $$;
  grant execute on function app.next_ledger_version(uuid, text, uuid, uuid) to ${APPLICATION_ROLE};

  create table activity (
    id bigint generated always as identity primary key,
    plan_id uuid not null,
    account_id uuid not null,
    reference text not null check (reference <> ''),
    revision int not null default 1 check (revision >= 1),
    entry text not null default 'original' check (entry in ('original', 'reversal')),
    reverses_id bigint unique references activity (id),
    effective_on date not null,
    posted_on date not null,
    kind smallint not null check (kind between 0 and 17),
    source text not null,
    fund text not null,
    amount_cents bigint not null check (abs(amount_cents) <= 9007199254740991),
    group_reference text,
    ledger_version int not null,
    import_id uuid,
    foreign key (account_id, plan_id) references account (id, plan_id),
    foreign key (plan_id, ledger_version) references ledger_version (plan_id, version),
    check ((entry = 'reversal') = (reverses_id is not null)),
    -- the kind gives the direction; only earnings (14) and adjustments (17) are signed
    check (kind in (14, 17) or (entry = 'original' and amount_cents >= 0) or (entry = 'reversal' and amount_cents <= 0)),
    unique (plan_id, reference, revision, entry)
  );
  create index activity_account on activity (account_id, effective_on);
  create index activity_version on activity (plan_id, ledger_version);
  ${tablePolicies('activity', { read: ['administrator', 'approver', 'auditor', 'support', 'worker'], add: ['worker'] })}
  ${appendOnly('activity')}

  create table balance (
    id bigint generated always as identity primary key,
    plan_id uuid not null,
    account_id uuid not null,
    as_of date not null,
    source text not null,
    -- loan_note is the outstanding note of a loan, kept apart from the invested balance
    fund text not null,
    balance_cents bigint not null check (abs(balance_cents) <= 9007199254740991),
    earnings_cents bigint check (abs(earnings_cents) <= 9007199254740991),
    ledger_version int not null,
    import_id uuid,
    foreign key (account_id, plan_id) references account (id, plan_id),
    foreign key (plan_id, ledger_version) references ledger_version (plan_id, version),
    unique (account_id, as_of, source, fund, ledger_version)
  );
  create index balance_plan_day on balance (plan_id, as_of);
  ${tablePolicies('balance', { read: ['administrator', 'approver', 'auditor', 'support', 'worker'], add: ['worker'] })}
  ${appendOnly('balance')}

  create table fund_price (
    id bigint generated always as identity primary key,
    plan_id uuid not null,
    fund_code text not null,
    as_of date not null,
    unit_price numeric(20, 8) not null check (unit_price > 0),
    income_per_unit numeric(20, 8) check (income_per_unit >= 0),
    split_factor numeric(20, 8) check (split_factor > 0),
    ledger_version int not null,
    import_id uuid,
    foreign key (plan_id, fund_code) references plan_fund (plan_id, code),
    foreign key (plan_id, ledger_version) references ledger_version (plan_id, version),
    unique (plan_id, fund_code, as_of, ledger_version)
  );
  ${tablePolicies('fund_price', { read: ['administrator', 'approver', 'auditor', 'support', 'worker'], add: ['worker'] })}
  ${appendOnly('fund_price')}
`;

/**
 * One row per account and ledger version that touched it: the whole history as arrays, days counted from 1970-01-01. Kinds and both dates
 * are kept, never treated flows, so that any policy version can be applied to all of it. Equal days and kinds of one version are summed.
 */
const HISTORY = `
  create table account_history (
    account_id uuid not null,
    ledger_version int not null,
    plan_id uuid not null,
    activity_effective int[] not null,
    activity_posted int[] not null,
    activity_kind smallint[] not null,
    activity_cents bigint[] not null,
    activity_version int[] not null,
    balance_day int[] not null,
    balance_cents bigint[] not null,
    balance_version int[] not null,
    note_day int[] not null,
    note_cents bigint[] not null,
    note_version int[] not null,
    primary key (account_id, ledger_version),
    foreign key (account_id, plan_id) references account (id, plan_id),
    foreign key (plan_id, ledger_version) references ledger_version (plan_id, version),
    check (cardinality(activity_effective) = cardinality(activity_cents) and cardinality(activity_posted) = cardinality(activity_cents)
      and cardinality(activity_kind) = cardinality(activity_cents) and cardinality(activity_version) = cardinality(activity_cents)),
    check (cardinality(balance_day) = cardinality(balance_cents) and cardinality(balance_version) = cardinality(balance_cents)),
    check (cardinality(note_day) = cardinality(note_cents) and cardinality(note_version) = cardinality(note_cents))
  );
  alter table account_history enable row level security;
  create policy account_history_read on account_history for select to ${APPLICATION_ROLE} using (${inPlan()} and ${inHat('worker')});
  create policy account_history_add on account_history for insert to ${APPLICATION_ROLE} with check (${inPlan()} and ${inHat('worker')});
  grant select, insert on account_history to ${APPLICATION_ROLE};
  ${appendOnly('account_history')}

  create function app.balances_by_day(accounts uuid[], at_version int, of_notes boolean)
  returns table (account_id uuid, day int[], cents bigint[], version int[]) language sql stable as $$
    select account_id, array_agg(day order by day), array_agg(cents order by day), array_agg(version order by day)
    from (
      select account_id, as_of - date '1970-01-01' as day, sum(balance_cents)::bigint as cents, max(ledger_version) as version
      from (
        select distinct on (account_id, as_of, source, fund) account_id, as_of, balance_cents, ledger_version
        from balance
        where account_id = any (accounts) and ledger_version <= at_version and (fund = 'loan_note') = of_notes
        order by account_id, as_of, source, fund, ledger_version desc
      ) newest
      group by account_id, as_of
    ) days
    group by account_id
  $$;

  -- Works with the rights of the caller: policies hold. The newest version of a balance is the one that counts.
  create function app.rebuild_account_history(wanted_plan uuid, at_version int, accounts uuid[]) returns void language sql as $$
    insert into account_history
    select a.account_id, at_version, wanted_plan,
      coalesce(t.effective, '{}'), coalesce(t.posted, '{}'), coalesce(t.kind, '{}'), coalesce(t.cents, '{}'), coalesce(t.version, '{}'),
      coalesce(b.day, '{}'), coalesce(b.cents, '{}'), coalesce(b.version, '{}'),
      coalesce(n.day, '{}'), coalesce(n.cents, '{}'), coalesce(n.version, '{}')
    from unnest(accounts) as a (account_id)
    left join (
      select account_id, array_agg(effective order by effective, posted, kind, version) as effective,
        array_agg(posted order by effective, posted, kind, version) as posted,
        array_agg(kind order by effective, posted, kind, version) as kind,
        array_agg(cents order by effective, posted, kind, version) as cents,
        array_agg(version order by effective, posted, kind, version) as version
      from (
        select account_id, effective_on - date '1970-01-01' as effective, posted_on - date '1970-01-01' as posted, kind,
          sum(amount_cents)::bigint as cents, ledger_version as version
        from activity where account_id = any (accounts) and ledger_version <= at_version
        group by 1, 2, 3, 4, 6
      ) summed
      group by account_id
    ) t using (account_id)
    left join app.balances_by_day(accounts, at_version, false) b using (account_id)
    left join app.balances_by_day(accounts, at_version, true) n using (account_id)
  $$;
  grant execute on function app.rebuild_account_history(uuid, int, uuid[]), app.balances_by_day(uuid[], int, boolean) to ${APPLICATION_ROLE};
`;
