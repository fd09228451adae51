import type { Knex } from 'knex';

/** Tables of what belongs to a pattern besides its lines; they differ only in what they hold. */
const ofPattern = (table: string, columns: string) => `
  create table ${table} (
    id uuid primary key default gen_random_uuid(),
    pattern_id uuid not null references patterns on delete cascade,
    order_key text collate "C" not null,
    ${columns},
    deleted_at timestamptz,
    version integer not null default 1
  );
  create index ${table}_pattern_id on ${table} (pattern_id);
`;

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    create table patterns (
      id uuid primary key default gen_random_uuid(),
      studio_id uuid not null references studios on delete cascade,
      code text not null unique,
      title text not null,
      state text not null default 'drafting' check (state in ('reading', 'drafting', 'in-proof', 'published')),
      visibility text not null default 'private' check (visibility in ('private', 'unlisted', 'listed')),
      terms text not null default 'US' check (terms in ('US', 'UK')),
      sizes text[] not null default '{}',
      details jsonb not null default '{}',
      created_by uuid references people on delete set null,
      created_at timestamptz not null default now(),
      touched_at timestamptz not null default now(),
      archived_at timestamptz,
      deleted_at timestamptz,
      version integer not null default 1
    );
    create index patterns_studio_id on patterns (studio_id);
    create index patterns_created_by on patterns (created_by);

    -- The number is printed in addresses and never given twice in a pattern.
    create table pattern_recordings (
      pattern_id uuid not null references patterns on delete cascade,
      number integer not null check (number >= 1),
      recording_id uuid not null references recordings on delete cascade,
      order_key text collate "C" not null,
      removed_at timestamptz,
      primary key (pattern_id, number),
      unique (pattern_id, recording_id)
    );
    create index pattern_recordings_recording_id on pattern_recordings (recording_id);

    create table pieces (
      id uuid primary key default gen_random_uuid(),
      pattern_id uuid not null references patterns on delete cascade,
      order_key text collate "C" not null,
      name text not null,
      make integer not null default 1 check (make between 1 and 999),
      worked text not null check (worked in ('spiral', 'joined', 'rows')),
      turning jsonb not null default '{}',
      starts_on_line_id uuid,
      deleted_at timestamptz,
      version integer not null default 1
    );
    create index pieces_pattern_id on pieces (pattern_id);
    create index pieces_starts_on_line_id on pieces (starts_on_line_id);

    create table lines (
      id uuid primary key default gen_random_uuid(),
      pattern_id uuid not null references patterns on delete cascade,
      short_id text not null check (short_id ~ '^[a-z0-9]+$'),
      piece_id uuid not null references pieces on delete cascade,
      order_key text collate "C" not null,
      kind text not null check (kind in ('foundation', 'round', 'row', 'step', 'note')),
      label text not null default '',
      from_no integer,
      to_no integer,
      text text not null default '',
      note text not null default '',
      written jsonb,
      heard_total jsonb,
      said jsonb,
      filmed boolean not null default true,
      put_aside_reason text,
      spoken_slip text,
      deleted_at timestamptz,
      version integer not null default 1,
      unique (pattern_id, short_id)
    );
    create index lines_piece_id on lines (piece_id);
    alter table pieces add foreign key (starts_on_line_id) references lines on delete set null;

    create table line_evidence (
      id uuid primary key default gen_random_uuid(),
      line_id uuid not null references lines on delete cascade,
      reading_id uuid not null references readings on delete cascade,
      transcript_id uuid not null references transcripts on delete cascade,
      first_word integer not null,
      last_word integer not null,
      start_ms integer not null,
      end_ms integer not null,
      role text not null check (role in ('announcement', 'work', 'total', 'unread'))
    );
    create index line_evidence_line_id on line_evidence (line_id);
    create index line_evidence_reading_id on line_evidence (reading_id);
    create index line_evidence_transcript_id on line_evidence (transcript_id);

    -- What a person has changed by hand, and a second reading must leave alone.
    create table line_touched (
      line_id uuid not null references lines on delete cascade,
      field text not null,
      at timestamptz not null default now(),
      primary key (line_id, field)
    );

    create table marks (
      id uuid primary key default gen_random_uuid(),
      pattern_id uuid not null references patterns on delete cascade,
      line_id uuid references lines on delete cascade,
      recording_id uuid not null references recordings on delete cascade,
      start_ms integer not null check (start_ms >= 0),
      end_ms integer,
      main boolean not null default true,
      title text,
      made_by text not null check (made_by in ('reading', 'person')),
      deleted_at timestamptz,
      version integer not null default 1,
      check (end_ms >= start_ms)
    );
    create index marks_pattern_id on marks (pattern_id);
    create index marks_line_id on marks (line_id);
    create index marks_recording_id on marks (recording_id);

    -- Every write, under the deed it was part of; undo, history and restore read it.
    create table changes (
      id bigserial primary key,
      pattern_id uuid not null references patterns on delete cascade,
      deed_id uuid not null,
      person_id uuid references people on delete set null,
      at timestamptz not null default now(),
      entity text not null,
      entity_id uuid not null,
      before jsonb,
      after jsonb,
      undoes_deed_id uuid
    );
    create index changes_pattern_id_id on changes (pattern_id, id);
    create index changes_person_id on changes (person_id);
    create index changes_deed_id on changes (deed_id);
  `);
  await knex.raw(
    ofPattern('special_stitches', `name text not null, abbreviation text not null default '', text text not null`),
  );
  await knex.raw(
    ofPattern(
      'materials',
      `kind text not null check (kind in ('yarn', 'hook', 'notion', 'filling')),
       name text not null,
       details jsonb not null default '{}'`,
    ),
  );
  await knex.raw(ofPattern('cautions', `kind text not null, text text not null, brought_by text`));
  await knex.raw(ofPattern('notes', `text text not null`));
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('alter table pieces drop constraint pieces_starts_on_line_id_fkey');
  await knex.raw(`
    drop table notes, cautions, materials, special_stitches, changes, marks, line_touched, line_evidence, lines, pieces,
      pattern_recordings, patterns
  `);
}
