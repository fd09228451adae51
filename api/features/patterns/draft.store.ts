import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import type { DraftLine } from '#crochet';
import { toRow } from './rows.store.ts';
import { TABLES, type Row } from './entities.ts';

/** Where a draft comes from. */
export interface SourceOfDraft {
  /** Null for words that a person chose. */
  readonly readingId: string | null;
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

/** What was heard for a line at one time: by a reading, or chosen by a person. */
interface Hearing {
  readonly id: string;
  readonly recordingId: string;
  readonly transcriptId: string;
  /** By a reading, not by a person who chose the words. */
  readonly isRead: boolean;
}

/** A line of the pattern, taken away or not, with what a reading needs to know of it. */
export interface KnownLine extends Row {
  readonly kind: string;
  readonly label: string;
  readonly from: number | null;
  readonly to: number | null;
  readonly text: string;
  /** What it was heard in, as it stands now. */
  readonly heard: readonly Hearing[];
  /** Fields that a person has written. */
  readonly touched: readonly string[];
  /** It was taken away by taking back the step that made it: for a reading it never was. */
  readonly isUnmade: boolean;
}

type Raw = Record<string, unknown> & { heard: Hearing[]; touched: string[]; is_unmade: boolean };

/** Every line a pattern ever had, in order. */
export async function listKnownLines(trx: Knex, patternId: string): Promise<KnownLine[]> {
  const rows = await trx('lines as l')
    .where({ pattern_id: patternId })
    .orderBy(['order_key', 'id'])
    .select<Raw[]>(
      'l.*',
      trx.raw(`coalesce((
        select jsonb_agg(distinct jsonb_build_object('id', e.hearing_id, 'recordingId', t.recording_id, 'transcriptId', t.id, 'isRead', e.reading_id is not null))
          from line_evidence e join transcripts t on t.id = e.transcript_id
         where e.line_id = l.id and e.hearing_id = any(l.hearings)), '[]') as heard`),
      trx.raw('array(select field from line_touched f where f.line_id = l.id) as touched'),
      trx.raw(`l.deleted_at is not null and coalesce((
        select c.undoes_deed_id is not null from changes c
         where c.entity_id = l.id order by c.id desc limit 1), false) as is_unmade`),
    );
  return rows.map((raw) => ({
    ...(toRow(TABLES.line, raw) as Row & Pick<KnownLine, 'kind' | 'label' | 'from' | 'to' | 'text'>),
    heard: raw.heard,
    touched: raw.touched,
    isUnmade: raw.is_unmade,
  }));
}

export interface Heard {
  readonly lineId: string;
  readonly hearingId: string;
  readonly evidence: DraftLine['evidence'];
}

/** A hearing without words in it is none, and gets no id. */
export const newHearing = (evidence: DraftLine['evidence']): string[] => (evidence.length > 0 ? [randomUUID()] : []);

/** Keeps the words that lines were heard in; which of them are in force is said by the lines. */
export async function insertEvidence(trx: Knex, source: SourceOfDraft, heard: readonly Heard[]): Promise<void> {
  const rows = heard.flatMap(({ lineId, hearingId, evidence }) =>
    evidence.map((one) => ({
      line_id: lineId,
      hearing_id: hearingId,
      reading_id: source.readingId,
      transcript_id: source.transcriptId,
      first_word: one.firstWord,
      last_word: one.lastWord,
      start_ms: Math.round(one.startMs),
      end_ms: Math.round(one.endMs),
      role: one.role,
      words: one.words,
    })),
  );
  if (rows.length > 0) await trx.batchInsert('line_evidence', rows, 500);
}
