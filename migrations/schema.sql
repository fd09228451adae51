CREATE SCHEMA public;

COMMENT ON SCHEMA public IS 'standard public schema';

CREATE TABLE public.audit (
    id bigint NOT NULL,
    at timestamp with time zone DEFAULT now() NOT NULL,
    person_id uuid,
    what text NOT NULL,
    target text DEFAULT ''::text NOT NULL,
    request_id text DEFAULT ''::text NOT NULL
);

CREATE SEQUENCE public.audit_id_seq
    START WITH 1
    INCREMENT BY 1
    NO MINVALUE
    NO MAXVALUE
    CACHE 1;

ALTER SEQUENCE public.audit_id_seq OWNED BY public.audit.id;

CREATE TABLE public.cautions (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    pattern_id uuid NOT NULL,
    order_key text NOT NULL COLLATE pg_catalog."C",
    kind text NOT NULL,
    text text NOT NULL,
    brought_by text,
    deleted_at timestamp with time zone,
    version integer DEFAULT 1 NOT NULL
);

CREATE TABLE public.changes (
    id bigint NOT NULL,
    pattern_id uuid NOT NULL,
    deed_id uuid NOT NULL,
    person_id uuid,
    at timestamp with time zone DEFAULT now() NOT NULL,
    entity text NOT NULL,
    entity_id uuid NOT NULL,
    before jsonb,
    after jsonb,
    undoes_deed_id uuid
);

CREATE SEQUENCE public.changes_id_seq
    START WITH 1
    INCREMENT BY 1
    NO MINVALUE
    NO MAXVALUE
    CACHE 1;

ALTER SEQUENCE public.changes_id_seq OWNED BY public.changes.id;

CREATE TABLE public.cues (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    transcript_id uuid NOT NULL,
    ordinal integer NOT NULL,
    start_ms integer NOT NULL,
    end_ms integer NOT NULL,
    heard text NOT NULL,
    corrected text,
    version integer DEFAULT 1 NOT NULL,
    CONSTRAINT cues_check CHECK ((end_ms >= start_ms)),
    CONSTRAINT cues_ordinal_check CHECK ((ordinal >= 1)),
    CONSTRAINT cues_start_ms_check CHECK ((start_ms >= 0))
);

CREATE TABLE public.edition_files (
    edition_id uuid NOT NULL,
    variant text NOT NULL,
    object_id uuid NOT NULL
);

CREATE TABLE public.editions (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    pattern_id uuid NOT NULL,
    number integer NOT NULL,
    schema_version integer NOT NULL,
    engine_version text NOT NULL,
    document jsonb NOT NULL,
    published_at timestamp with time zone NOT NULL,
    published_by uuid,
    withdrawn_at timestamp with time zone,
    withdrawn_reason text,
    CONSTRAINT editions_number_check CHECK ((number >= 1))
);

CREATE TABLE public.errata (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    edition_id uuid NOT NULL,
    ordinal integer NOT NULL,
    line_id uuid,
    weight text NOT NULL,
    was text DEFAULT ''::text NOT NULL,
    now text DEFAULT ''::text NOT NULL,
    why text DEFAULT ''::text NOT NULL,
    CONSTRAINT errata_weight_check CHECK ((weight = ANY (ARRAY['correction'::text, 'clearer'::text, 'added'::text, 'look'::text])))
);

CREATE TABLE public.knex_migrations (
    id integer NOT NULL,
    name character varying(255),
    batch integer,
    migration_time timestamp with time zone
);

CREATE SEQUENCE public.knex_migrations_id_seq
    AS integer
    START WITH 1
    INCREMENT BY 1
    NO MINVALUE
    NO MAXVALUE
    CACHE 1;

ALTER SEQUENCE public.knex_migrations_id_seq OWNED BY public.knex_migrations.id;

CREATE TABLE public.knex_migrations_lock (
    index integer NOT NULL,
    is_locked integer
);

CREATE SEQUENCE public.knex_migrations_lock_index_seq
    AS integer
    START WITH 1
    INCREMENT BY 1
    NO MINVALUE
    NO MAXVALUE
    CACHE 1;

ALTER SEQUENCE public.knex_migrations_lock_index_seq OWNED BY public.knex_migrations_lock.index;

