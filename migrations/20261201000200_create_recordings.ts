import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    -- Every object in storage has its row here, so that one sweep finds what nobody owns.
    create table objects (
      id uuid primary key default gen_random_uuid(),
      studio_id uuid not null references studios on delete cascade,
      key text not null unique,
      kind text not null check (kind in ('clip', 'rendition', 'poster', 'still', 'sheet', 'mark', 'photo')),
      state text not null check (state in ('arriving', 'ready', 'doomed')),
      bytes bigint not null check (bytes >= 0),
      type text not null,
      sha256 text,
      created_at timestamptz not null default now(),
      touched_at timestamptz not null default now()
    );
    create index objects_studio_id on objects (studio_id);
    create index objects_state_touched_at on objects (state, touched_at);

    create table recordings (
      id uuid primary key default gen_random_uuid(),
      studio_id uuid not null references studios on delete cascade,
      title text not null,
      clip_object_id uuid references objects,
      rendition_object_id uuid references objects,
      poster_object_id uuid references objects,
      public_url text,
      public_offset_ms integer not null default 0,
      duration_ms integer check (duration_ms >= 0),
      codec text,
      language text,
      created_at timestamptz not null default now(),
      version integer not null default 1
    );
    create index recordings_studio_id on recordings (studio_id);
    create index recordings_clip_object_id on recordings (clip_object_id);
    create index recordings_rendition_object_id on recordings (rendition_object_id);
    create index recordings_poster_object_id on recordings (poster_object_id);

    create table uploads (
      id uuid primary key default gen_random_uuid(),
      recording_id uuid not null references recordings on delete cascade,
      person_id uuid not null references people on delete cascade,
      object_id uuid not null references objects on delete cascade,
      s3_upload_id text not null,
      name text not null,
      size bigint not null check (size > 0),
      last_modified bigint not null,
      first_mib_sha256 text not null,
      part_size integer not null check (part_size > 0),
      state text not null check (state in ('arriving', 'completing', 'ready', 'refused', 'given-up')),
      refusal text,
      created_at timestamptz not null default now(),
      touched_at timestamptz not null default now()
    );
    create index uploads_recording_id on uploads (recording_id);
    create index uploads_person_id on uploads (person_id);
    create index uploads_object_id on uploads (object_id);
    create index uploads_state_touched_at on uploads (state, touched_at);

    create table upload_parts (
      upload_id uuid not null references uploads on delete cascade,
      n integer not null check (n between 1 and 10000),
      size integer not null check (size > 0),
      sha256 text not null,
      etag text not null,
      primary key (upload_id, n)
    );

    create table transcripts (
      id uuid primary key default gen_random_uuid(),
      recording_id uuid not null references recordings on delete cascade,
      number integer not null check (number >= 1),
      file_name text not null,
      source_text text not null,
      encoding text not null,
      format text not null check (format in ('srt', 'vtt', 'text')),
      problems jsonb not null default '[]',
      created_at timestamptz not null default now(),
      unique (recording_id, number)
    );

    create table cues (
      id uuid primary key default gen_random_uuid(),
      transcript_id uuid not null references transcripts on delete cascade,
      ordinal integer not null check (ordinal >= 1),
      start_ms integer not null check (start_ms >= 0),
      end_ms integer not null,
      heard text not null,
      corrected text,
      version integer not null default 1,
      unique (transcript_id, ordinal),
      check (end_ms >= start_ms)
    );

    -- A reading is a pure function of the cues and of the engine that read them; it is never changed.
    create table readings (
      id uuid primary key default gen_random_uuid(),
      transcript_id uuid not null references transcripts on delete cascade,
      engine_version text not null,
      terms text not null check (terms in ('US', 'UK')),
      terms_reason text not null,
      draft jsonb not null,
      created_at timestamptz not null default now()
    );
    create index readings_transcript_id on readings (transcript_id);
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('drop table readings, cues, transcripts, upload_parts, uploads, recordings, objects');
}
