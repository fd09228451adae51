import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { z } from 'zod';
import { inHeardNumbers, readTranscript, type Draft } from '#crochet';
import type { ReadingDifferences, ReadingTake } from '#contract/readings';
import type { ReadingTaken } from '#contract/recordings';
import { AppError } from '../../http/problem.ts';
import type { Deps } from '../../platform/deps.ts';
import { TRIES, type JobInfo } from '../../platform/jobs.ts';
import type { Person } from '../../http/session.ts';
import { compareDraft, refuseIfChanged } from '../patterns/compare-draft.service.ts';
import { openPattern, type Asking, type Deed } from '../patterns/deed.service.ts';
import { findSeenPattern } from '../patterns/document.service.ts';
import { setPatternState } from '../patterns/patterns.service.ts';
import { takeDraft } from '../patterns/take-draft.service.ts';
import { findReading, insertReading, listEmptyPatternsOf } from './readings.store.ts';
import { recordOnRecording } from './recording-changes.ts';
import { canKeepRecordings } from './recordings.policy.ts';
import { findPlaced, findSpokenTerms } from './recordings.store.ts';
import { countCharacters, findTranscript, listCues, setReadingFailed } from './transcripts.store.ts';

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

/** Reads the captions as they are corrected by now, in the terms a person chose, if one did. */
async function readCaptions(db: Knex, { id, recordingId }: ToRead): Promise<Draft> {
  const cues = await listCues(db, id);
  const terms = await findSpokenTerms(db, recordingId);
  const draft = readTranscript(
    cues.map(({ startMs, endMs, heard, corrected }) => ({ startMs, endMs, text: corrected ?? heard })),
    terms === null ? {} : { terms },
  );
  return inHeardNumbers(draft, cues);
}

async function keepReading(trx: Knex.Transaction, { id: transcriptId, recordingId }: ToRead, draft: Draft, now: Date) {
  const id = randomUUID();
  await insertReading(trx, { id, transcriptId, engineVersion: ENGINE_VERSION, draft }, now);
  await recordOnRecording(trx, { who: null, now }, recordingId, { before: null, after: { reading: id } });
  for (const pattern of await listEmptyPatternsOf(trx, recordingId)) {
    await takeDraft(trx, ownDeed(pattern.id, now), id, draft);
  }
}

async function readAndKeep({ db, clock }: ReadingDeps, toRead: ToRead): Promise<void> {
  const draft = await readCaptions(db, toRead);
  await db.transaction((trx) => keepReading(trx, toRead, draft, clock.now()));
}

/** Transcripts of at most so many characters are read while their sender waits: about half an hour of talk. */
export const QUICK_CHARACTERS = 30_000;

/**
 * Reads a short transcript at once, in the transaction of whoever sent it or asks for it again.
 * @returns false for a long one, which is a job
 */
export async function readIfQuick(trx: Knex.Transaction, toRead: ToRead, now: Date): Promise<boolean> {
  if ((await countCharacters(trx, toRead.id)) > QUICK_CHARACTERS) return false;
  await keepReading(trx, toRead, await readCaptions(trx, toRead), now);
  return true;
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

/** A reading of a recording that stands in the pattern. */
async function findReadingOf(db: Knex, ids: ReadingIds) {
  const reading = await findReading(db, ids.readingId);
  const placed = reading && (await findPlaced(db, ids.patternId, reading.recordingId));
  if (!placed || placed.removedAt) throw new AppError('not-found');
  return { reading, placed };
}

export interface ReadingIds {
  readonly patternId: string;
  readonly readingId: string;
}

/**
 * Takes a reading of one of its recordings into a pattern: all that is new, or what was chosen of it. What a person has
 * written or taken away stays so, unless it was chosen by name. One step for undo.
 * @throws AppError not-found (no such reading of this pattern) | forbidden | gone | stale-version (the pattern has changed
 *   since its differences were told)
 */
export async function takeReading(
  db: Knex,
  asking: Asking,
  ids: ReadingIds,
  { lastChange, ...choice }: ReadingTake,
): Promise<{ taken: ReadingTaken; deedId: string }> {
  return db.transaction(async (trx) => {
    const { deed } = await openPattern(trx, asking, ids.patternId, canKeepRecordings);
    const { reading } = await findReadingOf(trx, ids);
    if (lastChange !== undefined) await refuseIfChanged(trx, ids.patternId, lastChange);
    return { taken: await takeDraft(trx, deed, reading.id, reading.draft, choice), deedId: deed.id };
  });
}

/**
 * A reading held against its pattern, line by line.
 * @throws AppError not-found, also where the pattern may not be seen
 */
export async function readDifferences(db: Knex, who: Person, ids: ReadingIds): Promise<ReadingDifferences> {
  return db.transaction(
    async (trx) => {
      const pattern = await findSeenPattern(trx, who, ids.patternId);
      const { reading, placed } = await findReadingOf(trx, ids);
      const differences = await compareDraft(trx, pattern, reading.id, reading.draft);
      if (!differences) throw new AppError('not-found');
      return {
        readingId: reading.id,
        transcriptId: reading.transcriptId,
        recordingId: placed.id,
        recordingTitle: placed.title,
        mayTake: canKeepRecordings(who, pattern) && pattern.deletedAt === null,
        ...differences,
      };
    },
    { isolationLevel: 'repeatable read', readOnly: true },
  );
}
