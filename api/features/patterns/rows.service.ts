import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { AppError } from '../../http/problem.ts';
import { ANSWERS } from './answers.ts';
import { lastChangeTo } from './changes.store.ts';
import { checkRemoval, fitCaution } from './cautions.service.ts';
import { openPattern, record, writeFields, type Asking, type Deed } from './deed.service.ts';
import { TABLES, type Fields, type Row, type RowEntity } from './entities.ts';
import { keepOneMain, newestTranscriptOf } from './marks.ts';
import { placeAfter } from './order.ts';
import { canEditPattern } from './patterns.policy.ts';
import { checkReferences, refuseField } from './row-checks.ts';
import { findRow, insertRows, takenShortIds, touchFields } from './rows.store.ts';
import { newShortIds } from './ids.ts';
import { placeWritten } from './written-total.ts';

/** What a new row is where its body does not say. */
const DEFAULTS: Readonly<Record<RowEntity, Fields>> = {
  piece: { make: 1, worked: 'spiral', startsOnLineId: null },
  line: {
    label: '',
    from: null,
    to: null,
    text: '',
    note: '',
    written: null,
    said: null,
    heardTotal: null,
    filmed: true,
    putAsideReason: null,
    spokenSlip: null,
  },
  mark: { lineId: null, endMs: null, title: null, madeBy: 'person' },
  material: { details: {} },
  caution: {},
  note: {},
  'special-stitch': { abbreviation: '' },
  'left-check': {},
};

const withinOf = (entity: RowEntity, patternId: string, pieceId: unknown) =>
  TABLES[entity].orderedWithin === 'pieceId' ? (pieceId as string) : patternId;

/**
 * Fields that are worked out from what was asked for: the place in the order, and where a written total lives.
 * @throws AppError invalid
 */
async function fit(
  trx: Knex.Transaction,
  entity: RowEntity,
  patternId: string,
  asked: Fields,
  row?: Row,
): Promise<Fields> {
  const { after, ...fields } = asked;
  await checkReferences(trx, entity, patternId, fields, row);
  if (entity === 'caution') await fitCaution(trx, patternId, fields, row);
  const placed = entity === 'line' ? placeWritten(fields, row) : fields;
  const moves = after !== undefined || !row || ('pieceId' in fields && fields.pieceId !== row.pieceId);
  if (TABLES[entity].orderedWithin === null || !moves) return placed;
  const within = withinOf(entity, patternId, fields.pieceId ?? row?.pieceId);
  const orderKey = await placeAfter(trx, { entity, within }, after as string | null | undefined, row?.id);
  if (orderKey === undefined) refuseField('after', 'What it shall follow does not stand in the same order.');
  return { ...placed, orderKey };
}

async function insertLogged(trx: Knex.Transaction, deed: Deed, entity: RowEntity, fields: Fields): Promise<Row> {
  const [row] = await insertRows(trx, entity, deed.patternId, [fields]);
  const { id, ...after } = fields;
  await record(trx, deed, [{ entity, entityId: id as string, before: null, after }]);
  return row!;
}

/** A mark is the main one or not, and knows by whose words it was set. */
async function forMark(trx: Knex.Transaction, deed: Deed, mark: Fields): Promise<Fields> {
  const transcriptId = await newestTranscriptOf(trx, mark.recordingId as string);
  return { main: await keepOneMain(trx, deed, mark), transcriptId };
}

/**
 * Makes a row in a pattern. With an `id` of the caller's, sending it twice makes one.
 * @returns the row, and whether it was there already
 * @throws AppError not-found | forbidden | gone | invalid | conflict
 */
