import { Migration } from '@mikro-orm/migrations';
import { APPLICATION_ROLE, inHat, inPlan, tablePolicies } from '../security/policy.js';

const STAFF = ['administrator', 'approver', 'support', 'auditor', 'worker'] as const;

/** Sponsors, plans, people, roles, participants and their accounts. */
export class Migration20260105090500_create_identity extends Migration {
  override up(): void {
    this.addSql(`
      create table sponsor (
        id uuid primary key default gen_random_uuid(),
        code text not null unique check (code ~ '^[A-Z0-9-]{2,20}$'),
        name text not null check (name <> ''),
        retention_years int not null default 6 check (retention_years between 1 and 50),
        created_at timestamptz not null default now()
      );
      alter table sponsor enable row level security;
      create policy sponsor_read on sponsor for select to ${APPLICATION_ROLE}
        using (id = any ((select app.sponsor_ids())::uuid[]) or ${inHat('operator')});
      grant select on sponsor to ${APPLICATION_ROLE};

      create table plan (
        id uuid primary key default gen_random_uuid(),
        sponsor_id uuid not null references sponsor (id),
        code text not null unique check (code ~ '^[A-Z0-9-]{2,20}$'),
        name text not null check (name <> ''),
        records_begin_on date not null,
        plan_year_start_month int not null default 1 check (plan_year_start_month between 1 and 12),
        statement_due_days int not null default 45 check (statement_due_days between 1 and 365),
        business_day_balance boolean not null default false,
        ledger_version int not null default 0 check (ledger_version >= 0),
        created_at timestamptz not null default now()
      );
      create index plan_sponsor on plan (sponsor_id);
      ${tablePolicies('plan', {
        read: STAFF,
        alsoRead: [`id = any ((select app.member_plan_ids())::uuid[])`, inHat('operator')],
        planColumn: 'id',
      })}

      create table plan_fund (
        id uuid primary key default gen_random_uuid(),
        plan_id uuid not null references plan (id),
        code text not null check (code <> ''),
        name text not null check (name <> ''),
        is_total_return boolean not null default false,
        unique (plan_id, code)
      );
      ${tablePolicies('plan_fund', { read: STAFF, alsoRead: [inHat('operator')] })}

      create table person (
        id uuid primary key default gen_random_uuid(),
        email text not null unique check (email = lower(email) and email like '%_@_%'),
        display_name text not null check (display_name <> ''),
        language text not null default 'en' check (language in ('en', 'es')),
        disabled_at timestamptz,
        created_at timestamptz not null default now()
      );
      alter table person enable row level security;
      create policy person_read on person for select to ${APPLICATION_ROLE}
        using (id = (select app.person_id()) or ${inHat('operator')});
      create policy person_change on person for update to ${APPLICATION_ROLE}
        using (id = (select app.person_id())) with check (id = (select app.person_id()));
      grant select, update (language) on person to ${APPLICATION_ROLE};

      -- no policy and no grant: only app.credentials_of reads it
      create table person_credential (
        person_id uuid primary key references person (id),
        password_hash text not null,
        changed_at timestamptz not null default now()
      );
      alter table person_credential enable row level security;

      create table role_assignment (
        id uuid primary key default gen_random_uuid(),
        person_id uuid not null references person (id),
        role text not null check (role in ('administrator', 'approver', 'support', 'auditor', 'operator')),
        sponsor_id uuid references sponsor (id),
        plan_id uuid references plan (id),
        created_at timestamptz not null default now(),
        check (case when role = 'operator' then num_nonnulls(sponsor_id, plan_id) = 0 else num_nonnulls(sponsor_id, plan_id) = 1 end),
        unique nulls not distinct (person_id, role, sponsor_id, plan_id)
      );
      alter table role_assignment enable row level security;
      create policy role_assignment_read on role_assignment for select to ${APPLICATION_ROLE}
        using (person_id = (select app.person_id()) or ${inHat('operator')});
      grant select on role_assignment to ${APPLICATION_ROLE};

      create table participant (
        id uuid primary key default gen_random_uuid(),
        plan_id uuid not null references plan (id),
        participant_number text not null check (participant_number <> ''),
        given_name text not null check (given_name <> ''),
        family_name text not null check (family_name <> ''),
        email text,
        email_kind text check (email_kind in ('work', 'personal')),
        joined_on date,
        left_on date,
        language text not null default 'en' check (language in ('en', 'es')),
        delivery text not null check (delivery in ('email', 'paper')),
        delivery_basis text,
        delivery_basis_on date,
        -- the participant's own choice outlives a roster file
        chosen_delivery text check (chosen_delivery in ('email', 'paper')),
        postal_lines text[] not null default '{}' check (cardinality(postal_lines) <= 4),
        previous_number text,
        import_id uuid,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now(),
        check (left_on >= joined_on),
        unique (plan_id, participant_number),
        unique (id, plan_id)
      );
      create index participant_search on participant using gin (
        app.fold(given_name || ' ' || family_name || ' ' || participant_number || ' ' || coalesce(email, '')) gin_trgm_ops);
      ${tablePolicies('participant', {
        read: STAFF,
        alsoRead: [`id = any ((select app.participant_ids())::uuid[])`],
        add: ['worker'],
        change: {
          hats: ['worker'],
          columns: [
            'participant_number',
            'given_name',
            'family_name',
            'email',
            'email_kind',
            'joined_on',
            'left_on',
            'language',
            'delivery',
            'delivery_basis',
            'delivery_basis_on',
            'postal_lines',
            'previous_number',
            'import_id',
            'updated_at',
          ],
        },
      })}

      create table participant_claim (
        participant_id uuid primary key,
        plan_id uuid not null,
        person_id uuid not null references person (id),
        claimed_at timestamptz not null default now(),
        foreign key (participant_id, plan_id) references participant (id, plan_id)
      );
      create index participant_claim_person on participant_claim (person_id);
      alter table participant_claim enable row level security;
      create policy participant_claim_read on participant_claim for select to ${APPLICATION_ROLE}
        using (person_id = (select app.person_id()) or (${inPlan()} and ${inHat('worker')}));
      grant select on participant_claim to ${APPLICATION_ROLE};

      create table account (
        id uuid primary key default gen_random_uuid(),
        plan_id uuid not null references plan (id),
        participant_id uuid not null,
        kind text not null default 'participant' check (kind in ('participant', 'alternate_payee', 'beneficiary')),
        created_at timestamptz not null default now(),
        foreign key (participant_id, plan_id) references participant (id, plan_id),
        unique (plan_id, participant_id, kind),
        unique (id, plan_id)
      );
      create index account_participant on account (participant_id);
      ${tablePolicies('account', {
        read: STAFF,
        alsoRead: [`participant_id = any ((select app.participant_ids())::uuid[])`],
        add: ['worker'],
      })}
    `);
    this.addSql(SCOPE_FUNCTIONS);
  }
}

