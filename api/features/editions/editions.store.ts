import type { Knex } from 'knex';
import type { EditionCaption, EditionDocument, Erratum } from '#crochet';

export interface EditionRow {
  readonly id: string;
  readonly patternId: string;
  readonly number: number;
  readonly document: EditionDocument;
  readonly publishedAt: Date;
  readonly publishedBy: string | null;
  readonly withdrawnAt: Date | null;
  readonly withdrawnReason: string | null;
}

const COLUMNS = [
  'e.id',
  'e.pattern_id as patternId',
  'e.number',
  'e.document',
  'e.published_at as publishedAt',
  'who.name as publishedBy',
  'e.withdrawn_at as withdrawnAt',
  'e.withdrawn_reason as withdrawnReason',
];

const editions = (db: Knex) => db('editions as e').leftJoin('people as who', 'who.id', 'e.published_by');

/** Every edition of a pattern, newest first. */
export async function listEditions(db: Knex, patternId: string): Promise<EditionRow[]> {
  return editions(db).where('e.pattern_id', patternId).orderBy('e.number', 'desc').select<EditionRow[]>(COLUMNS);
}

export async function findEditionById(db: Knex, id: string): Promise<EditionRow | undefined> {
  return editions(db).where('e.id', id).first<EditionRow | undefined>(COLUMNS);
}

/** One edition by its number, or the newest that is not withdrawn; where all are withdrawn, the newest. */
export async function findEdition(db: Knex, patternId: string, number: number | null): Promise<EditionRow | undefined> {
  const found = editions(db).where('e.pattern_id', patternId);
  if (number !== null) return found.where('e.number', number).first<EditionRow | undefined>(COLUMNS);
  return found.orderByRaw('(e.withdrawn_at is null) desc, e.number desc').first<EditionRow | undefined>(COLUMNS);
}

/** What decides about a printed address. */
export interface CodeRow {
  readonly patternId: string;
  readonly studioId: string;
  readonly visibility: 'private' | 'unlisted' | 'listed';
  readonly paper: 'A4' | 'Letter';
}

/** The pattern a code stands for; a pattern in the bin has no page. */
export async function findByCode(db: Knex, code: string): Promise<CodeRow | undefined> {
  return db('patterns as p')
    .join('studios as s', 's.id', 'p.studio_id')
    .where('p.code', code)
    .whereNull('p.deleted_at')
    .first<CodeRow | undefined>('p.id as patternId', 'p.studio_id as studioId', 'p.visibility', 's.paper');
}

export async function insertEdition(
  trx: Knex.Transaction,
  row: { id: string; patternId: string; number: number; document: EditionDocument; at: Date; personId: string },
): Promise<void> {
  await trx('editions').insert({
    id: row.id,
    pattern_id: row.patternId,
    number: row.number,
    schema_version: row.document.schemaVersion,
    engine_version: row.document.engineVersion,
    document: JSON.stringify(row.document),
    published_at: row.at,
    published_by: row.personId,
  });
}

export async function insertErrata(
  trx: Knex.Transaction,
  editionId: string,
  errata: readonly Erratum[],
  lineIds: ReadonlyMap<string, string>,
): Promise<void> {
  const rows = errata.map(({ shortId, weight, was, now, why }, i) => ({
    edition_id: editionId,
    ordinal: i + 1,
    line_id: shortId === null ? null : (lineIds.get(shortId) ?? null),
    weight,
    was,
    now,
    why,
  }));
  if (rows.length > 0) await trx.batchInsert('errata', rows, 500);
}

/** @returns false where there is no such edition */
export async function setWithdrawn(
  db: Knex,
  at: { readonly patternId: string; readonly number: number },
  withdrawn: { readonly at: Date; readonly reason: string } | null,
): Promise<boolean> {
  const touched = await db('editions')
    .where({ pattern_id: at.patternId, number: at.number })
    .update({ withdrawn_at: withdrawn?.at ?? null, withdrawn_reason: withdrawn?.reason ?? null });
  return touched > 0;
}

export interface Around {
  readonly studioName: string;
  readonly foot: string;
  readonly paper: 'A4' | 'Letter';
  readonly creator: string | null;
}

/** Who stands behind a pattern. */
export async function findAround(db: Knex, patternId: string): Promise<Around | undefined> {
  return db('patterns as p')
    .join('studios as s', 's.id', 'p.studio_id')
    .leftJoin('people as who', 'who.id', 'p.created_by')
    .where('p.id', patternId)
    .first<Around | undefined>('s.name as studioName', 's.foot', 's.paper', 'who.name as creator');
}

/** Captions of a pattern's recordings from the newest transcript of each, corrected where somebody did. */
export async function listCaptions(db: Knex, patternId: string): Promise<EditionCaption[]> {
  const { rows } = await db.raw<{ rows: EditionCaption[] }>(
    `select pr.number as "recordingNumber", c.start_ms as "startMs", c.end_ms as "endMs",
            coalesce(c.corrected, c.heard) as text
       from pattern_recordings pr
       join lateral (select t.id from transcripts t where t.recording_id = pr.recording_id
                      order by t.number desc limit 1) newest on true
       join cues c on c.transcript_id = newest.id
      where pr.pattern_id = ? and pr.removed_at is null
      order by pr.number, c.ordinal`,
    [patternId],
  );
  return rows;
}

/** The recording that carries a number in a pattern, also where it was taken out of the pattern since. */
export async function findRecordingId(db: Knex, patternId: string, number: number): Promise<string | undefined> {
  const row = await db('pattern_recordings')
    .where({ pattern_id: patternId, number })
    .first<{ recording_id: string } | undefined>('recording_id');
  return row?.recording_id;
}
