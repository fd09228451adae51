import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import type { DraftLine } from '#crochet';
import { record, writeFields, type Deed } from './deed.service.ts';
import { forgetEvidence, insertEvidence, type KnownLine, type SourceOfDraft } from './draft.store.ts';
import { TABLES, type Fields, type Row } from './entities.ts';
import { insertRows, toRow } from './rows.store.ts';
import { placeWritten } from './written-total.ts';

/**
 * What a reading may say anew of a line: from the recording it was drafted from, all that no person has written; of a
 * line that was typed, only what was said; from another recording nothing, that is only another moment.
 */
function fieldsToHear(line: KnownLine, draft: DraftLine, recordingId: string): Fields {
  const isDrafted = line.heardIn.includes(recordingId);
  if (!isDrafted && line.heardIn.length > 0) return {};
  const said = { said: draft.said, heardTotal: draft.said };
  const heard: Fields = isDrafted ? { ...said, label: draft.label, ...placeWritten({ text: draft.text }, line) } : said;
  return Object.fromEntries(Object.entries(heard).filter(([field]) => !line.touched.includes(field)));
}

async function moveMark(trx: Knex.Transaction, deed: Deed, source: SourceOfDraft, line: KnownLine, startMs: number) {
  const marks = (
    await trx('marks').where({ line_id: line.id }).whereNull('deleted_at').select<Record<string, unknown>[]>('*')
  ).map((raw): Row => toRow(TABLES.mark, raw));
  const here = marks.filter((mark) => mark.recordingId === source.recordingId);
  const ours = here.find((mark) => mark.madeBy === 'reading');
  if (ours) await writeFields(trx, deed, 'mark', ours, { startMs, endMs: null });
  if (here.length > 0) return;
  const main = !marks.some((mark) => mark.main === true);
  const fields = { lineId: line.id, recordingId: source.recordingId, startMs, main, madeBy: 'reading' };
  const id = randomUUID();
  await insertRows(trx, 'mark', deed.patternId, [{ id, ...fields }]);
  await record(trx, deed, [{ entity: 'mark', entityId: id, before: null, after: fields }]);
}

/** Tells a line what a reading heard for it: its words, its moment, and what no person has written by hand. */
export async function hearAgain(
  trx: Knex.Transaction,
  deed: Deed,
  source: SourceOfDraft,
  line: KnownLine,
  draft: DraftLine,
): Promise<void> {
  await writeFields(trx, deed, 'line', line, fieldsToHear(line, draft, source.recordingId));
  await forgetEvidence(trx, source.recordingId, [line.id]);
  await insertEvidence(trx, source, [{ lineId: line.id, evidence: draft.evidence }]);
  await moveMark(trx, deed, source, line, Math.round(draft.startMs));
}
