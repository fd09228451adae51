import type { Knex } from 'knex';
import { AppError } from '../../http/problem.ts';
import type { Fields, Row, RowEntity } from './entities.ts';
import { findRow } from './rows.store.ts';

/** @throws AppError invalid, pointing at one field */
export function refuseField(field: string, detail: string): never {
  throw new AppError('invalid', detail, { errors: [{ pointer: `#/${field}`, detail }] });
}

async function mustBeIn(trx: Knex, patternId: string, entity: RowEntity, field: string, id: unknown): Promise<void> {
  if (typeof id !== 'string') return;
  const row = await findRow(trx, entity, id);
  if (row?.patternId !== patternId || row.deletedAt) refuseField(field, `There is no such ${entity} in this pattern.`);
}

async function mustHaveRecording(trx: Knex, patternId: string, recordingId: unknown): Promise<void> {
  if (typeof recordingId !== 'string') return;
  const found = await trx('pattern_recordings')
    .where({ pattern_id: patternId, recording_id: recordingId })
    .whereNull('removed_at')
    .first<{ number: number } | undefined>('number');
  if (!found) refuseField('recordingId', 'There is no such recording in this pattern.');
}

/**
 * Checks what a row points at: everything stays inside its pattern.
 * @param row the row as it is, where there is one
 * @throws AppError invalid
 */
export async function checkReferences(
  trx: Knex,
  entity: RowEntity,
  patternId: string,
  fields: Fields,
  row?: Row,
): Promise<void> {
  if (entity === 'line') await mustBeIn(trx, patternId, 'piece', 'pieceId', fields.pieceId);
  if (entity === 'piece') await mustBeIn(trx, patternId, 'line', 'startsOnLineId', fields.startsOnLineId);
  if (entity === 'mark') {
    await mustBeIn(trx, patternId, 'line', 'lineId', fields.lineId);
    await mustHaveRecording(trx, patternId, fields.recordingId);
    const { startMs, endMs } = { ...row, ...fields } as { startMs: number; endMs?: number | null };
    if (typeof endMs === 'number' && endMs < startMs) refuseField('endMs', 'A mark cannot end before it starts.');
  }
}
