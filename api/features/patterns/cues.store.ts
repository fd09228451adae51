import type { Knex } from 'knex';
import type { TimedHeardCue } from '#crochet';

/** The captions of a transcript in their order, as heard and as corrected. */
export async function listHeardCues(db: Knex, transcriptId: string): Promise<TimedHeardCue[]> {
  return db('cues')
    .where({ transcript_id: transcriptId })
    .orderBy('ordinal')
    .select<TimedHeardCue[]>({ startMs: 'start_ms', endMs: 'end_ms', heard: 'heard', corrected: 'corrected' });
}

export interface SpokenIn {
  readonly transcriptId: string;
  readonly recordingId: string;
  /** Terms that a person said it is spoken in. */
  readonly spokenTerms: 'US' | 'UK' | null;
}

/** A transcript of a recording that stands in the pattern. */
export async function findSpokenIn(db: Knex, patternId: string, transcriptId: string): Promise<SpokenIn | undefined> {
  return db('transcripts as t')
    .join('recordings as r', 'r.id', 't.recording_id')
    .join('pattern_recordings as pr', 'pr.recording_id', 'r.id')
    .where({ 't.id': transcriptId, 'pr.pattern_id': patternId })
    .whereNull('pr.removed_at')
    .first<SpokenIn | undefined>({ transcriptId: 't.id', recordingId: 'r.id', spokenTerms: 'r.spoken_terms' });
}