/**
 * Functions of the owner, so that they may look up what the application's role may not yet see. Each answers one narrow question.
 * `search_path` is fixed, or a caller could slip in tables of its own.
 */
const SCOPE_FUNCTIONS = `
  create function app.set_scope(new_hat text, wanted_person uuid, plans uuid[], members uuid[], participants uuid[]) returns void
  language plpgsql security definer set search_path = pg_catalog, public as $$
  begin
    perform set_config('app.hat', new_hat, true);
    perform set_config('app.person_id', coalesce(wanted_person::text, ''), true);
    perform set_config('app.plan_ids', coalesce(plans, '{}')::text, true);
    perform set_config('app.member_plan_ids', coalesce(members, '{}')::text, true);
    perform set_config('app.participant_ids', coalesce(participants, '{}')::text, true);
    perform set_config('app.sponsor_ids', coalesce(
      (select array_agg(distinct sponsor_id) from plan where id = any (plans || coalesce(members, '{}'))), '{}')::text, true);
  end $$;

  create function app.enter_person(wanted_person uuid, wanted_hat text) returns boolean
  language plpgsql security definer set search_path = pg_catalog, public as $$
  declare plans uuid[]; members uuid[]; participants uuid[];
  begin
    perform app.set_scope('', null, '{}', '{}', '{}');
    if not exists (select 1 from person p where p.id = wanted_person and p.disabled_at is null) then return false; end if;
    if wanted_hat = 'participant' then
      select array_agg(c.participant_id), array_agg(distinct c.plan_id) into participants, members
        from participant_claim c where c.person_id = wanted_person;
      if participants is null then return false; end if;
    else
      if not exists (select 1 from role_assignment r where r.person_id = wanted_person and r.role = wanted_hat) then return false; end if;
      select array_agg(distinct p.id) into plans
        from role_assignment r join plan p on p.id = r.plan_id or p.sponsor_id = r.sponsor_id
        where r.person_id = wanted_person and r.role = wanted_hat;
    end if;
    perform app.set_scope(wanted_hat, wanted_person, coalesce(plans, '{}'), members, participants);
    return true;
  end $$;

  create function app.enter_worker(wanted_plan uuid) returns boolean
  language plpgsql security definer set search_path = pg_catalog, public as $$
  begin
    perform app.set_scope('', null, '{}', '{}', '{}');
    if not exists (select 1 from plan where id = wanted_plan) then return false; end if;
    perform app.set_scope('worker', null, array[wanted_plan], '{}', '{}');
    return true;
  end $$;

  create function app.enter_relay() returns boolean
  language plpgsql security definer set search_path = pg_catalog, public as $$
  begin
    perform app.set_scope('relay', null, '{}', '{}', '{}');
    return true;
  end $$;

  create function app.credentials_of(wanted_email text)
  returns table (person_id uuid, password_hash text, display_name text, language text, is_disabled boolean)
  language sql stable security definer set search_path = pg_catalog, public as $$
    select p.id, c.password_hash, p.display_name, p.language, p.disabled_at is not null
    from person p join person_credential c on c.person_id = p.id where p.email = lower(wanted_email)
  $$;

  create function app.hats_of(wanted_person uuid) returns setof text
  language sql stable security definer set search_path = pg_catalog, public as $$
    select distinct role from role_assignment where person_id = wanted_person
    union select 'participant' from participant_claim where person_id = wanted_person
  $$;

  create function app.person_name(wanted_person uuid) returns text
  language sql stable security definer set search_path = pg_catalog, public as $$
    select display_name from person where id = wanted_person
  $$;

  -- Trigram operators are not leakproof and go unused under policies; here the scope is applied by hand, first.
  create function app.find_participants(search text, most int) returns setof uuid
  language sql stable security definer set search_path = pg_catalog, public as $$
    select id from participant
    where plan_id = any (app.plan_ids()) and app.hat() in ('support', 'administrator', 'approver', 'auditor')
      and app.fold(given_name || ' ' || family_name || ' ' || participant_number || ' ' || coalesce(email, ''))
        like '%' || replace(replace(replace(app.fold(search), '\\', '\\\\'), '%', '\\%'), '_', '\\_') || '%'
    order by family_name, given_name, participant_number
    limit least(most, 200)
  $$;

  revoke execute on function app.set_scope(text, uuid, uuid[], uuid[], uuid[]) from public;
  grant execute on function app.enter_person(uuid, text), app.enter_worker(uuid), app.enter_relay(), app.credentials_of(text),
    app.hats_of(uuid), app.person_name(uuid), app.find_participants(text, int) to ${APPLICATION_ROLE};
`;