CREATE TABLE public.left_checks (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    pattern_id uuid NOT NULL,
    kind text NOT NULL,
    subject text DEFAULT ''::text NOT NULL,
    says text NOT NULL,
    reason text NOT NULL,
    deleted_at timestamp with time zone,
    version integer DEFAULT 1 NOT NULL
);

CREATE TABLE public.line_evidence (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    line_id uuid NOT NULL,
    reading_id uuid,
    transcript_id uuid NOT NULL,
    first_word integer NOT NULL,
    last_word integer NOT NULL,
    start_ms integer NOT NULL,
    end_ms integer NOT NULL,
    role text NOT NULL,
    hearing_id uuid NOT NULL,
    words text DEFAULT ''::text NOT NULL,
    CONSTRAINT line_evidence_role_check CHECK ((role = ANY (ARRAY['announcement'::text, 'work'::text, 'total'::text, 'unread'::text])))
);

CREATE TABLE public.line_touched (
    line_id uuid NOT NULL,
    field text NOT NULL,
    at timestamp with time zone DEFAULT now() NOT NULL
);

CREATE TABLE public.lines (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    pattern_id uuid NOT NULL,
    short_id text NOT NULL,
    piece_id uuid NOT NULL,
    order_key text NOT NULL COLLATE pg_catalog."C",
    kind text NOT NULL,
    label text DEFAULT ''::text NOT NULL,
    from_no integer,
    to_no integer,
    text text DEFAULT ''::text NOT NULL,
    note text DEFAULT ''::text NOT NULL,
    written jsonb,
    heard_total jsonb,
    said jsonb,
    filmed boolean DEFAULT true NOT NULL,
    put_aside_reason text,
    spoken_slip text,
    deleted_at timestamp with time zone,
    version integer DEFAULT 1 NOT NULL,
    hearings uuid[] DEFAULT '{}'::uuid[] NOT NULL,
    CONSTRAINT lines_kind_check CHECK ((kind = ANY (ARRAY['foundation'::text, 'round'::text, 'row'::text, 'step'::text, 'note'::text]))),
    CONSTRAINT lines_short_id_check CHECK ((short_id ~ '^[a-z0-9]+$'::text))
);

CREATE TABLE public.mails (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    kind text NOT NULL,
    to_email public.citext NOT NULL,
    message_id text NOT NULL,
    payload jsonb NOT NULL,
    state text DEFAULT 'queued'::text NOT NULL,
    tries integer DEFAULT 0 NOT NULL,
    last_error text,
    created_at timestamp with time zone DEFAULT now() NOT NULL,
    sent_at timestamp with time zone,
    CONSTRAINT mails_state_check CHECK ((state = ANY (ARRAY['queued'::text, 'sending'::text, 'sent'::text, 'doubtful'::text, 'bounced'::text, 'failed'::text])))
);

CREATE TABLE public.marks (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    pattern_id uuid NOT NULL,
    line_id uuid,
    recording_id uuid NOT NULL,
    start_ms integer NOT NULL,
    end_ms integer,
    main boolean DEFAULT true NOT NULL,
    title text,
    made_by text NOT NULL,
    deleted_at timestamp with time zone,
    version integer DEFAULT 1 NOT NULL,
    transcript_id uuid,
    CONSTRAINT marks_check CHECK ((end_ms >= start_ms)),
    CONSTRAINT marks_made_by_check CHECK ((made_by = ANY (ARRAY['reading'::text, 'person'::text]))),
    CONSTRAINT marks_start_ms_check CHECK ((start_ms >= 0))
);

CREATE TABLE public.materials (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    pattern_id uuid NOT NULL,
    order_key text NOT NULL COLLATE pg_catalog."C",
    kind text NOT NULL,
    name text NOT NULL,
    details jsonb DEFAULT '{}'::jsonb NOT NULL,
    deleted_at timestamp with time zone,
    version integer DEFAULT 1 NOT NULL,
    CONSTRAINT materials_kind_check CHECK ((kind = ANY (ARRAY['yarn'::text, 'hook'::text, 'notion'::text, 'filling'::text])))
);

CREATE TABLE public.members (
    studio_id uuid NOT NULL,
    person_id uuid NOT NULL,
    role text NOT NULL,
    joined_at timestamp with time zone DEFAULT now() NOT NULL,
    left_at timestamp with time zone,
    CONSTRAINT members_role_check CHECK ((role = ANY (ARRAY['owner'::text, 'creator'::text, 'editor'::text])))
);

