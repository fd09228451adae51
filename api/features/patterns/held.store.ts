import type { Knex } from 'knex';
import type { Draft } from '#crochet';

export interface HeardRecording {
  readonly recordingId: string;
  /** The newest transcript, and its newest reading; null while there is none. */
  readonly transcriptId: string | null;
  readonly fileName: string | null;
  readonly readingId: string | null;
  readonly draft: Draft | null;
}

/** A recording that stands in the pattern, with what was last read of it. */
export async function findHeardRecording(
  db: Knex,
  patternId: string,
  recordingId: string,
): Promise<HeardRecording | undefined> {
  const { rows } = await db.raw<{ rows: HeardRecording[] }>(
    `select pr.recording_id as "recordingId", t.id as "transcriptId", t.file_name as "fileName",
            g.id as "readingId", g.draft
       from pattern_recordings pr
       left join lateral (select id, file_name from transcripts where recording_id = pr.recording_id
                           order by number desc limit 1) t on true
       left join lateral (select id, draft from readings where transcript_id = t.id
                           order by created_at desc limit 1) g on true
      where pr.pattern_id = ? and pr.recording_id = ? and pr.removed_at is null`,
    [patternId, recordingId],
  );
  return rows[0];
}

export interface TranscriptOf {
  readonly id: string;
  readonly fileName: string;
}

/** Every transcript of a recording, oldest first. */
export async function listTranscriptsOf(db: Knex, recordingId: string): Promise<TranscriptOf[]> {
  return db('transcripts')
    .where({ recording_id: recordingId })
    .orderBy('number')
    .select<TranscriptOf[]>({ id: 'id', fileName: 'file_name' });
}
