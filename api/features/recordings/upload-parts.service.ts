import { beginsLike, containerOfName } from '#contract/clip-facts';
import type { PartTaken } from '#contract/uploads';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import { StorageRefused } from '../../platform/storage.ts';
import type { PartBytes } from './part-form.ts';
import { refuseUnlessKeeper } from './recordings.access.ts';
import { refuseUpload } from './upload-end.service.ts';
import { deletePart, findPart, findUpload, insertPart, lockUpload, type UploadRow } from './uploads.store.ts';

/** How to read the form of the part, once it is known that it is wanted. */
export type ReadPart = (limit: number, known: (sha256: string) => boolean) => Promise<PartBytes | null>;

const LOST = 'What had arrived of this clip is no longer there. Choose the file again to send it anew.';

/** Bytes of part `n`; undefined where the clip has no such part. */
function bytesOfPart({ size, partSize }: UploadRow, n: number): number | undefined {
  const last = Math.ceil(size / partSize);
  if (n > last) return undefined;
  return n < last ? partSize : size - partSize * (last - 1);
}

function refuseUnlessArriving(upload: UploadRow): void {
  if (upload.state === 'arriving') return;
  if (upload.state === 'completing' || upload.state === 'ready') {
    throw new AppError('conflict', 'This clip has arrived whole; nothing more can be added to it.');
  }
  throw new AppError('gone', upload.refusal ?? LOST);
}

async function putInStorage(
  { storage, db, clock }: Pick<Deps, 'db' | 'storage' | 'clock'>,
  upload: UploadRow,
  n: number,
  part: PartBytes,
) {
  try {
    return await storage.putPart(upload.key, upload.storageId, n, part.bytes, part.sha256);
  } catch (err) {
    if (!(err instanceof StorageRefused)) throw err;
    // The store forgot the upload: what it had is gone, and only the whole file can be sent again.
    await refuseUpload({ db, clock }, upload, 'given-up', LOST);
    throw new AppError('gone', LOST, {}, { cause: err });
  }
}

/**
 * Takes in one part of a clip. Sent twice it is the same as once; with other bytes under the same number it is
 * refused. The part is written down only when storage has it.
 * @throws AppError not-found | forbidden | invalid | conflict | gone | unsupported (the file is not what its name says)
 * @throws StorageDown
 */
export async function takePart(
  deps: Pick<Deps, 'db' | 'storage' | 'clock'>,
  who: Person,
  ref: { readonly uploadId: string; readonly n: number },
  read: ReadPart,
): Promise<PartTaken> {
  const { db, clock } = deps;
  const upload = await findUpload(db, ref.uploadId);
  refuseUnlessKeeper(who, upload);
  const size = bytesOfPart(upload, ref.n);
  if (size === undefined) throw new AppError('invalid', 'This clip has fewer parts.');
  const before = await findPart(db, upload.id, ref.n);

  const part = await read(size, (sha256) => {
    if (before?.sha256 === sha256) return true;
    if (before) throw new AppError('conflict', 'Another part with this number is here already. The file has changed.');
    refuseUnlessArriving(upload);
    return false;
  });
  if (!part) return { n: ref.n, size, sha256: before?.sha256 ?? '' };
  if (part.bytes.length !== size) throw new AppError('invalid', `Part ${ref.n} has ${size} bytes.`);

  const kind = containerOfName(upload.name) ?? 'mp4';
  if (ref.n === 1 && !beginsLike(kind, part.bytes)) {
    const refusal =
      'This file is not what its name says: it is no MP4, WebM or MOV inside. Choose the recording itself.';
    await refuseUpload(deps, upload, 'refused', refusal);
    throw new AppError('unsupported', refusal);
  }
  const etag = await putInStorage(deps, upload, ref.n, part);
  const kept = await db.transaction(async (trx) => {
    // While the bytes were on their way the upload may have been cancelled, and its parts taken from storage.
    refuseUnlessArriving((await lockUpload(trx, upload.id)) ?? { ...upload, state: 'given-up' });
    if (await insertPart(trx, upload.id, { n: ref.n, size, sha256: part.sha256, etag }, clock.now())) return true;
    return (await findPart(trx, upload.id, ref.n))?.sha256 === part.sha256;
  });
  if (!kept) {
    // Two files raced for one number, and storage holds the later bytes: neither counts.
    await deletePart(db, upload.id, ref.n);
    throw new AppError('conflict', 'Two different files were sent as one. Choose the right one again.');
  }
  return { n: ref.n, size, sha256: part.sha256 };
}
