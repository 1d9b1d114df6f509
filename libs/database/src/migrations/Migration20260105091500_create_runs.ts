import { Migration } from '@mikro-orm/migrations';
import { APPLICATION_ROLE, appendOnly, tablePolicies } from '../security/policy.js';

const READERS = ['administrator', 'approver', 'auditor', 'worker'] as const;

/** Return policies, runs with their slices, results, flags, decisions and the second person's sign-off. */
export class Migration20260105091500_create_runs extends Migration {
  override up(): void {
    this.addSql(RUNS);
    this.addSql(REVIEW);
    this.addSql(SIGN_OFF);
  }
}

const RUNS = `
  create table return_policy_version (
    id uuid primary key default gen_random_uuid(),
    plan_id uuid not null references plan (id),
    version int not null check (version >= 1),
    -- holds for quarters that close on this day or later
    effective_from date not null,
    options jsonb not null,
    made_by uuid references person (id),
    made_at timestamptz not null default now(),
    unique (plan_id, version),
    unique (id, plan_id)
  );
  ${tablePolicies('return_policy_version', { read: [...READERS, 'support'], add: ['administrator'] })}
  ${appendOnly('return_policy_version')}

  create table run (
    id uuid primary key default gen_random_uuid(),
    plan_id uuid not null,
    quarter_id uuid not null,
    is_rehearsal boolean not null,
    state text not null default 'queued' check (state in ('queued', 'computing', 'completed', 'failed', 'cancelled')),
    ledger_version int not null,
    policy_version_id uuid not null,
    engine_version text not null,
    slice_size int not null check (slice_size between 1 and 100000),
    slice_count int not null check (slice_count >= 0),
    account_count int not null check (account_count >= 0),
    started_by uuid not null references person (id),
    started_via text not null check (started_via in ('page', 'terminal', 'api_key')),
    started_at timestamptz not null default now(),
    computed_at timestamptz,
    finished_at timestamptz,
    failure text,
    totals jsonb,
    results_sha256 bytea,
    foreign key (quarter_id, plan_id) references quarter (id, plan_id),
    foreign key (plan_id, ledger_version) references ledger_version (plan_id, version),
    foreign key (policy_version_id, plan_id) references return_policy_version (id, plan_id),
    check ((state in ('completed', 'failed', 'cancelled')) = (finished_at is not null)),
    check ((state = 'completed') = (totals is not null and results_sha256 is not null)),
    check ((state = 'failed') = (failure is not null)),
    unique (id, plan_id)
  );
  create unique index run_one_going on run (quarter_id) where not is_rehearsal and state in ('queued', 'computing');
  create index run_quarter on run (quarter_id, started_at desc);
  ${tablePolicies('run', {
    read: READERS,
    add: ['administrator'],
    change: {
      hats: ['administrator', 'worker'],
      columns: ['state', 'computed_at', 'finished_at', 'failure', 'totals', 'results_sha256'],
    },
  })}

  create table run_slice (
    run_id uuid not null,
    slice_number int not null check (slice_number >= 1),
    plan_id uuid not null,
    first_account_id uuid not null,
    last_account_id uuid not null,
    account_count int not null check (account_count >= 1),
    state text not null default 'pending' check (state in ('pending', 'done')),
    done_at timestamptz,
    solved_count int not null default 0,
    not_computed_count int not null default 0,
    flag_count int not null default 0,
    primary key (run_id, slice_number),
    foreign key (run_id, plan_id) references run (id, plan_id),
    check (first_account_id <= last_account_id),
    check ((state = 'done') = (done_at is not null))
  );
  ${tablePolicies('run_slice', {
    read: READERS,
    add: ['administrator'],
    change: {
      hats: ['worker'],
      columns: ['state', 'done_at', 'solved_count', 'not_computed_count', 'flag_count'],
    },
  })}

  create table result (
    run_id uuid not null,
    account_id uuid not null,
    plan_id uuid not null,
    participant_id uuid not null,
    status text not null check (status in ('solved', 'ambiguous', 'total-loss', 'no-solution', 'no-capital', 'not-computed')),
    reason text,
    opening_cents bigint,
    closing_cents bigint,
    gain_cents bigint,
    -- the printed percentage, a decimal string; null when nothing may be printed
    period_return text check (period_return ~ '^-?[0-9]+[.][0-9]{2}$'),
    -- the same in hundredths of a percent, for sorting; null beyond the safe integers
    period_return_bp bigint,
    first_estimate text check (first_estimate ~ '^-?[0-9]+[.][0-9]{2}$'),
    input_sha256 bytea not null check (length(input_sha256) = 32),
    data jsonb not null,
    primary key (run_id, account_id),
    foreign key (run_id, plan_id) references run (id, plan_id),
    foreign key (account_id, plan_id) references account (id, plan_id),
    foreign key (participant_id, plan_id) references participant (id, plan_id),
    check (status = 'solved' or status = 'total-loss' or period_return is null),
    check (status = 'solved' or reason is not null)
  );
  ${tablePolicies('result', { read: READERS, add: ['worker'] })}
  ${appendOnly('result')}
`;

