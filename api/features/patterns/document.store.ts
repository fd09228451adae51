import type { Knex } from 'knex';
import type { Evidence } from '#contract/rows';
import type { PatternRecording } from '#contract/patterns';

interface RecordingRow {
  id: string;
  number: number;
  title: string;
  public_url: string | null;
  public_offset_ms: number;
  duration_ms: number | null;
  version: number;
  clip_state: 'arriving' | 'ready' | null;
  clip_type: string | null;
  clip_bytes: number | null;
  transcript_id: string | null;
  spoken_terms: 'US' | 'UK' | null;
}

/** The recordings of a pattern in their order, each with its clip and its newest transcript. */
export async function listRecordings(db: Knex, patternId: string): Promise<PatternRecording[]> {
  const { rows } = await db.raw<{ rows: RecordingRow[] }>(
    `select r.id, pr.number, r.title, r.public_url, r.public_offset_ms, r.duration_ms, r.version, r.spoken_terms,
            o.state as clip_state, o.type as clip_type, o.bytes as clip_bytes,
            (select t.id from transcripts t where t.recording_id = r.id order by t.number desc limit 1) as transcript_id
       from pattern_recordings pr
       join recordings r on r.id = pr.recording_id
       left join objects o on o.id = r.clip_object_id and o.state in ('arriving', 'ready')
      where pr.pattern_id = ? and pr.removed_at is null
      order by pr.order_key, pr.number`,
    [patternId],
  );
  return rows.map((row) => ({
    id: row.id,
    number: row.number,
    title: row.title,
    clip:
      row.clip_state === null
        ? null
        : {
            state: row.clip_state,
            url: row.clip_state === 'ready' ? `/api/recordings/${row.id}/clip` : null,
            type: row.clip_type ?? '',
            bytes: row.clip_bytes ?? 0,
          },
    publicUrl: row.public_url,
    publicOffsetMs: row.public_offset_ms,
    durationMs: row.duration_ms,
    spokenTerms: row.spoken_terms,
    transcriptId: row.transcript_id,
    version: row.version,
  }));
}

/** Where each line was heard, in the order of the recording. What an earlier reading heard is left out. */
export async function listEvidence(db: Knex, patternId: string): Promise<Evidence[]> {
  return db('line_evidence as e')
    .join('lines as l', 'l.id', 'e.line_id')
    .where('l.pattern_id', patternId)
    .whereNull('l.deleted_at')
    .whereRaw('e.hearing_id = any(l.hearings)')
    .orderBy(['e.transcript_id', 'e.first_word', 'e.id'])
    .select<Evidence[]>({
      id: 'e.id',
      lineId: 'e.line_id',
      transcriptId: 'e.transcript_id',
      role: 'e.role',
      firstWord: 'e.first_word',
      lastWord: 'e.last_word',
      startMs: 'e.start_ms',
      endMs: 'e.end_ms',
      words: 'e.words',
    });
}
