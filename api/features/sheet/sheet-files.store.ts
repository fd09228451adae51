import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';

export interface FileRow {
  readonly editionId: string;
  /** `A4-US`, `Letter-UK`: paper and terms. */
  readonly variant: string;
  readonly key: string;
  readonly bytes: number;
}

const files = (db: Knex) =>
  db('edition_files as f')
    .join('objects as o', 'o.id', 'f.object_id')
    .where('o.state', 'ready')
    .select<FileRow[]>('f.edition_id as editionId', 'f.variant', 'o.key', 'o.bytes');

export async function listFileRows(db: Knex, editionIds: readonly string[]): Promise<FileRow[]> {
  return files(db)
    .whereIn('f.edition_id', [...editionIds])
    .orderBy('f.variant');
}

export async function findFile(db: Knex, editionId: string, variant: string): Promise<FileRow | undefined> {
  const [found] = await files(db).where({ 'f.edition_id': editionId, 'f.variant': variant });
  return found;
}

/** The studio an edition belongs to; undefined where the edition is gone. */
export async function findStudioOf(db: Knex, editionId: string): Promise<string | undefined> {
  const row = await db('editions as e')
    .join('patterns as p', 'p.id', 'e.pattern_id')
    .where('e.id', editionId)
    .first<{ studio_id: string } | undefined>('p.studio_id');
  return row?.studio_id;
}

/** Writes down that bytes are about to be stored, before they are: the sweep finds them if nothing follows. */
export async function beginObject(
  db: Knex,
  studioId: string,
  bytes: number,
  at: Date,
): Promise<{ id: string; key: string }> {
  const id = randomUUID();
  const object = { id, studio_id: studioId, key: id, kind: 'sheet', state: 'arriving', bytes, type: 'application/pdf' };
  await db('objects').insert({ ...object, created_at: at, touched_at: at });
  return { id, key: id };
}

/** The object is whole and belongs to the edition; one that stood there before it is let go. */
export async function settleFile(
  db: Knex,
  file: { readonly editionId: string; readonly variant: string; readonly objectId: string; readonly at: Date },
): Promise<void> {
  const { editionId, variant, objectId, at } = file;
  await db.transaction(async (trx) => {
    await trx('objects').where({ id: objectId }).update({ state: 'ready', touched_at: at });
    const before = await trx('edition_files')
      .where({ edition_id: editionId, variant })
      .forUpdate()
      .first<{ object_id: string } | undefined>('object_id');
    await trx('edition_files')
      .insert({ edition_id: editionId, variant, object_id: objectId })
      .onConflict(['edition_id', 'variant'])
      .merge();
    if (before) await trx('objects').where({ id: before.object_id }).update({ state: 'doomed', touched_at: at });
  });
}
