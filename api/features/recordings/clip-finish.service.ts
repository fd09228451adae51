import { z } from 'zod';
import { CONTAINER_TYPES, whyUnplayable, type ClipFacts } from '#contract/clip-facts';
import type { Deps } from '../../platform/deps.ts';
import { StorageRefused } from '../../platform/storage.ts';
import { inspectClip } from './inspect-clip.ts';
import { recordOnRecording } from './recording-changes.ts';
import { showClip } from './recordings.store.ts';
import { clearObject, refuseUpload } from './upload-end.service.ts';
import { findUpload, listParts, moveUpload, type UploadRow } from './uploads.store.ts';

const BROKEN = 'The parts of this clip did not fit together in storage. Nothing of it was kept: choose the file again.';
const NO_FILM =
  'This file is no film, or it breaks off before its end. Export the recording again and choose that file.';

/** Puts the parts together, if that was not done before. @returns whether the whole clip is in storage */
async function assemble({ db, storage }: Pick<Deps, 'db' | 'storage'>, upload: UploadRow): Promise<boolean> {
  const before = await storage.head(upload.key);
  if (before?.bytes === upload.size) return true;
  try {
    await storage.completeMultipart(upload.key, upload.storageId, await listParts(db, upload.id));
  } catch (err) {
    if (!(err instanceof StorageRefused)) throw err;
  }
  return (await storage.head(upload.key))?.bytes === upload.size;
}

async function accept({ db, clock }: Pick<Deps, 'db' | 'clock'>, upload: UploadRow, facts: ClipFacts): Promise<void> {
  const now = clock.now();
  await db.transaction(async (trx) => {
    if (!(await moveUpload(trx, upload.id, 'completing', { state: 'ready' }, now))) return;
    const type = facts.container === 'other' ? CONTAINER_TYPES.mp4 : CONTAINER_TYPES[facts.container];
    await trx('objects')
      .where({ id: upload.objectId })
      .update({ state: 'ready', bytes: upload.size, type, touched_at: now });
    const replaced = await showClip(trx, upload.recordingId, upload.objectId, facts);
    const hand = { who: { id: upload.personId }, now };
    await recordOnRecording(trx, hand, upload.recordingId, { before: null, after: { clip: true } });
    if (replaced !== null && replaced !== upload.objectId) await clearObject(trx, replaced, now);
  });
}

/**
 * Makes a clip whole and finds out what it is: only then it is shown. What browsers do not play is refused, with the
 * reason for the person, and removed. Done twice it is the same as once.
 * @throws StorageDown, and the job is tried again
 */
export async function finishClip(deps: Pick<Deps, 'db' | 'storage' | 'clock'>, payload: unknown): Promise<void> {
  const { uploadId } = z.object({ uploadId: z.uuid() }).parse(payload);
  const upload = await findUpload(deps.db, uploadId);
  if (upload?.state !== 'completing') return;
  if (!(await assemble(deps, upload))) {
    await refuseUpload(deps, upload, 'refused', BROKEN);
    return;
  }
  const facts = await inspectClip(deps.storage, upload.key, upload.size);
  const refusal = facts ? whyUnplayable(facts) : NO_FILM;
  if (facts && refusal === null) await accept(deps, upload, facts);
  else await refuseUpload(deps, upload, 'refused', refusal ?? NO_FILM);
}
