import { Migration } from '@mikro-orm/migrations';
import { APPLICATION_ROLE, appendOnly, inHat, inPlan } from '../security/policy.js';

/** The audit trail with its seals, the outbox that the relay empties, and the answers kept for repeated requests. */
export class Migration20260105092500_create_audit_and_outbox extends Migration {
  override up(): void {
    this.addSql(AUDIT);
    this.addSql(OUTBOX);
  }
}

const AUDIT = `
  create table audit_entry (
    id bigint generated always as identity primary key,
    sponsor_id uuid not null references sponsor (id),
    plan_id uuid references plan (id),
    at timestamptz not null default clock_timestamp(),
    -- null: the service itself
    person_id uuid references person (id),
    hat text not null,
    action text not null check (action ~ '^[a-z_]+[.][a-z_]+$'),
    subject_type text not null,
    subject_id text,
    -- ids, counts and states; never amounts or names
    details jsonb not null default '{}',
    request_id text
  );
  create index audit_entry_plan on audit_entry (plan_id, at desc);
  create index audit_entry_subject on audit_entry (subject_type, subject_id);
  alter table audit_entry enable row level security;
  create policy audit_entry_read on audit_entry for select to ${APPLICATION_ROLE}
    using (${inPlan()} and ${inHat('administrator', 'approver', 'auditor', 'worker')});
  create policy audit_entry_add on audit_entry for insert to ${APPLICATION_ROLE}
    with check (sponsor_id = any ((select app.sponsor_ids())::uuid[]) and person_id is not distinct from (select app.person_id())
      and hat = (select app.hat()));
  grant select, insert on audit_entry to ${APPLICATION_ROLE};
  ${appendOnly('audit_entry')}

  -- Each seal hashes the one before it and one entry. Entries are sealed as they become visible, so writers never queue behind each other.
  create table audit_seal (
    sponsor_id uuid not null references sponsor (id),
    sequence bigint not null check (sequence >= 1),
    entry_id bigint not null unique references audit_entry (id),
    previous_hash bytea not null,
    hash bytea not null check (length(hash) = 32),
    sealed_at timestamptz not null default now(),
    primary key (sponsor_id, sequence)
  );
  alter table audit_seal enable row level security;
  create policy audit_seal_read on audit_seal for select to ${APPLICATION_ROLE}
    using (sponsor_id = any ((select app.sponsor_ids())::uuid[]) and ${inHat('administrator', 'approver', 'auditor')});
  grant select on audit_seal to ${APPLICATION_ROLE};
  ${appendOnly('audit_seal')}

  create function app.audit_hash(previous bytea, entry audit_entry) returns bytea
  language sql stable set timezone = 'UTC' as $$
    select sha256(previous || convert_to(to_jsonb(entry)::text, 'UTF8'))
  $$;

  -- Seals what is not sealed yet; returns how many entries were. One at a time per sponsor.
  create function app.seal_audit(wanted_sponsor uuid, most int default 10000) returns int
  language plpgsql security definer set search_path = pg_catalog, public as $$
  declare number bigint; digest bytea; entry audit_entry; previous bytea; sealed int := 0;
  begin
    perform pg_advisory_xact_lock(hashtextextended('audit-seal:' || wanted_sponsor, 0));
    select sequence, hash into number, digest from audit_seal where sponsor_id = wanted_sponsor order by sequence desc limit 1;
    number := coalesce(number, 0);
    digest := coalesce(digest, '');
    for entry in
      select e.* from audit_entry e left join audit_seal s on s.entry_id = e.id
      where e.sponsor_id = wanted_sponsor and s.entry_id is null order by e.id limit most
    loop
      number := number + 1;
      previous := digest;
      digest := app.audit_hash(previous, entry);
      insert into audit_seal (sponsor_id, sequence, entry_id, previous_hash, hash)
        values (wanted_sponsor, number, entry.id, previous, digest);
      sealed := sealed + 1;
    end loop;
    return sealed;
  end $$;

  -- The first seal whose hash, predecessor or number is wrong, or null when the chain holds.
  create function app.verify_audit(wanted_sponsor uuid) returns bigint
  language plpgsql stable security definer set search_path = pg_catalog, public as $$
  declare seal record; previous bytea := ''; expected bigint := 1;
  begin
    for seal in
      select s.sequence, s.previous_hash, s.hash, app.audit_hash(s.previous_hash, e) as computed
      from audit_seal s join audit_entry e on e.id = s.entry_id and e.sponsor_id = s.sponsor_id
      where s.sponsor_id = wanted_sponsor order by s.sequence
    loop
      if seal.sequence <> expected or seal.previous_hash <> previous or seal.hash <> seal.computed then return expected; end if;
      previous := seal.hash;
      expected := expected + 1;
    end loop;
    if exists (select 1 from audit_seal where sponsor_id = wanted_sponsor and sequence >= expected) then return expected; end if;
    return null;
  end $$;

  create function app.sponsors_to_seal() returns setof uuid
  language sql stable security definer set search_path = pg_catalog, public as $$
    select distinct e.sponsor_id from audit_entry e left join audit_seal s on s.entry_id = e.id where s.entry_id is null
  $$;

  -- Signing in happens before any scope: one entry for each sponsor that the person has to do with.
  create function app.record_sign_in(wanted_person uuid, what text, details jsonb, request text) returns int
  language plpgsql security definer set search_path = pg_catalog, public as $$
  declare written int;
  begin
    if what not in ('person.signed_in', 'person.sign_in_refused', 'person.signed_out') then
      raise exception 'not a sign-in event: %', what using errcode = '22023';
    end if;
    insert into audit_entry (sponsor_id, person_id, hat, action, subject_type, subject_id, details, request_id)
    select s.sponsor_id, wanted_person, '', what, 'person', wanted_person::text, details, request
    from (
      select p.sponsor_id from role_assignment r join plan p on p.id = r.plan_id where r.person_id = wanted_person
      union select r.sponsor_id from role_assignment r where r.person_id = wanted_person and r.sponsor_id is not null
      union select p.sponsor_id from participant_claim c join plan p on p.id = c.plan_id where c.person_id = wanted_person
    ) s;
    get diagnostics written = row_count;
    return written;
  end $$;

  revoke execute on function app.audit_hash(bytea, audit_entry) from public;
  grant execute on function app.seal_audit(uuid, int), app.verify_audit(uuid), app.sponsors_to_seal(),
    app.record_sign_in(uuid, text, jsonb, text) to ${APPLICATION_ROLE};
`;

