import type { Knex } from 'knex';
import type { Draft } from '#crochet';

export interface ReadingRow {
  readonly id: string;
  readonly transcriptId: string;
  readonly draft: Draft;
  /** Lines of a pattern come from it. */
  readonly taken: boolean;
}

const COLUMNS = { id: 'g.id', transcriptId: 'g.transcript_id', draft: 'g.draft' } as const;
const TAKEN = `exists (
  select 1 from line_evidence e join lines l on l.id = e.line_id join pieces p on p.id = l.piece_id
   where e.reading_id = g.id and e.hearing_id = any(l.hearings) and l.deleted_at is null and p.deleted_at is null
) as taken`;

/** The newest reading of each of these transcripts. */
export async function listNewestReadings(db: Knex, transcriptIds: readonly string[]): Promise<ReadingRow[]> {
  return db('readings as g')
    .distinctOn('g.transcript_id')
    .whereIn('g.transcript_id', transcriptIds)
    .orderBy(['g.transcript_id', { column: 'g.created_at', order: 'desc' }])
    .select<ReadingRow[]>(COLUMNS, db.raw(TAKEN));
}

/** A reading, with the recording whose transcript it read. */
export async function findReading(
  db: Knex,
  id: string,
): Promise<(ReadingRow & { readonly recordingId: string }) | undefined> {
  const [row] = await db('readings as g')
    .join('transcripts as t', 't.id', 'g.transcript_id')
    .where('g.id', id)
    .select<(ReadingRow & { recordingId: string })[]>({ ...COLUMNS, recordingId: 't.recording_id' }, db.raw(TAKEN));
  return row;
}

export async function insertReading(
  trx: Knex.Transaction,
  row: { readonly id: string; readonly transcriptId: string; readonly engineVersion: string; readonly draft: Draft },
  at: Date,
): Promise<void> {
  await trx('readings').insert({
    id: row.id,
    transcript_id: row.transcriptId,
    engine_version: row.engineVersion,
    terms: row.draft.terms,
    terms_reason: row.draft.termsReason,
    draft: JSON.stringify(row.draft),
    created_at: at,
  });
}

/** Patterns in which a recording stands and that hold no line. */
export async function listEmptyPatternsOf(
  db: Knex,
  recordingId: string,
): Promise<{ readonly id: string; readonly state: string }[]> {
  const { rows } = await db.raw<{ rows: { id: string; state: string }[] }>(
    `select p.id, p.state from pattern_recordings pr join patterns p on p.id = pr.pattern_id
      where pr.recording_id = ? and pr.removed_at is null and p.deleted_at is null
        and not exists (select 1 from lines l where l.pattern_id = p.id and l.deleted_at is null)
      order by p.id`,
    [recordingId],
  );
  return rows;
}