const REVIEW = `
  create table flag (
    id uuid primary key default gen_random_uuid(),
    run_id uuid not null,
    plan_id uuid not null,
    account_id uuid,
    code text not null check (code ~ '^[a-z-]+$'),
    severity text not null check (severity in ('blocking', 'review', 'notice')),
    figures jsonb not null default '{}',
    foreign key (run_id, plan_id) references run (id, plan_id),
    foreign key (account_id, plan_id) references account (id, plan_id),
    unique nulls not distinct (run_id, account_id, code),
    unique (id, plan_id)
  );
  ${tablePolicies('flag', { read: READERS, add: ['worker'] })}
  ${appendOnly('flag')}

  create table flag_decision (
    id uuid primary key default gen_random_uuid(),
    flag_id uuid not null,
    plan_id uuid not null,
    decision text not null check (decision in ('accepted', 'held', 'reopened')),
    reason text not null check (reason <> ''),
    -- what the participant reads while the figure is held back
    message text,
    decided_by uuid not null references person (id),
    -- order of decisions; now() would be the same for all of one transaction
    decided_at timestamptz not null default clock_timestamp(),
    foreign key (flag_id, plan_id) references flag (id, plan_id),
    check (decision <> 'held' or message <> '')
  );
  create index flag_decision_newest on flag_decision (flag_id, decided_at desc);
  ${tablePolicies('flag_decision', { read: READERS, add: ['administrator'] })}
  ${appendOnly('flag_decision')}

  create function app.check_flag_decision() returns trigger
  language plpgsql security definer set search_path = pg_catalog, public as $$
  declare target record;
  begin
    select f.account_id, r.state, r.quarter_id, q.state as quarter_state into strict target
      from flag f join run r on r.id = f.run_id join quarter q on q.id = r.quarter_id where f.id = new.flag_id;
    if target.quarter_state <> 'in_review' or target.state <> 'completed' then
      raise exception 'flags are decided while the quarter is in review' using errcode = 'QP006';
    end if;
    if exists (select 1 from account a join participant_claim c on c.participant_id = a.participant_id
               where a.id = target.account_id and c.person_id = new.decided_by) then
      raise exception 'nobody decides on a figure of their own account' using errcode = 'QP003';
    end if;
    return new;
  end $$;
  create trigger flag_decision_check before insert on flag_decision for each row execute function app.check_flag_decision();

  -- The decision in force of each flag; a reopened flag counts as undecided.
  create view flag_state with (security_invoker = true) as
    select f.*, d.decision, d.reason as decision_reason, d.message, d.decided_by, d.decided_at
    from flag f
    left join lateral (
      select * from flag_decision where flag_id = f.id order by decided_at desc, id desc limit 1
    ) d on d.decision <> 'reopened';
  grant select on flag_state to ${APPLICATION_ROLE};
`;

const SIGN_OFF = `
  create table sign_off (
    id uuid primary key default gen_random_uuid(),
    run_id uuid not null unique,
    quarter_id uuid not null,
    plan_id uuid not null,
    signed_by uuid not null references person (id),
    signed_at timestamptz not null default now(),
    results_sha256 bytea not null,
    totals jsonb not null,
    sample_account_ids uuid[] not null,
    remark text not null default '',
    foreign key (run_id, plan_id) references run (id, plan_id),
    foreign key (quarter_id, plan_id) references quarter (id, plan_id)
  );
  ${tablePolicies('sign_off', { read: READERS, add: ['approver'] })}
  ${appendOnly('sign_off')}

  -- Why this person may not sign this quarter's run off; null when they may. The page asks it too, so that it tells before the click.
  create function app.second_person_refusal(wanted_run uuid, wanted_person uuid) returns text
  language sql stable security definer set search_path = pg_catalog, public as $$
    select case
      when r.started_by = wanted_person then 'You started this run.'
      when exists (select 1 from import i where i.quarter_id = r.quarter_id and i.state = 'committed'
                   and wanted_person in (i.uploaded_by, i.committed_by)) then 'You loaded data of this quarter.'
      when exists (select 1 from flag_decision d join flag f on f.id = d.flag_id
                   where f.run_id = r.id and d.decided_by = wanted_person) then 'You decided flags of this run.'
      when p.made_by = wanted_person then 'You set the return policy that this run used.'
    end
    from run r join return_policy_version p on p.id = r.policy_version_id where r.id = wanted_run
  $$;
  grant execute on function app.second_person_refusal(uuid, uuid) to ${APPLICATION_ROLE};

  create function app.check_sign_off() returns trigger
  language plpgsql security definer set search_path = pg_catalog, public as $$
  declare signed record; newest uuid; refusal text;
  begin
    select r.*, q.state as quarter_state into strict signed
      from run r join quarter q on q.id = r.quarter_id where r.id = new.run_id and r.quarter_id = new.quarter_id;
    select id into newest from run
      where quarter_id = new.quarter_id and not is_rehearsal order by started_at desc, id desc limit 1;
    if signed.is_rehearsal or signed.state <> 'completed' or newest <> new.run_id or signed.results_sha256 <> new.results_sha256 then
      raise exception 'the run is not the newest completed run of its quarter' using errcode = 'QP002';
    end if;
    refusal := app.second_person_refusal(new.run_id, new.signed_by);
    if refusal is not null then raise exception '%', refusal using errcode = 'QP001'; end if;
    if exists (select 1 from flag_state f where f.run_id = new.run_id and f.severity <> 'notice' and f.decision is null) then
      raise exception 'some flags of the run are not decided' using errcode = 'QP005';
    end if;
    return new;
  end $$;
  create trigger sign_off_check before insert on sign_off for each row execute function app.check_sign_off();
`;
