import { Migration } from '@mikro-orm/migrations';
import { APPLICATION_ROLE, appendOnly, inHat, inPlan, tablePolicies } from '../security/policy.js';

const STAFF = ['administrator', 'approver', 'auditor', 'support', 'worker'] as const;
const OWN = 'participant_id = any ((select app.participant_ids())::uuid[])';

/** Publication, immutable statements, notices with their wording, and inquiries. */
export class Migration20260105092000_create_statements extends Migration {
  override up(): void {
    this.addSql(STATEMENTS);
    this.addSql(NOTICES);
    this.addSql(INQUIRIES);
  }
}

const STATEMENTS = `
  create table publication (
    id uuid primary key default gen_random_uuid(),
    quarter_id uuid not null,
    run_id uuid not null unique references sign_off (run_id),
    plan_id uuid not null,
    requested_by uuid not null references person (id),
    requested_at timestamptz not null default now(),
    completed_at timestamptz,
    statement_count int not null default 0,
    email_count int not null default 0,
    paper_count int not null default 0,
    held_count int not null default 0,
    foreign key (quarter_id, plan_id) references quarter (id, plan_id),
    foreign key (run_id, plan_id) references run (id, plan_id)
  );
  create index publication_quarter on publication (quarter_id);
  ${tablePolicies('publication', {
    read: ['administrator', 'approver', 'auditor', 'worker'],
    add: ['administrator', 'approver'],
    change: {
      hats: ['worker'],
      columns: ['completed_at', 'statement_count', 'email_count', 'paper_count', 'held_count'],
    },
  })}

  create table statement (
    id uuid primary key default gen_random_uuid(),
    plan_id uuid not null,
    quarter_id uuid not null,
    account_id uuid not null,
    participant_id uuid not null,
    version int not null check (version >= 1),
    run_id uuid not null,
    issued_at timestamptz not null default now(),
    data jsonb not null,
    -- of the canonical JSON, which PostgreSQL's jsonb does not keep: keys in the order of the schema, no blanks
    data_sha256 bytea not null check (length(data_sha256) = 32),
    check_code text not null unique,
    check_key_id text not null,
    replaces_id uuid unique references statement (id),
    reason text,
    foreign key (quarter_id, plan_id) references quarter (id, plan_id),
    foreign key (account_id, plan_id) references account (id, plan_id),
    foreign key (participant_id, plan_id) references participant (id, plan_id),
    foreign key (run_id, plan_id) references run (id, plan_id),
    check ((version = 1) = (replaces_id is null)),
    check (version = 1 or reason <> ''),
    unique (account_id, quarter_id, version),
    unique (id, plan_id)
  );
  create index statement_participant on statement (participant_id, quarter_id);
  create index statement_quarter on statement (quarter_id);
  ${tablePolicies('statement', { read: STAFF, alsoRead: [OWN], add: ['worker'] })}
  ${appendOnly('statement')}

  create table statement_read (
    statement_id uuid not null,
    person_id uuid not null references person (id),
    plan_id uuid not null,
    first_read_at timestamptz not null default now(),
    primary key (statement_id, person_id),
    foreign key (statement_id, plan_id) references statement (id, plan_id)
  );
  alter table statement_read enable row level security;
  create policy statement_read_read on statement_read for select to ${APPLICATION_ROLE}
    using (person_id = (select app.person_id()) or (${inPlan()} and ${inHat('administrator', 'approver', 'auditor', 'worker')}));
  create policy statement_read_add on statement_read for insert to ${APPLICATION_ROLE}
    with check (${inHat('participant')} and person_id = (select app.person_id())
      and exists (select 1 from statement s where s.id = statement_id and s.plan_id = statement_read.plan_id));
  grant select, insert on statement_read to ${APPLICATION_ROLE};

  -- What a participant may know of a figure that is held back: that it is, and the message. Runs and flags stay out of sight.
  create function app.held_messages() returns table (account_id uuid, quarter_id uuid, message text)
  language sql stable security definer set search_path = pg_catalog, public as $$
    select distinct on (f.account_id, p.quarter_id) f.account_id, p.quarter_id, f.message
    from account a
    join flag_state f on f.account_id = a.id and f.decision = 'held'
    join publication p on p.run_id = f.run_id and p.completed_at is not null
    where app.hat() = 'participant' and a.participant_id = any (app.participant_ids())
      and not exists (select 1 from statement s where s.account_id = a.id and s.quarter_id = p.quarter_id)
    order by f.account_id, p.quarter_id, f.decided_at desc
  $$;
  grant execute on function app.held_messages() to ${APPLICATION_ROLE};
`;

