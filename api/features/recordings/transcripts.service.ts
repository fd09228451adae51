import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { Cue, TRANSCRIPT_ENDINGS, type CueList, type Transcript, type TranscriptHead } from '#contract/recordings';
import type { ReadingAsk } from '#contract/readings';
import { AppError } from '../../http/problem.ts';
import { addJob } from '../../platform/jobs.ts';
import type { Person } from '../../http/session.ts';
import type { Asking } from '../patterns/deed.service.ts';
import { describeTranscript } from './describe-recordings.ts';
import { readIfQuick, showAsReading } from './readings.service.ts';
import { findSpokenTerms, setSpokenTerms } from './recordings.store.ts';
import { listNewestReadings } from './readings.store.ts';
import { recordOnRecording } from './recording-changes.ts';
import { findRecordingFor } from './recordings.access.ts';
import { canCorrectCaptions, canKeepRecordings, canSeeRecording } from './recordings.policy.ts';
import { isText, readCaptions } from './read-captions.ts';
import {
  findCue,
  findTranscript,
  findTranscriptHead,
  insertTranscript,
  listCues,
  readSourceText,
  setReadingFailed,
  updateCue,
  type TranscriptRow,
} from './transcripts.store.ts';

const EXAMPLE = '[1:04] Round two. Two single crochet in every stitch.';

/** A transcript's file as it was sent. */
export interface SentFile {
  readonly name: string;
  readonly type: string;
  readonly bytes: Uint8Array;
}

function refuseOtherFiles({ name, type, bytes }: SentFile): void {
  const ending = /\.[a-z0-9]+$/i.exec(name)?.[0].toLowerCase();
  const wanted = TRANSCRIPT_ENDINGS.some((each) => each === ending);
  if (wanted && isText(type, bytes)) return;
  throw new AppError(
    'unsupported',
    'A transcript is a text file with times: SubRip (.srt), WebVTT (.vtt), or text (.txt, .md) with a clock time ' +
      `before each paragraph, like “${EXAMPLE}”`,
  );
}

/** Has a transcript read: at once where that is quick, else by a job; asked again before it is begun, it is read once. */
async function haveRead(trx: Knex.Transaction, transcriptId: string, recordingId: string, now: Date): Promise<void> {
  await setReadingFailed(trx, transcriptId, null);
  if (await readIfQuick(trx, { id: transcriptId, recordingId }, now)) return;
  await showAsReading(trx, recordingId, now);
  await addJob(trx, 'read-transcript', { transcriptId }, { key: `read-transcript ${transcriptId}` });
}

async function describeHead(db: Knex, id: string): Promise<TranscriptHead> {
  const head = await findTranscriptHead(db, id);
  if (!head) throw new AppError('not-found');
  const [reading] = await listNewestReadings(db, [id]);
  return describeTranscript(head, reading);
}

/**
 * Keeps a transcript of a recording beside those before it, and asks for it to be read. The file itself is kept as
 * it came; what was odd about it is told by line.
 * @throws AppError not-found | forbidden | unsupported | invalid (no times in it: `problems` has an example)
 */
export async function addTranscript(
  db: Knex,
  asking: Asking,
  recordingId: string,
  file: SentFile,
): Promise<TranscriptHead> {
  return db.transaction(async (trx) => {
    await findRecordingFor(trx, asking.who, recordingId, canKeepRecordings, { lock: true });
    refuseOtherFiles(file);
    const read = readCaptions(file.bytes, file.name);
    if (read.cues.length === 0) {
      throw new AppError(
        'invalid',
        `This file holds no words with times, so nothing was kept. Put the time before each paragraph, like “${EXAMPLE}”`,
        { problems: read.problems.slice(0, 20), example: EXAMPLE },
      );
    }
    const id = randomUUID();
    const { encoding, format, problems, sourceText } = read;
    await insertTranscript(
      trx,
      { id, recordingId, fileName: file.name, encoding, format, problems: [...problems], sourceText },
      read.cues,
    );
    await recordOnRecording(trx, asking, recordingId, { before: null, after: { transcript: file.name } });
    await haveRead(trx, id, recordingId, asking.now);
    return describeHead(trx, id);
  });
}

/**
 * A transcript that somebody may see and, with `may`, write to.
 * @throws AppError not-found, also where it may not be seen | forbidden
 */
export async function findTranscriptFor(
  db: Knex,
  who: Person,
  id: string,
  may: (who: Person, of: TranscriptRow) => boolean = canSeeRecording,
): Promise<TranscriptRow> {
  const transcript = await findTranscript(db, id);
  if (!transcript || !canSeeRecording(who, transcript)) throw new AppError('not-found');
  if (!may(who, transcript)) throw new AppError('forbidden');
  return transcript;
}

/**
 * A transcript with its file as it came.
 * @throws AppError not-found
 */
export async function readTranscriptOf(db: Knex, who: Person, id: string): Promise<Transcript> {
  const { recordingId } = await findTranscriptFor(db, who, id);
  return { ...(await describeHead(db, id)), recordingId, sourceText: await readSourceText(db, id) };
}

/**
 * The captions of a transcript, in order.
 * @throws AppError not-found
 */
export async function readCues(db: Knex, who: Person, transcriptId: string): Promise<CueList> {
  const { recordingId } = await findTranscriptFor(db, who, transcriptId);
  return { transcriptId, recordingId, cues: await listCues(db, transcriptId) };
}

/**
 * Reads a transcript anew, after corrections or a failure, or in other terms than were inferred. What was read before
 * stays.
 * @throws AppError not-found | forbidden
 */
export async function readAgain(
  db: Knex,
  asking: Asking,
  transcriptId: string,
  { terms }: ReadingAsk = {},
): Promise<TranscriptHead> {
  return db.transaction(async (trx) => {
    const { recordingId } = await findTranscriptFor(trx, asking.who, transcriptId, canKeepRecordings);
    if (terms !== undefined) {
      const before = { spokenTerms: await findSpokenTerms(trx, recordingId) };
      await setSpokenTerms(trx, recordingId, terms);
      await recordOnRecording(trx, asking, recordingId, { before, after: { spokenTerms: terms } });
    }
    await haveRead(trx, transcriptId, recordingId, asking.now);
    return describeHead(trx, transcriptId);
  });
}

/**
 * Corrects what a caption says, if nobody saved it since `version`; null takes the correction back. What the file
 * said is kept beside it.
 * @throws AppError not-found | stale-version (with the present caption)
 */
export async function correctCue(
  db: Knex,
  asking: Asking,
  at: { readonly id: string; readonly version: number },
  corrected: string | null,
): Promise<Cue> {
  return db.transaction(async (trx) => {
    const cue = await findCue(trx, at.id);
    if (!cue) throw new AppError('not-found');
    const { recordingId } = await findTranscriptFor(trx, asking.who, cue.transcriptId, canCorrectCaptions);
    if (cue.version !== at.version) {
      const present = Cue.parse(cue);
      throw new AppError('stale-version', 'Somebody corrected this caption after you read it.', { present });
    }
    const wanted = corrected === cue.heard ? null : corrected;
    if (wanted === cue.corrected) return cue;
    const caption = { cueId: cue.id, ordinal: cue.ordinal };
    await recordOnRecording(trx, asking, recordingId, {
      before: { caption: { ...caption, corrected: cue.corrected } },
      after: { caption: { ...caption, corrected: wanted } },
    });
    return updateCue(trx, cue, wanted);
  });
}
