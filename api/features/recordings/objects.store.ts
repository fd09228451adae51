import type { Knex } from 'knex';

/** What a studio may store and what it stores, in bytes; what is on its way counts as if it were here. */
export interface Room {
  readonly quotaBytes: number;
  readonly usedBytes: number;
}

/**
 * The room a studio has.
 * @param lock until the transaction ends nobody else takes room
 */
export async function readRoom(db: Knex, studioId: string, { lock = false } = {}): Promise<Room> {
  const studio = db('studios').where({ id: studioId });
  if (lock) void studio.forUpdate();
  const row = await studio.first<{ quota_bytes: number } | undefined>('quota_bytes');
  const used = await db('objects')
    .where({ studio_id: studioId })
    .whereNot({ state: 'doomed' })
    .sum<{ sum: string | number | null }[]>({ sum: 'bytes' });
  return { quotaBytes: row?.quota_bytes ?? 0, usedBytes: Number(used[0]?.sum ?? 0) };
}

/** Marks an object for removal: it no longer counts, and the next sweep takes it away. */
export async function doomObject(db: Knex, id: string, at: Date): Promise<void> {
  await db('objects').where({ id }).update({ state: 'doomed', touched_at: at });
}
