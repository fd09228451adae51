import type { Knex } from 'knex';
import type { Upload } from '#contract/recordings';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import { addJob } from '../../platform/jobs.ts';
import { doomObject } from './objects.store.ts';
import { refuseUnlessKeeper } from './recordings.access.ts';
import { canSeeRecording } from './recordings.policy.ts';
import {
  findUpload,
  listParts,
  lockUpload,
  moveUpload,
  uploadAnswer,
  type PartRow,
  type UploadRow,
} from './uploads.store.ts';

/** Asks for an object to be taken out of storage at once; the sweep would find it too. */
export async function clearObject(trx: Knex.Transaction, objectId: string, at: Date): Promise<void> {
  await doomObject(trx, objectId, at);
  await addJob(trx, 'clear-object', { objectId }, { key: `clear-object ${objectId}` });
}

/** Lets go of a clip that has not arrived whole: its parts no longer count and are removed. */
export async function giveUpUpload(trx: Knex.Transaction, upload: UploadRow, at: Date): Promise<void> {
  await moveUpload(trx, upload.id, upload.state, { state: 'given-up' }, at);
  await clearObject(trx, upload.objectId, at);
}

/** Ends an upload for a reason that is told to the person, and removes what had arrived. */
export async function refuseUpload(
  { db, clock }: Pick<Deps, 'db' | 'clock'>,
  upload: UploadRow,
  state: 'refused' | 'given-up',
  refusal: string,
): Promise<void> {
  const now = clock.now();
  await db.transaction(async (trx) => {
    if (await moveUpload(trx, upload.id, upload.state, { state, refusal }, now)) {
      await clearObject(trx, upload.objectId, now);
    }
  });
}

const answerFor = async (db: Knex, upload: UploadRow): Promise<Upload> =>
  uploadAnswer(upload, await listParts(db, upload.id));

/**
 * How far a clip has come.
 * @throws AppError not-found
 */
export async function readUpload({ db }: Pick<Deps, 'db'>, who: Person, uploadId: string): Promise<Upload> {
  const upload = await findUpload(db, uploadId);
  if (!upload || !canSeeRecording(who, upload)) throw new AppError('not-found');
  return answerFor(db, upload);
}

function missingParts(upload: UploadRow, parts: readonly PartRow[]): number[] {
  const here = new Set(parts.map(({ n }) => n));
  const count = Math.ceil(upload.size / upload.partSize);
  return Array.from({ length: count }, (_, i) => i + 1).filter((n) => !here.has(n));
}

/**
 * Says that every part has been sent. The clip is then put together and looked at by a job; asking again is harmless,
 * and asks for that job again where it had failed.
 * @returns the upload, `completing` or further
 * @throws AppError not-found | forbidden | gone | conflict (parts are missing: `missing` names them)
 */
export async function completeUpload(
  { db, clock }: Pick<Deps, 'db' | 'clock'>,
  who: Person,
  uploadId: string,
): Promise<Upload> {
  return db.transaction(async (trx) => {
    const upload = await lockUpload(trx, uploadId);
    refuseUnlessKeeper(who, upload);
    if (upload.state === 'given-up') throw new AppError('gone', 'This clip was given up. Choose the file again.');
    if (upload.state === 'ready' || upload.state === 'refused') return answerFor(trx, upload);
    const parts = await listParts(trx, uploadId);
    const missing = missingParts(upload, parts);
    const bytes = parts.reduce((sum, { size }) => sum + size, 0);
    if (missing.length > 0 || bytes !== upload.size) {
      throw new AppError('conflict', 'Some parts have not arrived yet.', { missing });
    }
    if (upload.state === 'arriving') {
      await moveUpload(trx, uploadId, 'arriving', { state: 'completing' }, clock.now());
    }
    await addJob(trx, 'finish-clip', { uploadId }, { key: `finish-clip ${uploadId}` });
    return answerFor(trx, { ...upload, state: 'completing' });
  });
}

/**
 * Gives a clip up that has not arrived whole; its parts are removed.
 * @throws AppError not-found | forbidden | conflict (it has arrived)
 */
export async function cancelUpload(
  { db, clock }: Pick<Deps, 'db' | 'clock'>,
  who: Person,
  uploadId: string,
): Promise<void> {
  await db.transaction(async (trx) => {
    const upload = await lockUpload(trx, uploadId);
    refuseUnlessKeeper(who, upload);
    if (upload.state === 'completing' || upload.state === 'ready') {
      throw new AppError('conflict', 'This clip has arrived whole and can no longer be cancelled.');
    }
    if (upload.state === 'arriving') await giveUpUpload(trx, upload, clock.now());
    // One that was refused is put out of sight.
    else await moveUpload(trx, uploadId, upload.state, { state: 'given-up' }, clock.now());
  });
}
