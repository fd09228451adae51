import type { Knex } from 'knex';
import { followWords, wordsOf } from '#crochet';
import { listHeardCues } from './cues.store.ts';
import { writeFields, type Deed } from './deed.service.ts';
import type { SourceOfDraft } from './draft.store.ts';
import { TABLES, type Row } from './entities.ts';
import { toRow } from './rows.store.ts';

/** A moment that a person set, and where its words stand in another transcript; null: they are not in it. */
export interface MovedMoment {
  readonly mark: Row;
  readonly startMs: number | null;
  readonly endMs: number | null;
}

const spokenIn = async (trx: Knex, transcriptId: string) =>
  wordsOf(
    (await listHeardCues(trx, transcriptId)).map(({ heard, corrected, ...times }) => ({
      ...times,
      text: corrected ?? heard,
    })),
  );

/** Moments in a recording that were set by the words of another of its transcripts. */
async function listMarksBefore(trx: Knex, patternId: string, source: SourceOfDraft): Promise<Row[]> {
  const rows = await trx('marks')
    .where({ pattern_id: patternId, recording_id: source.recordingId })
    .whereNull('deleted_at')
    .whereNot({ transcript_id: source.transcriptId })
    .orderBy('start_ms')
    .select<Record<string, unknown>[]>('*');
  return rows.map((raw) => toRow(TABLES.mark, raw));
}

/** Where the moments of an earlier transcript go in the one that was read, in order of time. */
export async function findMovedMoments(trx: Knex, patternId: string, source: SourceOfDraft): Promise<MovedMoment[]> {
  const marks = await listMarksBefore(trx, patternId, source);
  if (marks.length === 0) return [];
  const after = await spokenIn(trx, source.transcriptId);
  const follow = new Map<unknown, (ms: number) => number | null>();
  for (const transcriptId of new Set(marks.map((mark) => mark.transcriptId as string))) {
    follow.set(transcriptId, followWords(await spokenIn(trx, transcriptId), after));
  }
  return marks.map((mark) => {
    const go = follow.get(mark.transcriptId)!;
    const startMs = go(mark.startMs as number);
    const endMs = startMs === null || mark.endMs === null ? null : go(mark.endMs as number);
    return { mark, startMs, endMs: endMs !== null && startMs !== null ? Math.max(startMs, endMs) : endMs };
  });
}

/** Lets moments go where their words went; what a reading just set by the new words has left the list already. */
export async function followMoments(
  trx: Knex.Transaction,
  deed: Deed,
  source: SourceOfDraft,
  isIn: (lineId: unknown) => boolean,
): Promise<void> {
  for (const { mark, startMs, endMs } of await findMovedMoments(trx, deed.patternId, source)) {
    if (startMs === null || !isIn(mark.lineId)) continue;
    await writeFields(trx, deed, 'mark', mark, { startMs, endMs, transcriptId: source.transcriptId });
  }
}
