import { generateKeyBetween, generateNKeysBetween } from 'fractional-indexing';
import type { Knex } from 'knex';
import { TABLES, type RowEntity } from './entities.ts';

/** Rows that stand in one order: those of a pattern, or the lines of a piece. */
export interface Place {
  readonly entity: RowEntity;
  /** Id of the pattern or the piece they stand in. */
  readonly within: string;
}

interface Keyed {
  id: string;
  order_key: string;
}

// Deleted rows count too: one that comes back by undo must find its place free.
function siblings(db: Knex, { entity, within }: Place) {
  const spec = TABLES[entity];
  return db<Keyed>(spec.table).where({ [spec.orderedWithin === 'pieceId' ? 'piece_id' : 'pattern_id']: within });
}

interface Gap {
  readonly from: string | null;
  readonly to: string | null;
}

async function gapBehind(db: Knex, place: Place, key: string | null, selfId?: string): Promise<Gap> {
  const later = siblings(db, place).orderBy('order_key').select('order_key');
  if (key !== null) void later.where('order_key', '>', key);
  if (selfId !== undefined) void later.whereNot({ id: selfId });
  const next = await later.first<Keyed | undefined>();
  return { from: key, to: next?.order_key ?? null };
}

/** The gap behind `after` (null: before all; undefined: behind all); undefined when it does not stand in this order. */
async function findGap(db: Knex, place: Place, after: string | null | undefined, selfId?: string) {
  if (after === null) return gapBehind(db, place, null, selfId);
  const before = siblings(db, place).orderBy('order_key', 'desc').select('order_key');
  if (after !== undefined) void before.where({ id: after });
  if (selfId !== undefined) void before.whereNot({ id: selfId });
  const row = await before.first<Keyed | undefined>();
  if (!row && after !== undefined) return undefined;
  return gapBehind(db, place, row?.order_key ?? null, selfId);
}

/**
 * The key that puts a row behind `after` (null: first; undefined: last). Only the row that moves is written.
 * @returns undefined when `after` does not stand in this order
 */
export async function placeAfter(
  db: Knex,
  place: Place,
  after: string | null | undefined,
  selfId?: string,
): Promise<string | undefined> {
  const gap = await findGap(db, place, after, selfId);
  return gap && generateKeyBetween(gap.from, gap.to);
}

/** Keys for so many new rows behind a row that stands in this order, as placeAfter. */
export async function placeManyAfter(
  db: Knex,
  place: Place,
  after: string | null | undefined,
  howMany: number,
): Promise<string[]> {
  const gap = await findGap(db, place, after);
  return generateNKeysBetween(gap?.from ?? null, gap?.to ?? null, howMany);
}

/** The key itself while nobody else has it, else the next free one behind it. */
export async function freeKey(db: Knex, place: Place, key: string, selfId: string): Promise<string> {
  const taken = await siblings(db, place)
    .where({ order_key: key })
    .whereNot({ id: selfId })
    .first<{ id: string } | undefined>('id');
  if (!taken) return key;
  const gap = await gapBehind(db, place, key, selfId);
  return generateKeyBetween(gap.from, gap.to);
}