CREATE TABLE public.notes (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    pattern_id uuid NOT NULL,
    order_key text NOT NULL COLLATE pg_catalog."C",
    text text NOT NULL,
    deleted_at timestamp with time zone,
    version integer DEFAULT 1 NOT NULL
);

CREATE TABLE public.objects (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    studio_id uuid NOT NULL,
    key text NOT NULL,
    kind text NOT NULL,
    state text NOT NULL,
    bytes bigint NOT NULL,
    type text NOT NULL,
    sha256 text,
    created_at timestamp with time zone DEFAULT now() NOT NULL,
    touched_at timestamp with time zone DEFAULT now() NOT NULL,
    CONSTRAINT objects_bytes_check CHECK ((bytes >= 0)),
    CONSTRAINT objects_kind_check CHECK ((kind = ANY (ARRAY['clip'::text, 'rendition'::text, 'poster'::text, 'still'::text, 'sheet'::text, 'mark'::text, 'photo'::text]))),
    CONSTRAINT objects_state_check CHECK ((state = ANY (ARRAY['arriving'::text, 'ready'::text, 'doomed'::text])))
);

CREATE TABLE public.pattern_recordings (
    pattern_id uuid NOT NULL,
    number integer NOT NULL,
    recording_id uuid NOT NULL,
    order_key text NOT NULL COLLATE pg_catalog."C",
    removed_at timestamp with time zone,
    CONSTRAINT pattern_recordings_number_check CHECK ((number >= 1))
);

CREATE TABLE public.patterns (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    studio_id uuid NOT NULL,
    code text NOT NULL,
    title text NOT NULL,
    state text DEFAULT 'drafting'::text NOT NULL,
    visibility text DEFAULT 'private'::text NOT NULL,
    terms text DEFAULT 'US'::text NOT NULL,
    sizes text[] DEFAULT '{}'::text[] NOT NULL,
    details jsonb DEFAULT '{}'::jsonb NOT NULL,
    created_by uuid,
    created_at timestamp with time zone DEFAULT now() NOT NULL,
    touched_at timestamp with time zone DEFAULT now() NOT NULL,
    archived_at timestamp with time zone,
    deleted_at timestamp with time zone,
    version integer DEFAULT 1 NOT NULL,
    CONSTRAINT patterns_state_check CHECK ((state = ANY (ARRAY['reading'::text, 'drafting'::text, 'in-proof'::text, 'published'::text]))),
    CONSTRAINT patterns_terms_check CHECK ((terms = ANY (ARRAY['US'::text, 'UK'::text]))),
    CONSTRAINT patterns_visibility_check CHECK ((visibility = ANY (ARRAY['private'::text, 'unlisted'::text, 'listed'::text])))
);

CREATE TABLE public.people (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    email public.citext NOT NULL,
    email_confirmed_at timestamp with time zone,
    name text NOT NULL,
    password_hash text NOT NULL,
    locale text DEFAULT 'en'::text NOT NULL,
    time_zone text DEFAULT 'UTC'::text NOT NULL,
    preferences jsonb DEFAULT '{}'::jsonb NOT NULL,
    is_operator boolean DEFAULT false NOT NULL,
    disabled_at timestamp with time zone,
    delete_after timestamp with time zone,
    created_at timestamp with time zone DEFAULT now() NOT NULL,
    version integer DEFAULT 1 NOT NULL
);

CREATE TABLE public.pieces (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    pattern_id uuid NOT NULL,
    order_key text NOT NULL COLLATE pg_catalog."C",
    name text NOT NULL,
    make integer DEFAULT 1 NOT NULL,
    worked text NOT NULL,
    turning jsonb DEFAULT '{}'::jsonb NOT NULL,
    starts_on_line_id uuid,
    deleted_at timestamp with time zone,
    version integer DEFAULT 1 NOT NULL,
    CONSTRAINT pieces_make_check CHECK (((make >= 1) AND (make <= 999))),
    CONSTRAINT pieces_worked_check CHECK ((worked = ANY (ARRAY['spiral'::text, 'joined'::text, 'rows'::text])))
);

CREATE TABLE public.rate_limits (
    bucket text NOT NULL,
    hits integer NOT NULL,
    resets_at timestamp with time zone NOT NULL
);

