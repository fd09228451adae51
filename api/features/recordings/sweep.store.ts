import type { Knex } from 'knex';

export interface SweptObject {
  readonly id: string;
  readonly key: string;
}

/** Uploads that nobody has gone on with since `before`; each one's object, and the store's own id of it. */
export async function listAbandoned(db: Knex, before: Date): Promise<{ id: string; objectId: string }[]> {
  return db('uploads')
    .where({ state: 'arriving' })
    .where('touched_at', '<', before)
    .select<{ id: string; objectId: string }[]>({ id: 'id', objectId: 'object_id' });
}

/** Uploads that were said to be whole and that no job has finished. */
export async function listUnfinished(db: Knex, before: Date): Promise<string[]> {
  const rows = await db('uploads')
    .where({ state: 'completing' })
    .where('touched_at', '<', before)
    .select<{ id: string }[]>('id');
  return rows.map(({ id }) => id);
}

/**
 * Dooms objects that nothing refers to any more, where that has been so since `before`: clips of no recording, sheets
 * of no edition, and what was to arrive for no upload.
 */
export async function doomUnowned(db: Knex, before: Date, now: Date): Promise<number> {
  const { rowCount } = await db.raw<{ rowCount: number }>(
    `update objects o set state = 'doomed', touched_at = :now
      where o.touched_at < :before and o.state in ('arriving', 'ready')
        and o.kind in ('clip', 'rendition', 'poster', 'sheet')
        and not exists (select 1 from recordings r
                         where o.id in (r.clip_object_id, r.rendition_object_id, r.poster_object_id))
        and not exists (select 1 from edition_files f where f.object_id = o.id)
        and not exists (select 1 from uploads u where u.object_id = o.id and u.state in ('arriving', 'completing'))`,
    { now, before },
  );
  return rowCount;
}

export async function listDoomed(db: Knex): Promise<SweptObject[]> {
  return db('objects').where({ state: 'doomed' }).orderBy('id').select<SweptObject[]>('id', 'key');
}

export async function findDoomed(db: Knex, id: string): Promise<SweptObject | undefined> {
  return db('objects').where({ id, state: 'doomed' }).first<SweptObject | undefined>('id', 'key');
}

/** The store's own ids of uploads in parts that ended in this object. */
export async function listStorageIds(db: Knex, objectId: string): Promise<string[]> {
  const rows = await db<{ object_id: string; s3_upload_id: string }>('uploads')
    .where({ object_id: objectId })
    .select('s3_upload_id');
  return rows.map((row) => row.s3_upload_id);
}

/**
 * Forgets an object that is out of storage. While a refusal is still to be told, its row stays, with nothing in it.
 * @param untold refusals newer than this may not have been read yet
 */
export async function forgetObject(db: Knex, id: string, untold: Date): Promise<void> {
  const told = await db('uploads')
    .where({ object_id: id, state: 'refused' })
    .where('touched_at', '>=', untold)
    .first<{ id: string } | undefined>('id');
  if (told) await db('objects').where({ id }).update({ bytes: 0 });
  else await db('objects').where({ id }).delete();
}

/** Which of these names of objects have a row. */
export async function listKnownKeys(db: Knex, keys: readonly string[]): Promise<Set<string>> {
  const rows = await db('objects').whereIn('key', keys).select<{ key: string }[]>('key');
  return new Set(rows.map(({ key }) => key));
}

/** The store's ids of uploads that may still go on. */
export async function listLiveStorageIds(db: Knex): Promise<Set<string>> {
  const rows = await db<{ s3_upload_id: string; state: string }>('uploads')
    .whereIn('state', ['arriving', 'completing'])
    .select('s3_upload_id');
  return new Set(rows.map((row) => row.s3_upload_id));
}
