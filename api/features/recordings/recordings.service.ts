import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import type { Recording, RecordingCreate, RecordingEdit, RecordingList } from '#contract/recordings';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import { openPattern, record, type Asking } from '../patterns/deed.service.ts';
import { findSeenPattern } from '../patterns/document.service.ts';
import { readRoom } from './objects.store.ts';
import { canKeepRecordings } from './recordings.policy.ts';
import {
  findPlaced,
  findRecording,
  insertPlaced,
  keyBehind,
  listPlaced,
  updatePlace,
  updateRecording,
  type PlacedRecordingRow,
} from './recordings.store.ts';
import { describeRecordings } from './describe-recordings.ts';

interface At {
  readonly patternId: string;
  readonly id: string;
  readonly version: number;
}

/**
 * The recordings of a pattern in their order, each with how far its clip and its transcript have come, and the room
 * the studio has.
 * @throws AppError not-found, also where the pattern may not be seen
 */
export async function listRecordings(db: Knex, who: Person, patternId: string): Promise<RecordingList> {
  const pattern = await findSeenPattern(db, who, patternId);
  return {
    recordings: await describeRecordings(db, await listPlaced(db, patternId)),
    mayEdit: canKeepRecordings(who, pattern) && pattern.deletedAt === null,
    storage: await readRoom(db, pattern.studioId),
  };
}

async function describeOne(db: Knex, patternId: string, id: string): Promise<Recording> {
  const row = await findPlaced(db, patternId, id);
  if (!row) throw new AppError('not-found');
  const [described] = await describeRecordings(db, [row]);
  return described!;
}

/**
 * Adds a recording to a pattern, last. With an `id` of the caller's, sending it twice makes one.
 * @throws AppError not-found | forbidden | gone | conflict (the id is another recording's)
 */
export async function addRecording(
  db: Knex,
  asking: Asking,
  patternId: string,
  asked: RecordingCreate,
): Promise<Recording> {
  return db.transaction(async (trx) => {
    const { pattern, deed } = await openPattern(trx, asking, patternId, canKeepRecordings);
    const id = asked.id ?? randomUUID();
    const present = asked.id === undefined ? undefined : await findRecording(trx, id);
    if (present) {
      const here = await findPlaced(trx, patternId, id);
      if (!here || here.removedAt) throw new AppError('conflict');
      return describeOne(trx, patternId, id);
    }
    const fields = {
      title: asked.title,
      publicUrl: asked.publicUrl ?? null,
      publicOffsetMs: asked.publicOffsetMs ?? 0,
    };
    const orderKey = (await keyBehind(trx, patternId, undefined, id))!;
    await insertPlaced(trx, patternId, { id, studioId: pattern.studioId, orderKey, ...fields });
    await record(trx, deed, [{ entity: 'recording', entityId: id, before: null, after: fields }]);
    return describeOne(trx, patternId, id);
  });
}

async function openPlaced(trx: Knex.Transaction, at: At, { removed = false } = {}): Promise<PlacedRecordingRow> {
  const row = await findPlaced(trx, at.patternId, at.id);
  if (!row || (row.removedAt !== null) !== removed) throw new AppError('not-found');
  if (row.version !== at.version) {
    throw new AppError('stale-version', 'Somebody saved this after you read it. Nothing was overwritten.', {
      present: await describeOne(trx, at.patternId, at.id),
    });
  }
  return row;
}

/**
 * Saves a recording's name, its address elsewhere or its place, if nobody saved it since `version`.
 * @throws AppError not-found | forbidden | gone | invalid | stale-version (with the present row)
 */
export async function editRecording(db: Knex, asking: Asking, at: At, asked: RecordingEdit): Promise<Recording> {
  return db.transaction(async (trx) => {
    const { deed } = await openPattern(trx, asking, at.patternId, canKeepRecordings);
    const row = await openPlaced(trx, at);
    const { after, ...fields } = asked;
    const orderKey = after === undefined ? undefined : await keyBehind(trx, at.patternId, after, at.id);
    if (after !== undefined && orderKey === undefined) {
      throw new AppError('invalid', '', {
        errors: [{ pointer: '#/after', detail: 'What it shall follow is not a recording of this pattern.' }],
      });
    }
    if (!(await updateRecording(trx, at, fields))) throw new AppError('stale-version');
    if (orderKey !== undefined) await updatePlace(trx, at, { orderKey });
    const changed = Object.keys(fields) as (keyof typeof fields)[];
    const before = Object.fromEntries(changed.map((field) => [field, row[field]]));
    await record(trx, deed, [
      {
        entity: 'recording',
        entityId: at.id,
        before: { ...before, ...(orderKey !== undefined && { orderKey: row.orderKey }) },
        after: { ...fields, ...(orderKey !== undefined && { orderKey }) },
      },
    ]);
    return describeOne(trx, at.patternId, at.id);
  });
}

async function setRemoved(db: Knex, asking: Asking, at: At, removedAt: Date | null): Promise<PlacedRecordingRow> {
  return db.transaction(async (trx) => {
    const { deed } = await openPattern(trx, asking, at.patternId, canKeepRecordings);
    const row = await openPlaced(trx, at, { removed: removedAt === null });
    if (!(await updateRecording(trx, at, {}))) throw new AppError('stale-version');
    await updatePlace(trx, at, { removedAt });
    await record(trx, deed, [
      { entity: 'recording', entityId: at.id, before: { removedAt: row.removedAt }, after: { removedAt } },
    ]);
    return row;
  });
}

/**
 * Takes a recording out of a pattern. Its number is never given to another; clip, transcript and marks stay, so that
 * it can be put back and editions that are out still show it.
 * @throws AppError not-found | forbidden | gone | stale-version
 */
export async function removeRecording(db: Knex, asking: Asking, at: At): Promise<void> {
  await setRemoved(db, asking, at, asking.now);
}

/**
 * Puts a recording back that was taken out, under its number and at its place.
 * @throws AppError not-found | forbidden | gone | stale-version
 */
export async function putBackRecording(db: Knex, asking: Asking, at: At): Promise<Recording> {
  await setRemoved(db, asking, at, null);
  return describeOne(db, at.patternId, at.id);
}