CREATE TABLE public.readings (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    transcript_id uuid NOT NULL,
    engine_version text NOT NULL,
    terms text NOT NULL,
    terms_reason text NOT NULL,
    draft jsonb NOT NULL,
    created_at timestamp with time zone DEFAULT now() NOT NULL,
    CONSTRAINT readings_terms_check CHECK ((terms = ANY (ARRAY['US'::text, 'UK'::text])))
);

CREATE TABLE public.recordings (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    studio_id uuid NOT NULL,
    title text NOT NULL,
    clip_object_id uuid,
    rendition_object_id uuid,
    poster_object_id uuid,
    public_url text,
    public_offset_ms integer DEFAULT 0 NOT NULL,
    duration_ms integer,
    codec text,
    language text,
    created_at timestamp with time zone DEFAULT now() NOT NULL,
    version integer DEFAULT 1 NOT NULL,
    spoken_terms text,
    CONSTRAINT recordings_duration_ms_check CHECK ((duration_ms >= 0)),
    CONSTRAINT recordings_spoken_terms_check CHECK ((spoken_terms = ANY (ARRAY['US'::text, 'UK'::text])))
);

CREATE TABLE public.request_keys (
    scope text NOT NULL,
    key text NOT NULL,
    request_hash text NOT NULL,
    status integer,
    answer jsonb,
    created_at timestamp with time zone NOT NULL
);

CREATE TABLE public.sessions (
    token_hash bytea NOT NULL,
    person_id uuid NOT NULL,
    created_at timestamp with time zone NOT NULL,
    seen_at timestamp with time zone NOT NULL,
    user_agent text DEFAULT ''::text NOT NULL
);

CREATE TABLE public.special_stitches (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    pattern_id uuid NOT NULL,
    order_key text NOT NULL COLLATE pg_catalog."C",
    name text NOT NULL,
    abbreviation text DEFAULT ''::text NOT NULL,
    text text NOT NULL,
    deleted_at timestamp with time zone,
    version integer DEFAULT 1 NOT NULL
);

CREATE TABLE public.studios (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    name text NOT NULL,
    slug text NOT NULL,
    listed boolean DEFAULT false NOT NULL,
    default_terms text DEFAULT 'US'::text NOT NULL,
    paper text DEFAULT 'A4'::text NOT NULL,
    head text DEFAULT ''::text NOT NULL,
    foot text DEFAULT ''::text NOT NULL,
    house_style jsonb DEFAULT '{}'::jsonb NOT NULL,
    settings jsonb DEFAULT '{}'::jsonb NOT NULL,
    quota_bytes bigint NOT NULL,
    created_at timestamp with time zone DEFAULT now() NOT NULL,
    version integer DEFAULT 1 NOT NULL,
    CONSTRAINT studios_default_terms_check CHECK ((default_terms = ANY (ARRAY['US'::text, 'UK'::text]))),
    CONSTRAINT studios_paper_check CHECK ((paper = ANY (ARRAY['A4'::text, 'Letter'::text]))),
    CONSTRAINT studios_quota_bytes_check CHECK ((quota_bytes >= 0))
);

CREATE TABLE public.tokens (
    hash bytea NOT NULL,
    kind text NOT NULL,
    person_id uuid,
    email public.citext,
    payload jsonb DEFAULT '{}'::jsonb NOT NULL,
    expires_at timestamp with time zone NOT NULL,
    used_at timestamp with time zone,
    CONSTRAINT tokens_kind_check CHECK ((kind = ANY (ARRAY['confirm'::text, 'reset'::text, 'invite'::text])))
);

CREATE TABLE public.transcripts (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    recording_id uuid NOT NULL,
    number integer NOT NULL,
    file_name text NOT NULL,
    source_text text NOT NULL,
    encoding text NOT NULL,
    format text NOT NULL,
    problems jsonb DEFAULT '[]'::jsonb NOT NULL,
    created_at timestamp with time zone DEFAULT now() NOT NULL,
    reading_failed_at timestamp with time zone,
    CONSTRAINT transcripts_format_check CHECK ((format = ANY (ARRAY['srt'::text, 'vtt'::text, 'text'::text]))),
    CONSTRAINT transcripts_number_check CHECK ((number >= 1))
);