const NOTICES = `
  create table wording_template (
    id uuid primary key default gen_random_uuid(),
    -- null: the product's own wording
    plan_id uuid references plan (id),
    template text not null check (template in ('statement_ready', 'statement_restated', 'inquiry_answered', 'invitation', 'password_reset')),
    language text not null check (language in ('en', 'es')),
    version int not null check (version >= 1),
    subject text not null check (subject <> ''),
    body_text text not null check (body_text <> ''),
    body_html text not null check (body_html <> ''),
    made_by uuid references person (id),
    made_at timestamptz not null default now(),
    unique nulls not distinct (plan_id, template, language, version)
  );
  ${tablePolicies('wording_template', {
    read: STAFF,
    alsoRead: [`plan_id is null and (select app.hat()) <> ''`],
    add: ['administrator'],
  })}
  ${appendOnly('wording_template')}

  create table notice (
    id uuid primary key default gen_random_uuid(),
    plan_id uuid not null,
    statement_id uuid not null,
    template text not null,
    language text not null check (language in ('en', 'es')),
    recipient_email text not null,
    -- derived from statement version and recipient: a repeat carries the same one and is recognised
    message_id text not null unique,
    state text not null default 'queued' check (state in ('queued', 'sent', 'failed', 'bounced')),
    attempts int not null default 0,
    last_error text,
    sent_at timestamptz,
    created_at timestamptz not null default now(),
    foreign key (statement_id, plan_id) references statement (id, plan_id),
    check ((state in ('sent', 'bounced')) = (sent_at is not null))
  );
  create index notice_statement on notice (statement_id);
  create index notice_queued on notice (created_at) where state = 'queued';
  ${tablePolicies('notice', {
    read: ['administrator', 'approver', 'auditor', 'worker'],
    add: ['worker'],
    change: { hats: ['worker'], columns: ['state', 'attempts', 'last_error', 'sent_at'] },
  })}
`;

const INQUIRIES = `
  create table inquiry (
    id uuid primary key default gen_random_uuid(),
    plan_id uuid not null,
    account_id uuid not null,
    participant_id uuid not null,
    statement_id uuid,
    window_code text,
    state text not null default 'open' check (state in ('open', 'answered', 'handed_over', 'closed')),
    subject text not null check (subject <> '' and length(subject) <= 200),
    language text not null check (language in ('en', 'es')),
    assigned_to uuid references person (id),
    opened_by uuid not null references person (id),
    opened_at timestamptz not null default now(),
    due_at timestamptz not null,
    closed_at timestamptz,
    foreign key (account_id, plan_id) references account (id, plan_id),
    foreign key (participant_id, plan_id) references participant (id, plan_id),
    foreign key (statement_id, plan_id) references statement (id, plan_id),
    check ((state = 'closed') = (closed_at is not null)),
    unique (id, plan_id)
  );
  create index inquiry_plan on inquiry (plan_id, state, due_at);
  ${tablePolicies('inquiry', {
    read: STAFF,
    alsoRead: [OWN],
    add: ['support'],
    change: { hats: ['support', 'administrator', 'worker'], columns: ['state', 'assigned_to', 'closed_at'] },
  })}
  create policy inquiry_ask on inquiry for insert to ${APPLICATION_ROLE}
    with check (${inHat('participant')} and ${OWN} and opened_by = (select app.person_id()));

  create table inquiry_message (
    id uuid primary key default gen_random_uuid(),
    inquiry_id uuid not null,
    plan_id uuid not null,
    author_id uuid not null references person (id),
    author_hat text not null check (author_hat in ('participant', 'support', 'administrator')),
    visibility text not null check (visibility in ('participant', 'internal')),
    body text not null check (body <> ''),
    sent_at timestamptz not null default clock_timestamp(),
    foreign key (inquiry_id, plan_id) references inquiry (id, plan_id)
  );
  create index inquiry_message_thread on inquiry_message (inquiry_id, sent_at);
  ${tablePolicies('inquiry_message', {
    read: STAFF,
    alsoRead: [
      `visibility = 'participant' and ${inHat('participant')} and exists (select 1 from inquiry i where i.id = inquiry_id)`,
    ],
    add: ['support', 'administrator'],
  })}
  create policy inquiry_message_ask on inquiry_message for insert to ${APPLICATION_ROLE}
    with check (${inHat('participant')} and author_id = (select app.person_id()) and visibility = 'participant'
      and exists (select 1 from inquiry i where i.id = inquiry_id));
  ${appendOnly('inquiry_message')}
`;
