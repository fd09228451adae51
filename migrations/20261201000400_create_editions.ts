import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    -- The document is the edition: sheet, watch page and exports render it and nothing else.
    create table editions (
      id uuid primary key default gen_random_uuid(),
      pattern_id uuid not null references patterns on delete cascade,
      number integer not null check (number >= 1),
      schema_version integer not null,
      engine_version text not null,
      document jsonb not null,
      published_at timestamptz not null,
      published_by uuid references people on delete set null,
      withdrawn_at timestamptz,
      withdrawn_reason text,
      unique (pattern_id, number)
    );
    create index editions_published_by on editions (published_by);

    create table edition_files (
      edition_id uuid not null references editions on delete cascade,
      variant text not null,
      object_id uuid not null references objects,
      primary key (edition_id, variant)
    );
    create index edition_files_object_id on edition_files (object_id);

    create table errata (
      id uuid primary key default gen_random_uuid(),
      edition_id uuid not null references editions on delete cascade,
      ordinal integer not null,
      line_id uuid references lines on delete set null,
      weight text not null check (weight in ('correction', 'clearer', 'added', 'look')),
      was text not null default '',
      now text not null default '',
      why text not null default '',
      unique (edition_id, ordinal)
    );
    create index errata_line_id on errata (line_id);
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('drop table errata, edition_files, editions');
}