CREATE TABLE public.upload_parts (
    upload_id uuid NOT NULL,
    n integer NOT NULL,
    size integer NOT NULL,
    sha256 text NOT NULL,
    etag text NOT NULL,
    CONSTRAINT upload_parts_n_check CHECK (((n >= 1) AND (n <= 10000))),
    CONSTRAINT upload_parts_size_check CHECK ((size > 0))
);

CREATE TABLE public.uploads (
    id uuid DEFAULT gen_random_uuid() NOT NULL,
    recording_id uuid NOT NULL,
    person_id uuid NOT NULL,
    object_id uuid NOT NULL,
    s3_upload_id text NOT NULL,
    name text NOT NULL,
    size bigint NOT NULL,
    last_modified bigint NOT NULL,
    first_mib_sha256 text NOT NULL,
    part_size integer NOT NULL,
    state text NOT NULL,
    refusal text,
    created_at timestamp with time zone DEFAULT now() NOT NULL,
    touched_at timestamp with time zone DEFAULT now() NOT NULL,
    CONSTRAINT uploads_part_size_check CHECK ((part_size > 0)),
    CONSTRAINT uploads_size_check CHECK ((size > 0)),
    CONSTRAINT uploads_state_check CHECK ((state = ANY (ARRAY['arriving'::text, 'completing'::text, 'ready'::text, 'refused'::text, 'given-up'::text])))
);

CREATE TABLE public.workers (
    id text NOT NULL,
    seen_at timestamp with time zone NOT NULL
);

ALTER TABLE ONLY public.audit ALTER COLUMN id SET DEFAULT nextval('public.audit_id_seq'::regclass);

ALTER TABLE ONLY public.changes ALTER COLUMN id SET DEFAULT nextval('public.changes_id_seq'::regclass);

ALTER TABLE ONLY public.knex_migrations ALTER COLUMN id SET DEFAULT nextval('public.knex_migrations_id_seq'::regclass);

ALTER TABLE ONLY public.knex_migrations_lock ALTER COLUMN index SET DEFAULT nextval('public.knex_migrations_lock_index_seq'::regclass);

ALTER TABLE ONLY public.audit
    ADD CONSTRAINT audit_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.cautions
    ADD CONSTRAINT cautions_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.changes
    ADD CONSTRAINT changes_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.cues
    ADD CONSTRAINT cues_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.cues
    ADD CONSTRAINT cues_transcript_id_ordinal_key UNIQUE (transcript_id, ordinal);

ALTER TABLE ONLY public.edition_files
    ADD CONSTRAINT edition_files_pkey PRIMARY KEY (edition_id, variant);

ALTER TABLE ONLY public.editions
    ADD CONSTRAINT editions_pattern_id_number_key UNIQUE (pattern_id, number);

ALTER TABLE ONLY public.editions
    ADD CONSTRAINT editions_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.errata
    ADD CONSTRAINT errata_edition_id_ordinal_key UNIQUE (edition_id, ordinal);

ALTER TABLE ONLY public.errata
    ADD CONSTRAINT errata_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.knex_migrations_lock
    ADD CONSTRAINT knex_migrations_lock_pkey PRIMARY KEY (index);

ALTER TABLE ONLY public.knex_migrations
    ADD CONSTRAINT knex_migrations_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.left_checks
    ADD CONSTRAINT left_checks_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.line_evidence
    ADD CONSTRAINT line_evidence_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.line_touched
    ADD CONSTRAINT line_touched_pkey PRIMARY KEY (line_id, field);

ALTER TABLE ONLY public.lines
    ADD CONSTRAINT lines_pattern_id_short_id_key UNIQUE (pattern_id, short_id);

ALTER TABLE ONLY public.lines
    ADD CONSTRAINT lines_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.mails
    ADD CONSTRAINT mails_message_id_key UNIQUE (message_id);

ALTER TABLE ONLY public.mails
    ADD CONSTRAINT mails_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.marks
    ADD CONSTRAINT marks_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.materials
    ADD CONSTRAINT materials_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.members
    ADD CONSTRAINT members_pkey PRIMARY KEY (studio_id, person_id);

ALTER TABLE ONLY public.notes
    ADD CONSTRAINT notes_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.objects
    ADD CONSTRAINT objects_key_key UNIQUE (key);

ALTER TABLE ONLY public.objects
    ADD CONSTRAINT objects_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.pattern_recordings
    ADD CONSTRAINT pattern_recordings_pattern_id_recording_id_key UNIQUE (pattern_id, recording_id);

