import type { Knex } from 'knex';
import { writeFields, type Deed } from './deed.service.ts';
import type { Fields, Row } from './entities.ts';
import { toRow } from './rows.store.ts';
import { TABLES } from './entities.ts';

async function listMarksOf(trx: Knex, lineId: string, exceptId: string): Promise<Row[]> {
  const rows = await trx('marks')
    .where({ line_id: lineId })
    .whereNull('deleted_at')
    .whereNot({ id: exceptId })
    .select<Record<string, unknown>[]>('*');
  return rows.map((raw) => toRow(TABLES.mark, raw));
}

/**
 * A line has one main mark, whose moment is printed. A mark that becomes it takes its place from the other; one that
 * does not say becomes it where the line has none.
 * @returns whether the mark is the main one of its line
 */
export async function keepOneMain(trx: Knex.Transaction, deed: Deed, mark: Fields): Promise<boolean> {
  if (typeof mark.lineId !== 'string') return mark.main !== false;
  const others = (await listMarksOf(trx, mark.lineId, mark.id as string)).filter((other) => other.main === true);
  if (mark.main === undefined) return others.length === 0;
  if (mark.main === true) {
    for (const other of others) await writeFields(trx, deed, 'mark', other, { main: false });
  }
  return mark.main === true;
}

/** The transcript by whose words a moment in a recording is set now; null where it has none. */
export async function newestTranscriptOf(trx: Knex, recordingId: string): Promise<string | null> {
  const row = await trx('transcripts')
    .where({ recording_id: recordingId })
    .orderBy('number', 'desc')
    .first<{ id: string } | undefined>('id');
  return row?.id ?? null;
}
