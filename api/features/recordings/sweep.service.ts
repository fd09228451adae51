import { z } from 'zod';
import type { Deps } from '../../platform/deps.ts';
import { addJob } from '../../platform/jobs.ts';
import { doomObject } from './objects.store.ts';
import {
  doomUnowned,
  findDoomed,
  forgetObject,
  listAbandoned,
  listDoomed,
  listKnownKeys,
  listLiveStorageIds,
  listStorageIds,
  listUnfinished,
  type SweptObject,
} from './sweep.store.ts';
import { moveUpload } from './uploads.store.ts';

const DAY_MS = 24 * 3_600_000;
/** A clip that nobody has gone on with for this long is given up. */
export const GIVEN_UP_AFTER_MS = 7 * DAY_MS;
/** What was put into storage this long ago and has no row is nobody's: no request lasts as long. */
export const STRAY_AFTER_MS = 3_600_000;
const UNFINISHED_AFTER_MS = 15 * 60_000;
const KEYS_AT_A_TIME = 500;

type SweepDeps = Pick<Deps, 'db' | 'storage' | 'clock' | 'log'>;

/** What one pass has taken away. */
export interface Swept {
  readonly givenUp: number;
  readonly removed: number;
  readonly strays: number;
}

async function removeDoomed({ db, storage, clock }: SweepDeps, object: SweptObject): Promise<void> {
  for (const storageId of await listStorageIds(db, object.id)) await storage.abortMultipart(object.key, storageId);
  await storage.remove(object.key);
  await forgetObject(db, object.id, new Date(clock.now().getTime() - GIVEN_UP_AFTER_MS));
}

/** Takes one object out of storage at once; done twice it is the same as once. */
export async function clearDoomedObject(deps: SweepDeps, payload: unknown): Promise<void> {
  const { objectId } = z.object({ objectId: z.uuid() }).parse(payload);
  const object = await findDoomed(deps.db, objectId);
  if (object) await removeDoomed(deps, object);
}

async function giveUpAbandoned({ db, clock }: SweepDeps, now: Date): Promise<number> {
  const abandoned = await listAbandoned(db, new Date(now.getTime() - GIVEN_UP_AFTER_MS));
  for (const { id, objectId } of abandoned) {
    await db.transaction(async (trx) => {
      if (await moveUpload(trx, id, 'arriving', { state: 'given-up' }, clock.now())) {
        await doomObject(trx, objectId, now);
      }
    });
  }
  return abandoned.length;
}

async function finishUnfinished({ db }: SweepDeps, now: Date): Promise<void> {
  for (const uploadId of await listUnfinished(db, new Date(now.getTime() - UNFINISHED_AFTER_MS))) {
    await db.transaction((trx) => addJob(trx, 'finish-clip', { uploadId }, { key: `finish-clip ${uploadId}` }));
  }
}

/** Takes away what lies in storage and stands in no row: left by a process that died between the two. */
async function removeStrays({ db, storage }: SweepDeps, before: Date): Promise<number> {
  let strays = 0;
  let page: string[] = [];
  const flush = async () => {
    const known = await listKnownKeys(db, page);
    for (const key of page.filter((each) => !known.has(each))) {
      await storage.remove(key);
      strays += 1;
    }
    page = [];
  };
  for await (const { key, changedAt } of storage.list()) {
    if (changedAt >= before) continue;
    page.push(key);
    if (page.length === KEYS_AT_A_TIME) await flush();
  }
  await flush();

  const live = await listLiveStorageIds(db);
  for await (const { key, uploadId, startedAt } of storage.listMultiparts()) {
    if (startedAt >= before || live.has(uploadId)) continue;
    await storage.abortMultipart(key, uploadId);
    strays += 1;
  }
  return strays;
}

/**
 * One pass over everything stored: clips given up, what is doomed, what nobody owns, parts and all. After it storage
 * holds what the tables name and nothing else.
 * @throws StorageDown, and the next pass goes on
 */
export async function sweepStorage(deps: SweepDeps): Promise<Swept> {
  const now = deps.clock.now();
  const stray = new Date(now.getTime() - STRAY_AFTER_MS);
  const givenUp = await giveUpAbandoned(deps, now);
  await finishUnfinished(deps, now);
  await doomUnowned(deps.db, stray, now);
  const doomed = await listDoomed(deps.db);
  for (const object of doomed) await removeDoomed(deps, object);
  const swept = { givenUp, removed: doomed.length, strays: await removeStrays(deps, stray) };
  deps.log.info(swept, 'storage swept');
  return swept;
}