ALTER TABLE ONLY public.pattern_recordings
    ADD CONSTRAINT pattern_recordings_pkey PRIMARY KEY (pattern_id, number);

ALTER TABLE ONLY public.patterns
    ADD CONSTRAINT patterns_code_key UNIQUE (code);

ALTER TABLE ONLY public.patterns
    ADD CONSTRAINT patterns_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.people
    ADD CONSTRAINT people_email_key UNIQUE (email);

ALTER TABLE ONLY public.people
    ADD CONSTRAINT people_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.pieces
    ADD CONSTRAINT pieces_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.rate_limits
    ADD CONSTRAINT rate_limits_pkey PRIMARY KEY (bucket);

ALTER TABLE ONLY public.readings
    ADD CONSTRAINT readings_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.recordings
    ADD CONSTRAINT recordings_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.request_keys
    ADD CONSTRAINT request_keys_pkey PRIMARY KEY (scope, key);

ALTER TABLE ONLY public.sessions
    ADD CONSTRAINT sessions_pkey PRIMARY KEY (token_hash);

ALTER TABLE ONLY public.special_stitches
    ADD CONSTRAINT special_stitches_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.studios
    ADD CONSTRAINT studios_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.studios
    ADD CONSTRAINT studios_slug_key UNIQUE (slug);

ALTER TABLE ONLY public.tokens
    ADD CONSTRAINT tokens_pkey PRIMARY KEY (hash);

ALTER TABLE ONLY public.transcripts
    ADD CONSTRAINT transcripts_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.transcripts
    ADD CONSTRAINT transcripts_recording_id_number_key UNIQUE (recording_id, number);

ALTER TABLE ONLY public.upload_parts
    ADD CONSTRAINT upload_parts_pkey PRIMARY KEY (upload_id, n);

ALTER TABLE ONLY public.uploads
    ADD CONSTRAINT uploads_pkey PRIMARY KEY (id);

ALTER TABLE ONLY public.workers
    ADD CONSTRAINT workers_pkey PRIMARY KEY (id);

CREATE INDEX audit_person_id ON public.audit USING btree (person_id);

CREATE INDEX cautions_pattern_id ON public.cautions USING btree (pattern_id);

CREATE INDEX changes_deed_id ON public.changes USING btree (deed_id);

CREATE INDEX changes_pattern_id_id ON public.changes USING btree (pattern_id, id);

CREATE INDEX changes_person_id ON public.changes USING btree (person_id);

CREATE INDEX edition_files_object_id ON public.edition_files USING btree (object_id);

CREATE INDEX editions_published_by ON public.editions USING btree (published_by);

CREATE INDEX errata_line_id ON public.errata USING btree (line_id);

CREATE INDEX left_checks_pattern_id ON public.left_checks USING btree (pattern_id);

CREATE INDEX line_evidence_hearing_id ON public.line_evidence USING btree (hearing_id);

CREATE INDEX line_evidence_line_id ON public.line_evidence USING btree (line_id);

CREATE INDEX line_evidence_reading_id ON public.line_evidence USING btree (reading_id);

CREATE INDEX line_evidence_transcript_id ON public.line_evidence USING btree (transcript_id);

CREATE INDEX lines_piece_id ON public.lines USING btree (piece_id);

CREATE INDEX mails_state ON public.mails USING btree (state);

CREATE INDEX marks_line_id ON public.marks USING btree (line_id);

CREATE INDEX marks_pattern_id ON public.marks USING btree (pattern_id);

CREATE INDEX marks_recording_id ON public.marks USING btree (recording_id);

CREATE INDEX marks_transcript_id ON public.marks USING btree (transcript_id);

CREATE INDEX materials_pattern_id ON public.materials USING btree (pattern_id);

CREATE INDEX members_person_id ON public.members USING btree (person_id);

CREATE INDEX notes_pattern_id ON public.notes USING btree (pattern_id);

CREATE INDEX objects_state_touched_at ON public.objects USING btree (state, touched_at);

CREATE INDEX objects_studio_id ON public.objects USING btree (studio_id);

CREATE INDEX pattern_recordings_recording_id ON public.pattern_recordings USING btree (recording_id);

CREATE INDEX patterns_created_by ON public.patterns USING btree (created_by);

CREATE INDEX patterns_studio_id ON public.patterns USING btree (studio_id);

