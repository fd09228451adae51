import type { Knex } from 'knex';
import type { Cue, TranscriptProblem } from '#contract/recordings';

export interface TranscriptRow {
  readonly id: string;
  readonly recordingId: string;
  readonly studioId: string;
  readonly number: number;
  readonly fileName: string;
  readonly encoding: string;
  readonly format: 'srt' | 'vtt' | 'text';
  readonly problems: TranscriptProblem[];
  readonly readingFailedAt: Date | null;
}

const COLUMNS = {
  id: 't.id',
  recordingId: 't.recording_id',
  studioId: 'r.studio_id',
  number: 't.number',
  fileName: 't.file_name',
  encoding: 't.encoding',
  format: 't.format',
  problems: 't.problems',
  readingFailedAt: 't.reading_failed_at',
} as const;

const transcripts = (db: Knex) => db('transcripts as t').join('recordings as r', 'r.id', 't.recording_id');

export async function findTranscript(db: Knex, id: string): Promise<TranscriptRow | undefined> {
  return transcripts(db).where('t.id', id).first<TranscriptRow | undefined>(COLUMNS);
}

/** The file as it came. */
export async function readSourceText(db: Knex, id: string): Promise<string> {
  const row = await db('transcripts').where({ id }).first<{ source_text: string } | undefined>('source_text');
  return row?.source_text ?? '';
}

export interface NewestTranscript extends TranscriptRow {
  readonly captions: number;
  readonly lastMs: number | null;
}

const withCaptions = (db: Knex) =>
  transcripts(db)
    .leftJoin('cues as c', 'c.transcript_id', 't.id')
    .groupBy('t.id', 'r.studio_id')
    .select<NewestTranscript[]>(COLUMNS, db.raw('count(c.id)::int as captions'), db.raw('max(c.end_ms) as "lastMs"'));

/** The newest transcript of each of these recordings. */
export async function listNewestTranscripts(db: Knex, recordingIds: readonly string[]): Promise<NewestTranscript[]> {
  return withCaptions(db)
    .whereIn('t.recording_id', recordingIds)
    .whereRaw('t.number = (select max(n.number) from transcripts n where n.recording_id = t.recording_id)');
}

export async function findTranscriptHead(db: Knex, id: string): Promise<NewestTranscript | undefined> {
  return (await withCaptions(db).where('t.id', id))[0];
}

export interface NewCue {
  readonly startMs: number;
  readonly endMs: number;
  readonly text: string;
}

/** Keeps a transcript under the recording's next number, with its captions. */
export async function insertTranscript(
  trx: Knex.Transaction,
  row: Pick<TranscriptRow, 'id' | 'recordingId' | 'fileName' | 'encoding' | 'format' | 'problems'> & {
    readonly sourceText: string;
  },
  cues: readonly NewCue[],
): Promise<void> {
  const last = await trx('transcripts')
    .where({ recording_id: row.recordingId })
    .max<{ max: number | null }[]>({ max: 'number' });
  await trx('transcripts').insert({
    id: row.id,
    recording_id: row.recordingId,
    number: (last[0]?.max ?? 0) + 1,
    file_name: row.fileName,
    source_text: row.sourceText,
    encoding: row.encoding,
    format: row.format,
    problems: JSON.stringify(row.problems),
  });
  await trx.raw(
    `insert into cues (transcript_id, ordinal, start_ms, end_ms, heard)
     select ?, ordinal, "startMs", "endMs", text
       from rows from (jsonb_to_recordset(?::jsonb) as ("startMs" int, "endMs" int, text text)) with ordinality
              as c ("startMs", "endMs", text, ordinal)`,
    [row.id, JSON.stringify(cues)],
  );
}

/** How long a transcript is, in characters of its captions. */
export async function countCharacters(db: Knex, transcriptId: string): Promise<number> {
  const row = await db('cues')
    .where({ transcript_id: transcriptId })
    .first<{ n: number } | undefined>(db.raw('coalesce(sum(length(coalesce(corrected, heard))), 0)::int as n'));
  return row?.n ?? 0;
}

const CUE = {
  id: 'id',
  ordinal: 'ordinal',
  startMs: 'start_ms',
  endMs: 'end_ms',
  heard: 'heard',
  corrected: 'corrected',
  version: 'version',
} as const;

/** The captions of a transcript in the order of the file. */
export async function listCues(db: Knex, transcriptId: string): Promise<Cue[]> {
  return db('cues').where({ transcript_id: transcriptId }).orderBy('ordinal').select<Cue[]>(CUE);
}

/** The captions of a transcript, kept from other writers until the transaction ends. */
export async function lockCues(trx: Knex.Transaction, transcriptId: string): Promise<Cue[]> {
  return trx('cues').where({ transcript_id: transcriptId }).orderBy('ordinal').forUpdate().select<Cue[]>(CUE);
}

export async function findCue(
  trx: Knex.Transaction,
  id: string,
): Promise<(Cue & { transcriptId: string }) | undefined> {
  return trx('cues')
    .where({ id })
    .forUpdate()
    .first<(Cue & { transcriptId: string }) | undefined>({ ...CUE, transcriptId: 'transcript_id' });
}

export async function updateCue(trx: Knex.Transaction, cue: Cue, corrected: string | null): Promise<Cue> {
  const [saved] = await trx('cues')
    .where({ id: cue.id })
    .update({ corrected, version: cue.version + 1 })
    .returning<{ version: number }[]>('version');
  return { ...cue, corrected, version: saved?.version ?? cue.version };
}

/** Says that a transcript waits to be read, or that reading it failed. */
export async function setReadingFailed(db: Knex, id: string, at: Date | null): Promise<void> {
  await db('transcripts').where({ id }).update({ reading_failed_at: at });
}
