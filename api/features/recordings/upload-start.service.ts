import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { CONTAINER_TYPES, containerOfName } from '#contract/clip-facts';
import { CLIP_BYTES, type ClipStart, type ClipStarted } from '#contract/uploads';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import { readRoom } from './objects.store.ts';
import { canKeepRecordings } from './recordings.policy.ts';
import { findRecordingFor } from './recordings.access.ts';
import { giveUpUpload } from './upload-end.service.ts';
import { countArrivingOf, insertUpload, listParts, listUnderWay, type UploadRow } from './uploads.store.ts';

const MIB = 1_048_576;
/** Bytes of the largest part there is; six of them fit into memory, and a thousand make the largest clip. */
export const LARGEST_PART_BYTES = 8 * MIB;
/** The smallest that S3 takes: what is under way when somebody pauses or loses the line is little. */
const SMALL_PART_BYTES = 5 * MIB;
/** From here on fewer, larger parts. */
const LARGE_CLIP_BYTES = 1_000_000_000;
const partBytesFor = (size: number) => (size < LARGE_CLIP_BYTES ? SMALL_PART_BYTES : LARGEST_PART_BYTES);
/** Clips that one person may have on the way at a time. */
const OPEN_UPLOADS = 8;
/** Somebody else's clip that moved within this time is not pushed aside. */
const BUSY_MS = 15 * 60_000;

const isSameFile = (a: ClipStart, b: ClipStart) =>
  a.name === b.name && a.size === b.size && a.lastModified === b.lastModified && a.firstMiBSha256 === b.firstMiBSha256;

function gigabytes(bytes: number): string {
  return `${(bytes / 1_000_000_000).toFixed(2)} GB`;
}

async function refuseWithoutRoom(trx: Knex.Transaction, studioId: string, wanted: number): Promise<void> {
  const room = await readRoom(trx, studioId, { lock: true });
  const left = Math.max(0, room.quotaBytes - room.usedBytes);
  if (wanted <= left) return;
  throw new AppError(
    'over-quota',
    `This clip has ${gigabytes(wanted)}, and the studio has ${gigabytes(left)} of ${gigabytes(room.quotaBytes)} left. ` +
      'Nothing was sent. Remove a clip that is no longer needed, or export this one smaller.',
    { ...room, wantedBytes: wanted },
  );
}

async function makeWay(trx: Knex.Transaction, who: Person, underWay: readonly UploadRow[], now: Date): Promise<void> {
  for (const other of underWay) {
    if (other.state === 'ready') continue;
    if (other.state === 'completing') {
      throw new AppError('conflict', 'The clip sent before is being looked at. Try again in a moment.');
    }
    if (other.personId !== who.id && now.getTime() - other.touchedAt.getTime() < BUSY_MS) {
      throw new AppError('conflict', 'Somebody else in the studio is sending a clip for this recording.');
    }
    await giveUpUpload(trx, other, now);
  }
}

/**
 * Begins to take in a clip, or goes on with the same file where it stopped: the same name, size, date and first bytes,
 * on any day and in any process. Another file for the same recording pushes aside what had arrived before.
 * @throws AppError not-found | forbidden | unsupported | too-large | over-quota | conflict
 * @throws StorageDown
 */
export async function startClip(
  { db, storage, clock }: Pick<Deps, 'db' | 'storage' | 'clock'>,
  who: Person,
  recordingId: string,
  file: ClipStart,
): Promise<ClipStarted> {
  const now = clock.now();
  return db.transaction(async (trx) => {
    const recording = await findRecordingFor(trx, who, recordingId, canKeepRecordings, { lock: true });
    const kind = containerOfName(file.name);
    if (!kind) throw new AppError('unsupported', 'A clip is a file that ends in .mp4, .webm or .mov.');
    if (file.size > CLIP_BYTES) {
      throw new AppError(
        'too-large',
        `A clip may have ${gigabytes(CLIP_BYTES)}; this one has ${gigabytes(file.size)}.`,
      );
    }
    const underWay = await listUnderWay(trx, recordingId);
    const same = underWay.find((each) => isSameFile(each, file));
    if (same) {
      const parts = await listParts(trx, same.id);
      return { uploadId: same.id, partSize: same.partSize, have: parts.map(({ n }) => n) };
    }
    if ((await countArrivingOf(trx, who.id)) >= OPEN_UPLOADS + underWay.length) {
      throw new AppError('conflict', `${OPEN_UPLOADS} clips are on their way. Let one arrive, or cancel one.`);
    }
    await refuseWithoutRoom(trx, recording.studioId, file.size);
    await makeWay(trx, who, underWay, now);

    const key = randomUUID();
    const row = {
      id: randomUUID(),
      recordingId,
      studioId: recording.studioId,
      personId: who.id,
      objectId: randomUUID(),
      key,
      storageId: await storage.createMultipart(key, CONTAINER_TYPES[kind]),
      partSize: partBytesFor(file.size),
    };
    await insertUpload(trx, row, file, CONTAINER_TYPES[kind], now);
    return { uploadId: row.id, partSize: row.partSize, have: [] };
  });
}