CREATE INDEX pieces_pattern_id ON public.pieces USING btree (pattern_id);

CREATE INDEX pieces_starts_on_line_id ON public.pieces USING btree (starts_on_line_id);

CREATE INDEX rate_limits_resets_at ON public.rate_limits USING btree (resets_at);

CREATE INDEX readings_transcript_id ON public.readings USING btree (transcript_id);

CREATE INDEX recordings_clip_object_id ON public.recordings USING btree (clip_object_id);

CREATE INDEX recordings_poster_object_id ON public.recordings USING btree (poster_object_id);

CREATE INDEX recordings_rendition_object_id ON public.recordings USING btree (rendition_object_id);

CREATE INDEX recordings_studio_id ON public.recordings USING btree (studio_id);

CREATE INDEX sessions_person_id ON public.sessions USING btree (person_id);

CREATE INDEX special_stitches_pattern_id ON public.special_stitches USING btree (pattern_id);

CREATE INDEX tokens_person_id ON public.tokens USING btree (person_id);

CREATE INDEX uploads_object_id ON public.uploads USING btree (object_id);

CREATE INDEX uploads_person_id ON public.uploads USING btree (person_id);

CREATE INDEX uploads_recording_id ON public.uploads USING btree (recording_id);

CREATE INDEX uploads_state_touched_at ON public.uploads USING btree (state, touched_at);

ALTER TABLE ONLY public.audit
    ADD CONSTRAINT audit_person_id_fkey FOREIGN KEY (person_id) REFERENCES public.people(id) ON DELETE SET NULL;