export async function createRow(
  db: Knex,
  asking: Asking,
  patternId: string,
  entity: RowEntity,
  asked: Fields,
): Promise<{ row: Row; deedId: string; isNew: boolean }> {
  return db.transaction(async (trx) => {
    const { deed } = await openPattern(trx, asking, patternId, canEditPattern);
    const id = (asked.id as string | undefined) ?? randomUUID();
    const present = asked.id === undefined ? undefined : await findRow(trx, entity, id);
    if (present && (present.patternId !== patternId || present.deletedAt)) throw new AppError('conflict');
    if (present) return { row: present, deedId: deed.id, isNew: false };

    const fields = await fit(trx, entity, patternId, { ...DEFAULTS[entity], ...asked });
    const [shortId] = entity === 'line' ? newShortIds(await takenShortIds(trx, patternId), 1) : [];
    const full = { ...fields, id, ...(shortId !== undefined && { shortId }) };
    const made = entity === 'mark' ? { ...full, ...(await forMark(trx, deed, full)) } : full;
    return { row: await insertLogged(trx, deed, entity, made), deedId: deed.id, isNew: true };
  });
}

/** @throws AppError not-found, for a row that is not there as for one that may not be seen */
async function openRow(trx: Knex.Transaction, asking: Asking, entity: RowEntity, id: string, version: number) {
  const found = await findRow(trx, entity, id);
  if (!found) throw new AppError('not-found');
  const { deed } = await openPattern(trx, asking, found.patternId, canEditPattern);
  // Read again behind the lock: what was read before it may have been saved over.
  const row = await findRow(trx, entity, id);
  if (!row || row.deletedAt) throw new AppError('not-found');
  if (row.version !== version) throw await staleVersion(trx, row, ANSWERS[entity].parse(row));
  return { row, deed };
}

/** The refusal of a save that would have overwritten another: with the present row, and who saved it when. */
export async function staleVersion(trx: Knex, row: Row, present: unknown): Promise<AppError> {
  const last = await lastChangeTo(trx, row.patternId, row.id);
  return new AppError('stale-version', 'Somebody saved this after you read it. Nothing was overwritten.', {
    present,
    savedBy: last?.personName ?? null,
    savedAt: last?.at.toISOString() ?? null,
  });
}

/** A moment that a person moves is theirs from then on: a reading moves it only with its words. */
async function byHand(trx: Knex, entity: RowEntity, fields: Fields, row: Row): Promise<Fields> {
  if (entity !== 'mark' || !('startMs' in fields || 'endMs' in fields)) return {};
  const recordingId = (fields.recordingId ?? row.recordingId) as string;
  return { madeBy: 'person', transcriptId: await newestTranscriptOf(trx, recordingId) };
}

/**
 * Saves a row if nobody saved it since `version`.
 * @throws AppError not-found | forbidden | gone | invalid | stale-version (with the present row)
 */
export async function editRow(
  db: Knex,
  asking: Asking,
  entity: RowEntity,
  at: { readonly id: string; readonly version: number },
  asked: Fields,
): Promise<{ row: Row; deedId: string }> {
  return db.transaction(async (trx) => {
    const { row, deed } = await openRow(trx, asking, entity, at.id, at.version);
    const fields = await fit(trx, entity, deed.patternId, asked, row);
    if (entity === 'mark') await keepOneMain(trx, deed, { ...row, ...fields });
    const set = await byHand(trx, entity, fields, row);
    const saved = await writeFields(trx, deed, entity, row, { ...fields, ...set });
    if (entity === 'line') await touchFields(trx, row.id, Object.keys(fields), deed.at);
    return { row: saved, deedId: deed.id };
  });
}

/**
 * Takes a row away; undo brings it back.
 * @throws AppError not-found | forbidden (also for a caution that a material brings) | gone | stale-version
 */
export async function removeRow(
  db: Knex,
  asking: Asking,
  entity: RowEntity,
  at: { readonly id: string; readonly version: number },
): Promise<{ deedId: string }> {
  return db.transaction(async (trx) => {
    const { row, deed } = await openRow(trx, asking, entity, at.id, at.version);
    if (entity === 'caution') await checkRemoval(trx, row);
    await writeFields(trx, deed, entity, row, { deletedAt: deed.at });
    return { deedId: deed.id };
  });
}
