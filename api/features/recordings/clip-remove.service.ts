import type { Knex } from 'knex';
import { AppError } from '../../http/problem.ts';
import type { Asking } from '../patterns/deed.service.ts';
import { findClip } from './clips.store.ts';
import { recordOnRecording } from './recording-changes.ts';
import { findRecordingFor } from './recordings.access.ts';
import { canKeepRecordings } from './recordings.policy.ts';
import { showClip } from './recordings.store.ts';
import { clearObject } from './upload-end.service.ts';

/**
 * Removes a recording's clip for good, and makes room. Transcript, marks and the recording itself stay.
 * @throws AppError not-found (also where there is no clip) | forbidden | conflict (an edition that is out shows it)
 */
export async function removeClip(db: Knex, asking: Asking, recordingId: string): Promise<void> {
  await db.transaction(async (trx) => {
    await findRecordingFor(trx, asking.who, recordingId, canKeepRecordings, { lock: true });
    const clip = await findClip(trx, recordingId);
    if (!clip) throw new AppError('not-found');
    if (clip.published) {
      throw new AppError(
        'conflict',
        'A published edition shows this clip. Withdraw the edition, or send another clip in its place.',
      );
    }
    await showClip(trx, recordingId, null, null);
    await clearObject(trx, clip.objectId, asking.now);
    await recordOnRecording(trx, asking, recordingId, { before: { clip: true }, after: { clip: null } });
  });
}