ALTER TABLE ONLY public.cautions
    ADD CONSTRAINT cautions_pattern_id_fkey FOREIGN KEY (pattern_id) REFERENCES public.patterns(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.changes
    ADD CONSTRAINT changes_pattern_id_fkey FOREIGN KEY (pattern_id) REFERENCES public.patterns(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.changes
    ADD CONSTRAINT changes_person_id_fkey FOREIGN KEY (person_id) REFERENCES public.people(id) ON DELETE SET NULL;

ALTER TABLE ONLY public.cues
    ADD CONSTRAINT cues_transcript_id_fkey FOREIGN KEY (transcript_id) REFERENCES public.transcripts(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.edition_files
    ADD CONSTRAINT edition_files_edition_id_fkey FOREIGN KEY (edition_id) REFERENCES public.editions(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.edition_files
    ADD CONSTRAINT edition_files_object_id_fkey FOREIGN KEY (object_id) REFERENCES public.objects(id);

ALTER TABLE ONLY public.editions
    ADD CONSTRAINT editions_pattern_id_fkey FOREIGN KEY (pattern_id) REFERENCES public.patterns(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.editions
    ADD CONSTRAINT editions_published_by_fkey FOREIGN KEY (published_by) REFERENCES public.people(id) ON DELETE SET NULL;

ALTER TABLE ONLY public.errata
    ADD CONSTRAINT errata_edition_id_fkey FOREIGN KEY (edition_id) REFERENCES public.editions(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.errata
    ADD CONSTRAINT errata_line_id_fkey FOREIGN KEY (line_id) REFERENCES public.lines(id) ON DELETE SET NULL;

ALTER TABLE ONLY public.left_checks
    ADD CONSTRAINT left_checks_pattern_id_fkey FOREIGN KEY (pattern_id) REFERENCES public.patterns(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.line_evidence
    ADD CONSTRAINT line_evidence_line_id_fkey FOREIGN KEY (line_id) REFERENCES public.lines(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.line_evidence
    ADD CONSTRAINT line_evidence_reading_id_fkey FOREIGN KEY (reading_id) REFERENCES public.readings(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.line_evidence
    ADD CONSTRAINT line_evidence_transcript_id_fkey FOREIGN KEY (transcript_id) REFERENCES public.transcripts(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.line_touched
    ADD CONSTRAINT line_touched_line_id_fkey FOREIGN KEY (line_id) REFERENCES public.lines(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.lines
    ADD CONSTRAINT lines_pattern_id_fkey FOREIGN KEY (pattern_id) REFERENCES public.patterns(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.lines
    ADD CONSTRAINT lines_piece_id_fkey FOREIGN KEY (piece_id) REFERENCES public.pieces(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.marks
    ADD CONSTRAINT marks_line_id_fkey FOREIGN KEY (line_id) REFERENCES public.lines(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.marks
    ADD CONSTRAINT marks_pattern_id_fkey FOREIGN KEY (pattern_id) REFERENCES public.patterns(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.marks
    ADD CONSTRAINT marks_recording_id_fkey FOREIGN KEY (recording_id) REFERENCES public.recordings(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.marks
    ADD CONSTRAINT marks_transcript_id_fkey FOREIGN KEY (transcript_id) REFERENCES public.transcripts(id) ON DELETE SET NULL;

ALTER TABLE ONLY public.materials
    ADD CONSTRAINT materials_pattern_id_fkey FOREIGN KEY (pattern_id) REFERENCES public.patterns(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.members
    ADD CONSTRAINT members_person_id_fkey FOREIGN KEY (person_id) REFERENCES public.people(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.members
    ADD CONSTRAINT members_studio_id_fkey FOREIGN KEY (studio_id) REFERENCES public.studios(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.notes
    ADD CONSTRAINT notes_pattern_id_fkey FOREIGN KEY (pattern_id) REFERENCES public.patterns(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.objects
    ADD CONSTRAINT objects_studio_id_fkey FOREIGN KEY (studio_id) REFERENCES public.studios(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.pattern_recordings
    ADD CONSTRAINT pattern_recordings_pattern_id_fkey FOREIGN KEY (pattern_id) REFERENCES public.patterns(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.pattern_recordings
    ADD CONSTRAINT pattern_recordings_recording_id_fkey FOREIGN KEY (recording_id) REFERENCES public.recordings(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.patterns
    ADD CONSTRAINT patterns_created_by_fkey FOREIGN KEY (created_by) REFERENCES public.people(id) ON DELETE SET NULL;

ALTER TABLE ONLY public.patterns
    ADD CONSTRAINT patterns_studio_id_fkey FOREIGN KEY (studio_id) REFERENCES public.studios(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.pieces
    ADD CONSTRAINT pieces_pattern_id_fkey FOREIGN KEY (pattern_id) REFERENCES public.patterns(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.pieces
    ADD CONSTRAINT pieces_starts_on_line_id_fkey FOREIGN KEY (starts_on_line_id) REFERENCES public.lines(id) ON DELETE SET NULL;

ALTER TABLE ONLY public.readings
    ADD CONSTRAINT readings_transcript_id_fkey FOREIGN KEY (transcript_id) REFERENCES public.transcripts(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.recordings
    ADD CONSTRAINT recordings_clip_object_id_fkey FOREIGN KEY (clip_object_id) REFERENCES public.objects(id);

ALTER TABLE ONLY public.recordings
    ADD CONSTRAINT recordings_poster_object_id_fkey FOREIGN KEY (poster_object_id) REFERENCES public.objects(id);

ALTER TABLE ONLY public.recordings
    ADD CONSTRAINT recordings_rendition_object_id_fkey FOREIGN KEY (rendition_object_id) REFERENCES public.objects(id);

ALTER TABLE ONLY public.recordings
    ADD CONSTRAINT recordings_studio_id_fkey FOREIGN KEY (studio_id) REFERENCES public.studios(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.sessions
    ADD CONSTRAINT sessions_person_id_fkey FOREIGN KEY (person_id) REFERENCES public.people(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.special_stitches
    ADD CONSTRAINT special_stitches_pattern_id_fkey FOREIGN KEY (pattern_id) REFERENCES public.patterns(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.tokens
    ADD CONSTRAINT tokens_person_id_fkey FOREIGN KEY (person_id) REFERENCES public.people(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.transcripts
    ADD CONSTRAINT transcripts_recording_id_fkey FOREIGN KEY (recording_id) REFERENCES public.recordings(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.upload_parts
    ADD CONSTRAINT upload_parts_upload_id_fkey FOREIGN KEY (upload_id) REFERENCES public.uploads(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.uploads
    ADD CONSTRAINT uploads_object_id_fkey FOREIGN KEY (object_id) REFERENCES public.objects(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.uploads
    ADD CONSTRAINT uploads_person_id_fkey FOREIGN KEY (person_id) REFERENCES public.people(id) ON DELETE CASCADE;

ALTER TABLE ONLY public.uploads
    ADD CONSTRAINT uploads_recording_id_fkey FOREIGN KEY (recording_id) REFERENCES public.recordings(id) ON DELETE CASCADE;
