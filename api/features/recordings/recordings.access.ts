import type { Knex } from 'knex';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import { canKeepRecordings, canSeeRecording } from './recordings.policy.ts';
import { findRecording, type RecordingRow } from './recordings.store.ts';

/**
 * A recording that somebody may see and, with `may`, write to.
 * @throws AppError not-found, also where it may not be seen | forbidden
 */
export async function findRecordingFor(
  db: Knex,
  who: Person,
  id: string,
  may: (who: Person, recording: RecordingRow) => boolean,
  options: { readonly lock?: boolean } = {},
): Promise<RecordingRow> {
  const recording = await findRecording(db, id, options);
  if (!recording || !canSeeRecording(who, recording)) throw new AppError('not-found');
  if (!may(who, recording)) throw new AppError('forbidden');
  return recording;
}

/**
 * Holds that somebody may go on with a clip that is on its way.
 * @throws AppError not-found, also where it may not be seen | forbidden
 */
export function refuseUnlessKeeper<T extends { readonly studioId: string }>(
  who: Person,
  upload: T | undefined,
): asserts upload is T {
  if (!upload || !canSeeRecording(who, upload)) throw new AppError('not-found');
  if (!canKeepRecordings(who, upload)) throw new AppError('forbidden');
}
