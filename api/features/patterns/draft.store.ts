import type { Knex } from 'knex';
import type { DraftLine } from '#crochet';
import { toRow } from './rows.store.ts';
import { TABLES, type Row } from './entities.ts';

/** Where a draft comes from. */
export interface SourceOfDraft {
  readonly readingId: string;
  readonly transcriptId: string;
  readonly recordingId: string;
}

/** @returns undefined where there is no such reading */
export async function findSource(trx: Knex, readingId: string): Promise<SourceOfDraft | undefined> {
  return trx('readings as r')
    .join('transcripts as t', 't.id', 'r.transcript_id')
    .where('r.id', readingId)
    .first<SourceOfDraft | undefined>('r.id as readingId', 't.id as transcriptId', 't.recording_id as recordingId');
}

/** A line of the pattern, taken away or not, with what a reading needs to know of it. */
export interface KnownLine extends Row {
  /** Recordings it was heard in. */
  readonly heardIn: readonly string[];
  /** Fields that a person has written. */
  readonly touched: readonly string[];
}

/** Every line a pattern ever had, in order. */
export async function listKnownLines(trx: Knex, patternId: string): Promise<KnownLine[]> {
  const rows = await trx('lines as l')
    .where({ pattern_id: patternId })
    .orderBy(['order_key', 'id'])
    .select<(Record<string, unknown> & { heard_in: string[]; touched: string[] })[]>(
      'l.*',
      trx.raw(`array(select distinct t.recording_id::text from line_evidence e join transcripts t on t.id = e.transcript_id
                      where e.line_id = l.id) as heard_in`),
      trx.raw('array(select field from line_touched f where f.line_id = l.id) as touched'),
    );
  return rows.map((raw) => ({ ...toRow(TABLES.line, raw), heardIn: raw.heard_in, touched: raw.touched }));
}

type Heard = readonly { readonly lineId: string; readonly evidence: DraftLine['evidence'] }[];

export async function insertEvidence(trx: Knex, source: SourceOfDraft, heard: Heard): Promise<void> {
  const rows = heard.flatMap(({ lineId, evidence }) =>
    evidence.map((one) => ({
      line_id: lineId,
      reading_id: source.readingId,
      transcript_id: source.transcriptId,
      first_word: one.firstWord,
      last_word: one.lastWord,
      start_ms: Math.round(one.startMs),
      end_ms: Math.round(one.endMs),
      role: one.role,
    })),
  );
  if (rows.length > 0) await trx.batchInsert('line_evidence', rows, 500);
}

/** Lets go of what an earlier reading of the same recording heard for these lines. */
export async function forgetEvidence(trx: Knex, recordingId: string, lineIds: readonly string[]): Promise<void> {
  await trx('line_evidence')
    .whereIn('line_id', lineIds)
    .whereIn('transcript_id', trx('transcripts').where({ recording_id: recordingId }).select('id'))
    .delete();
}
