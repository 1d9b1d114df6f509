import { Migration } from '@mikro-orm/migrations';
import { APPLICATION_ROLE } from '../security/policy.js';

/** The schema `app`: what a transaction's scope is and how policies ask for it. */
export class Migration20260105090000_create_scope extends Migration {
  override up(): void {
    this.addSql(`
      create extension if not exists btree_gist;
      create extension if not exists pg_trgm;
      create extension if not exists unaccent;

      revoke create on schema public from public;
      create schema app;
      grant usage on schema app, public to ${APPLICATION_ROLE};
      alter default privileges revoke execute on functions from public;

      create function app.uuid_list(setting text) returns uuid[] language sql stable parallel safe as $$
        select coalesce(nullif(current_setting(setting, true), '')::uuid[], '{}'::uuid[])
      $$;
      create function app.hat() returns text language sql stable parallel safe as $$
        select coalesce(current_setting('app.hat', true), '')
      $$;
      create function app.person_id() returns uuid language sql stable parallel safe as $$
        select nullif(current_setting('app.person_id', true), '')::uuid
      $$;
      create function app.plan_ids() returns uuid[] language sql stable parallel safe as $$ select app.uuid_list('app.plan_ids') $$;
      create function app.sponsor_ids() returns uuid[] language sql stable parallel safe as $$ select app.uuid_list('app.sponsor_ids') $$;
      create function app.participant_ids() returns uuid[] language sql stable parallel safe as $$ select app.uuid_list('app.participant_ids') $$;
      create function app.member_plan_ids() returns uuid[] language sql stable parallel safe as $$ select app.uuid_list('app.member_plan_ids') $$;
      grant execute on all functions in schema app to ${APPLICATION_ROLE};

      create function app.refuse_change() returns trigger language plpgsql as $$
      begin
        raise exception '% is append-only: a correction is a new row', tg_table_name using errcode = 'QP004';
      end $$;

      -- immutable so that it can be indexed: the dictionary is named, so the answer does not hang on the search path
      create function app.fold(value text) returns text language sql immutable parallel safe strict as $$
        select lower(public.unaccent('public.unaccent'::regdictionary, value))
      $$;
    `);
  }
}
