import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    -- The only outbox: a mail is a row, committed with the change that asks for it.
    create table mails (
      id uuid primary key default gen_random_uuid(),
      kind text not null,
      to_email citext not null,
      message_id text not null unique,
      payload jsonb not null,
      state text not null default 'queued' check (state in ('queued', 'sending', 'sent', 'doubtful', 'bounced', 'failed')),
      tries integer not null default 0,
      last_error text,
      created_at timestamptz not null default now(),
      sent_at timestamptz
    );
    create index mails_state on mails (state);

    create table request_keys (
      scope text not null,
      key text not null,
      request_hash text not null,
      status integer,
      answer jsonb,
      created_at timestamptz not null,
      primary key (scope, key)
    );

    create table rate_limits (
      bucket text primary key,
      hits integer not null,
      resets_at timestamptz not null
    );
    create index rate_limits_resets_at on rate_limits (resets_at);

    create table workers (
      id text primary key,
      seen_at timestamptz not null
    );

    create table audit (
      id bigserial primary key,
      at timestamptz not null default now(),
      person_id uuid references people on delete set null,
      what text not null,
      target text not null default '',
      request_id text not null default ''
    );
    create index audit_person_id on audit (person_id);
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('drop table audit, workers, rate_limits, request_keys, mails');
}
