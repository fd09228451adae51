import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import type { DraftLine } from '#crochet';
import { record, writeFields, type Deed } from './deed.service.ts';
import { insertEvidence, newHearing, type KnownLine, type SourceOfDraft } from './draft.store.ts';
import { TABLES, type Fields, type Row } from './entities.ts';
import { insertRows, toRow } from './rows.store.ts';

/** Gives a line its moment in a recording: moves the one that a reading set, or sets one where there is none. */
export async function moveMark(
  trx: Knex.Transaction,
  deed: Deed,
  { recordingId, transcriptId }: SourceOfDraft,
  lineId: string,
  startMs: number,
): Promise<void> {
  const marks = (
    await trx('marks').where({ line_id: lineId }).whereNull('deleted_at').select<Record<string, unknown>[]>('*')
  ).map((raw): Row => toRow(TABLES.mark, raw));
  const here = marks.filter((mark) => mark.recordingId === recordingId);
  const ours = here.find((mark) => mark.madeBy === 'reading');
  if (ours) await writeFields(trx, deed, 'mark', ours, { startMs, endMs: null, transcriptId });
  if (here.length > 0) return;
  const main = !marks.some((mark) => mark.main === true);
  const fields = { lineId, recordingId, startMs, main, madeBy: 'reading', transcriptId };
  const id = randomUUID();
  await insertRows(trx, 'mark', deed.patternId, [{ id, ...fields }]);
  await record(trx, deed, [{ entity: 'mark', entityId: id, before: null, after: fields }]);
}

/**
 * Tells a line what a reading heard for it: its words and its moment, and the fields that are taken of it. What it was
 * heard in before, in the same recording, is let go of; undo brings it back.
 */
export async function hearAgain(
  trx: Knex.Transaction,
  deed: Deed,
  source: SourceOfDraft,
  line: KnownLine,
  heard: { readonly draft: Pick<DraftLine, 'said' | 'evidence' | 'startMs'>; readonly fields: Fields },
): Promise<void> {
  const { draft, fields } = heard;
  const elsewhere = line.heard.filter(({ recordingId }) => recordingId !== source.recordingId);
  const isOurs = elsewhere.length < line.heard.length || line.heard.length === 0;
  const [hearingId] = newHearing(draft.evidence);
  const hearings = [...elsewhere.map(({ id }) => id), ...(hearingId === undefined ? [] : [hearingId])];
  const total = isOurs ? { heardTotal: draft.said } : {};
  await writeFields(trx, deed, 'line', line, { ...fields, ...total, hearings });
  if (hearingId !== undefined) {
    await insertEvidence(trx, source, [{ lineId: line.id, hearingId, evidence: draft.evidence }]);
  }
  await moveMark(trx, deed, source, line.id, Math.round(draft.startMs));
}
