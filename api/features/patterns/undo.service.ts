import type { Knex } from 'knex';
import type { Undone } from '#contract/changes';
import { AppError } from '../../http/problem.ts';
import { lastIntoPiece, listChanges, listDeed, listOwnDeeds, type ChangeRow } from './changes.store.ts';
import { isSame, openPattern, writeFields, type Asking, type Deed } from './deed.service.ts';
import { TABLES, type Fields, type RowEntity } from './entities.ts';
import { freeKey } from './order.ts';
import { canEditPattern } from './patterns.policy.ts';
import { findRow } from './rows.store.ts';
import { undoStack } from './undo-stack.ts';

/** Steps of one row looked through for another hand. */
const LOOK_BACK = 1_000;

const isRow = (entity: string): entity is RowEntity => !['pattern', 'lifecycle', 'recording'].includes(entity);

/** Refuses where another hand was at the row since, or put lines into the piece: their work stands. */
async function refuseWhereChanged(trx: Knex, change: ChangeRow, patternId: string): Promise<void> {
  const later = await listChanges(trx, patternId, { entityId: change.entityId, limit: LOOK_BACK });
  const other =
    later.find(({ id, personId }) => id > change.id && personId !== change.personId) ??
    (change.entity === 'piece' ? await lastIntoPiece(trx, change, patternId) : undefined);
  if (other) {
    const by = other.personName ?? 'a reading';
    throw new AppError('conflict', `${by} has changed this since. Their work stands; nothing was undone.`, {
      entityId: change.entityId,
    });
  }
}

/** The fields that take a change back: for a row that was made, that it is gone again. */
function inverseOf(change: ChangeRow, deed: Deed): Fields {
  return change.before ?? { deletedAt: deed.at };
}

async function takeBack(trx: Knex.Transaction, deed: Deed, change: ChangeRow): Promise<void> {
  const { entity } = change;
  if (entity === 'recording') return;
  const row = await findRow(trx, entity, change.entityId);
  if (!row) throw new AppError('gone');
  await refuseWhereChanged(trx, change, row.patternId);
  const fields = inverseOf(change, deed);
  const within = TABLES[entity].orderedWithin === 'pieceId' ? (fields.pieceId ?? row.pieceId) : row.patternId;
  const moved =
    isRow(entity) && typeof fields.orderKey === 'string' && !isSame(fields.orderKey, row.orderKey)
      ? { orderKey: await freeKey(trx, { entity, within: within as string }, fields.orderKey, row.id) }
      : {};
  await writeFields(trx, deed, entity, row, { ...fields, ...moved });
}

/**
 * Takes back one's own last deed in a pattern, or (redo) one's own last undo. It is a deed like any other.
 * @throws AppError not-found | forbidden | gone | conflict (nothing to undo, or somebody changed the same row since)
 */
export async function undoDeed(db: Knex, asking: Asking, patternId: string, which: 'undo' | 'redo'): Promise<Undone> {
  return db.transaction(async (trx) => {
    const { deed } = await openPattern(trx, asking, patternId, canEditPattern);
    const undoesDeedId = undoStack(await listOwnDeeds(trx, patternId, asking.who.id))[which];
    if (undoesDeedId === null) throw new AppError('conflict', `There is nothing of yours to ${which}.`);
    const changes = (await listDeed(trx, patternId, undoesDeedId)).reverse();
    const taking: Deed = { ...deed, undoes: undoesDeedId };
    for (const change of changes) await takeBack(trx, taking, change);
    const rows = changes.map(({ entity, entityId }) => ({ entity, id: entityId }));
    return { deedId: deed.id, undoesDeedId, rows };
  });
}