const OUTBOX = `
  create table outbox (
    id uuid primary key default gen_random_uuid(),
    plan_id uuid not null references plan (id),
    job text not null,
    -- ids only
    payload jsonb not null,
    created_at timestamptz not null default now(),
    available_at timestamptz not null default now(),
    relayed_at timestamptz
  );
  create index outbox_waiting on outbox (available_at) where relayed_at is null;
  alter table outbox enable row level security;
  create policy outbox_add on outbox for insert to ${APPLICATION_ROLE} with check (${inPlan()});
  create policy outbox_read on outbox for select to ${APPLICATION_ROLE} using (${inHat('relay')});
  create policy outbox_change on outbox for update to ${APPLICATION_ROLE} using (${inHat('relay')}) with check (${inHat('relay')});
  grant select, insert, update (relayed_at) on outbox to ${APPLICATION_ROLE};

  -- What the database says is not done although it should be under way: the queue is only a hint. Ids only, of every plan.
  create function app.undone_work() returns table (job text, plan_id uuid, subject_id uuid, slice_number int)
  language sql stable security definer set search_path = pg_catalog, public as $$
    select 'check-import', i.plan_id, i.id, null::int from import i where app.hat() = 'relay' and i.state in ('received', 'checking')
      and i.sha256 is not null
    union all
    select 'commit-import', i.plan_id, i.id, null from import i where app.hat() = 'relay' and i.state = 'committing'
    union all
    select 'start-run', r.plan_id, r.id, null from run r where app.hat() = 'relay' and r.state = 'queued'
    union all
    select 'compute-slice', s.plan_id, s.run_id, s.slice_number
      from run r join run_slice s on s.run_id = r.id where app.hat() = 'relay' and r.state = 'computing' and s.state = 'pending'
    union all
    select 'finish-run', r.plan_id, r.id, null from run r where app.hat() = 'relay' and r.state = 'computing'
      and not exists (select 1 from run_slice s where s.run_id = r.id and s.state = 'pending')
    union all
    select 'publish-quarter', p.plan_id, p.id, null from publication p where app.hat() = 'relay' and p.completed_at is null
    union all
    select 'send-notice', n.plan_id, n.id, null from notice n where app.hat() = 'relay' and n.state = 'queued'
  $$;
  grant execute on function app.undone_work() to ${APPLICATION_ROLE};

  create table idempotency_key (
    person_id uuid not null references person (id),
    key text not null check (length(key) between 1 and 200),
    route_id text not null,
    request_sha256 bytea not null,
    status int not null,
    response jsonb not null,
    created_at timestamptz not null default now(),
    primary key (person_id, key)
  );
  alter table idempotency_key enable row level security;
  create policy idempotency_key_own on idempotency_key for all to ${APPLICATION_ROLE}
    using (person_id = (select app.person_id())) with check (person_id = (select app.person_id()));
  grant select, insert on idempotency_key to ${APPLICATION_ROLE};
`;
