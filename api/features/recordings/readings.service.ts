import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { z } from 'zod';
import { readTranscript } from '#crochet';
import type { ReadingTaken } from '#contract/recordings';
import { AppError } from '../../http/problem.ts';
import type { Deps } from '../../platform/deps.ts';
import { TRIES, type JobInfo } from '../../platform/jobs.ts';
import { openPattern, type Asking, type Deed } from '../patterns/deed.service.ts';
import { setPatternState } from '../patterns/patterns.service.ts';
import { takeDraft } from '../patterns/take-draft.service.ts';
import { findReading, insertReading, listEmptyPatternsOf } from './readings.store.ts';
import { recordOnRecording } from './recording-changes.ts';
import { canKeepRecordings } from './recordings.policy.ts';
import { findPlaced } from './recordings.store.ts';
import { findTranscript, listCues, setReadingFailed } from './transcripts.store.ts';

/** Raised when the same words are read otherwise than before; kept with each reading. */
const ENGINE_VERSION = '1';

type ReadingDeps = Pick<Deps, 'db' | 'clock'>;

/** A deed of the machine's own; nobody undoes it. */
const ownDeed = (patternId: string, at: Date): Deed => ({ id: randomUUID(), patternId, personId: null, at });

/**
 * Reads a transcript, as corrected by now, and keeps the reading. A pattern that holds no line yet takes the draft at
 * once; one that has lines is left alone until somebody takes what is new. After the last try it stands as failed.
 */
export async function readTranscriptJob(
  deps: ReadingDeps,
  payload: unknown,
  info: Pick<JobInfo, 'attempt'>,
): Promise<void> {
  const { transcriptId } = z.object({ transcriptId: z.uuid() }).parse(payload);
  const transcript = await findTranscript(deps.db, transcriptId);
  if (!transcript) return;
  try {
    await readAndKeep(deps, transcript);
  } catch (err) {
    if (info.attempt >= TRIES) await sayFailed(deps, transcript);
    throw err;
  }
}

interface ToRead {
  readonly id: string;
  readonly recordingId: string;
}

async function readAndKeep({ db, clock }: ReadingDeps, { id: transcriptId, recordingId }: ToRead): Promise<void> {
  const cues = await listCues(db, transcriptId);
  const draft = readTranscript(
    cues.map(({ startMs, endMs, heard, corrected }) => ({ startMs, endMs, text: corrected ?? heard })),
    {},
  );
  const now = clock.now();
  await db.transaction(async (trx) => {
    const id = randomUUID();
    await insertReading(trx, { id, transcriptId, engineVersion: ENGINE_VERSION, draft }, now);
    await recordOnRecording(trx, { who: null, now }, recordingId, { before: null, after: { reading: id } });
    for (const pattern of await listEmptyPatternsOf(trx, recordingId)) {
      await takeDraft(trx, ownDeed(pattern.id, now), id, draft);
    }
  });
}

async function sayFailed({ db, clock }: ReadingDeps, { id, recordingId }: ToRead): Promise<void> {
  const now = clock.now();
  await db.transaction(async (trx) => {
    await setReadingFailed(trx, id, now);
    for (const pattern of await listEmptyPatternsOf(trx, recordingId)) {
      if (pattern.state === 'reading') await setPatternState(trx, ownDeed(pattern.id, now), 'drafting');
    }
    await recordOnRecording(trx, { who: null, now }, recordingId, { before: null, after: { reading: 'failed' } });
  });
}

/** Shows on the shelf that a pattern without lines is waiting for its recording to be read. */
export async function showAsReading(trx: Knex.Transaction, recordingId: string, now: Date): Promise<void> {
  for (const pattern of await listEmptyPatternsOf(trx, recordingId)) {
    if (pattern.state === 'drafting') await setPatternState(trx, ownDeed(pattern.id, now), 'reading');
  }
}

/**
 * Takes into a pattern what is new in a reading of one of its recordings. What a person has written or taken away
 * stays so.
 * @throws AppError not-found (no such reading of this pattern) | forbidden | gone
 */
export async function takeReading(
  db: Knex,
  asking: Asking,
  ids: { readonly patternId: string; readonly readingId: string },
): Promise<ReadingTaken> {
  return db.transaction(async (trx) => {
    const { deed } = await openPattern(trx, asking, ids.patternId, canKeepRecordings);
    const reading = await findReading(trx, ids.readingId);
    const placed = reading && (await findPlaced(trx, ids.patternId, reading.recordingId));
    if (!placed || placed.removedAt) throw new AppError('not-found');
    return takeDraft(trx, deed, reading.id, reading.draft);
  });
}
