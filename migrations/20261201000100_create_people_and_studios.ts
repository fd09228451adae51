import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw('create extension if not exists citext');
  await knex.raw(`
    create table people (
      id uuid primary key default gen_random_uuid(),
      email citext not null unique,
      email_confirmed_at timestamptz,
      name text not null,
      password_hash text not null,
      locale text not null default 'en',
      time_zone text not null default 'UTC',
      preferences jsonb not null default '{}',
      is_operator boolean not null default false,
      disabled_at timestamptz,
      delete_after timestamptz,
      created_at timestamptz not null default now(),
      version integer not null default 1
    );

    -- Only the hash of a session's token is stored: a stolen table signs nobody in.
    create table sessions (
      token_hash bytea primary key,
      person_id uuid not null references people on delete cascade,
      created_at timestamptz not null,
      seen_at timestamptz not null,
      user_agent text not null default ''
    );
    create index sessions_person_id on sessions (person_id);

    create table tokens (
      hash bytea primary key,
      kind text not null check (kind in ('confirm', 'reset', 'invite')),
      person_id uuid references people on delete cascade,
      email citext,
      payload jsonb not null default '{}',
      expires_at timestamptz not null,
      used_at timestamptz
    );
    create index tokens_person_id on tokens (person_id);

    create table studios (
      id uuid primary key default gen_random_uuid(),
      name text not null,
      slug text not null unique,
      listed boolean not null default false,
      default_terms text not null default 'US' check (default_terms in ('US', 'UK')),
      paper text not null default 'A4' check (paper in ('A4', 'Letter')),
      head text not null default '',
      foot text not null default '',
      house_style jsonb not null default '{}',
      settings jsonb not null default '{}',
      quota_bytes bigint not null check (quota_bytes >= 0),
      created_at timestamptz not null default now(),
      version integer not null default 1
    );

    -- A member who leaves keeps the row: what they signed and changed stays under their name.
    create table members (
      studio_id uuid not null references studios on delete cascade,
      person_id uuid not null references people on delete cascade,
      role text not null check (role in ('owner', 'creator', 'editor')),
      joined_at timestamptz not null default now(),
      left_at timestamptz,
      primary key (studio_id, person_id)
    );
    create index members_person_id on members (person_id);
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('drop table members, studios, tokens, sessions, people');
  await knex.raw('drop extension citext');
}
