import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import type { PatternHead } from '#contract/patterns';
import type { WrittenPattern } from '#contract/written';
import { AppError } from '../../http/problem.ts';
import { record, type Asking, type Deed } from './deed.service.ts';
import type { Fields, RowEntity } from './entities.ts';
import { newShortIds } from './ids.ts';
import { insertLogged } from './insert-logged.ts';
import { placeManyAfter } from './order.ts';
import { canManagePatterns, canSeePattern } from './patterns.policy.ts';
import { insertWithCode, toHead } from './patterns.service.ts';
import { findPattern, findStudio } from './patterns.store.ts';

/** Rows that stand in one order, in the order in which they are given. */
async function insertInOrder(
  trx: Knex.Transaction,
  deed: Deed,
  place: { readonly entity: RowEntity; readonly within: string },
  rows: readonly Fields[],
): Promise<string[]> {
  const keys = await placeManyAfter(trx, place, undefined, rows.length);
  const placed = rows.map((row, i) => ({ id: randomUUID(), ...row, orderKey: keys[i] }));
  if (placed.length > 0) await insertLogged(trx, deed, place.entity, placed);
  return placed.map(({ id }) => id);
}

async function insertAll(trx: Knex.Transaction, deed: Deed, asked: WrittenPattern): Promise<void> {
  const within = deed.patternId;
  const pieces = asked.pieces.map(({ name, make, worked }) => ({ name, make, worked }));
  const pieceIds = await insertInOrder(trx, deed, { entity: 'piece', within }, pieces);
  const shortIds = newShortIds(
    new Set(),
    asked.pieces.reduce((sum, piece) => sum + piece.lines.length, 0),
  );
  for (const [i, piece] of asked.pieces.entries()) {
    const pieceId = pieceIds[i]!;
    const lines = piece.lines.map((line) => ({ ...line, pieceId, shortId: shortIds.pop() }));
    await insertInOrder(trx, deed, { entity: 'line', within: pieceId }, lines);
  }
  const materials = asked.materials.map((material) => ({ ...material, details: {} }));
  await insertInOrder(trx, deed, { entity: 'material', within }, materials);
  await insertInOrder(
    trx,
    deed,
    { entity: 'note', within },
    asked.notes.map((text) => ({ text })),
  );
  await insertInOrder(trx, deed, { entity: 'special-stitch', within }, asked.specialStitches);
}

/**
 * Makes a pattern of a written one. Making it and filling it are two steps: undo empties it again, and the pattern
 * itself goes by the bin, as any other. Sent twice under one id it is made once.
 * @throws AppError not-found (no such studio, or not one of the caller's) | forbidden | conflict (the id is taken)
 */
export async function takeWrittenPattern(db: Knex, asking: Asking, asked: WrittenPattern): Promise<PatternHead> {
  const { who, now } = asking;
  const studio = await findStudio(db, asked.studioId);
  if (!studio || !canSeePattern(who, asked)) throw new AppError('not-found');
  if (!canManagePatterns(who, asked)) throw new AppError('forbidden');
  return db.transaction(async (trx) => {
    // Two that were sent at once: the second waits for the first, and finds what it made.
    await trx.raw('select pg_advisory_xact_lock(hashtextextended(?, 0))', [asked.id]);
    const present = await findPattern(trx, asked.id);
    if (present && present.studioId !== asked.studioId) throw new AppError('conflict');
    if (!present) {
      const { id, studioId, title, terms, sizes } = asked;
      await insertWithCode(trx, { id, studioId, title, terms, sizes, details: {} }, { personId: who.id, at: now });
      const made: Deed = { id: randomUUID(), patternId: id, personId: who.id, at: now };
      await record(trx, made, [{ entity: 'lifecycle', entityId: id, before: null, after: { title, terms, sizes } }]);
      await insertAll(trx, { ...made, id: asking.deedId ?? randomUUID() }, asked);
    }
    return toHead((await findPattern(trx, asked.id))!);
  });
}
