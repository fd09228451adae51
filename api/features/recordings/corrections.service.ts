import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { placeCorrections, type PlacedCorrection } from '#crochet';
import type { CaptionCorrections, CorrectionsTake } from '#contract/readings';
import type { Cue } from '#contract/recordings';
import type { Person } from '../../http/session.ts';
import type { Asking } from '../patterns/deed.service.ts';
import { listNewestReadings } from './readings.store.ts';
import { recordOnRecording } from './recording-changes.ts';
import { canCorrectCaptions } from './recordings.policy.ts';
import { findTranscriptFor } from './transcripts.service.ts';
import { listCues, lockCues, updateCue, type TranscriptRow } from './transcripts.store.ts';

const keyOf = ({ firstWord, lastWord }: PlacedCorrection) => `${firstWord}-${lastWord}`;

/** Mis-hearings in the captions as they stand; one that no caption could take is left out. */
async function place(db: Knex, transcriptId: string, cues: readonly Cue[]): Promise<PlacedCorrection[]> {
  const [reading] = await listNewestReadings(db, [transcriptId]);
  const placed = placeCorrections(cues, reading?.draft.corrections ?? []);
  return placed.filter(({ isTaken, changes }) => isTaken || changes.length > 0);
}

async function tell(
  db: Knex,
  who: Person,
  transcript: TranscriptRow,
  was: CaptionCorrections['was'] = [],
): Promise<CaptionCorrections> {
  const cues = await listCues(db, transcript.id);
  const corrections = (await place(db, transcript.id, cues)).map((one) => ({
    key: keyOf(one),
    cueId: cues[one.cue]!.id,
    atMs: Math.round(one.atMs),
    heard: one.heard,
    meant: one.meant,
    before: one.before,
    after: one.after,
    isTaken: one.isTaken,
  }));
  return { transcriptId: transcript.id, mayTake: canCorrectCaptions(who, transcript), corrections, was };
}

/**
 * Trade words that were mis-heard, each where it stands in the captions, and whether it is put right by now.
 * @throws AppError not-found
 */
export async function listCorrections(db: Knex, who: Person, transcriptId: string): Promise<CaptionCorrections> {
  return tell(db, who, await findTranscriptFor(db, who, transcriptId));
}

/** What captions shall say, by their ids. */
type Wanted = ReadonlyMap<string, string | null>;

async function write(
  trx: Knex.Transaction,
  asking: Asking,
  { recordingId }: TranscriptRow,
  cues: readonly Cue[],
  wanted: Wanted,
) {
  const deedId = asking.deedId ?? randomUUID();
  for (const cue of cues) {
    const said = wanted.get(cue.id);
    const corrected = said === cue.heard ? null : said;
    if (corrected === undefined || corrected === cue.corrected) continue;
    const caption = { cueId: cue.id, ordinal: cue.ordinal };
    await recordOnRecording(trx, { who: asking.who, now: asking.now, deedId }, recordingId, {
      before: { caption: { ...caption, corrected: cue.corrected } },
      after: { caption: { ...caption, corrected } },
    });
    await updateCue(trx, cue, corrected);
  }
}

/** Takes corrections one after the other: two in one caption both get in. */
async function wordsWith(
  trx: Knex,
  transcriptId: string,
  cues: readonly Cue[],
  keys: readonly string[],
): Promise<Wanted> {
  const asked = new Set(keys);
  const wanted = new Map<string, string | null>();
  let now = [...cues];
  let open = (await place(trx, transcriptId, now)).filter((one) => asked.has(keyOf(one)) && !one.isTaken);
  while (open.length > 0) {
    const touched = new Set<number>();
    for (const { changes } of open) {
      if (changes.some(({ cue }) => touched.has(cue))) continue;
      for (const { cue, text } of changes) {
        touched.add(cue);
        wanted.set(now[cue]!.id, text);
      }
    }
    now = now.map((cue) => (wanted.has(cue.id) ? { ...cue, corrected: wanted.get(cue.id)! } : cue));
    const left = placeCorrections(now, open).filter(({ isTaken, changes }) => !isTaken && changes.length > 0);
    // Each round takes the first of every caption, so that it ends; a word that stays as it is would be asked for ever.
    open = left.length < open.length ? left : [];
  }
  return wanted;
}

/**
 * Writes what was meant into the captions, for some mis-hearings or all, or puts captions back as they were. What the
 * file said is kept beside them.
 * @throws AppError not-found | forbidden
 */
export async function takeCorrections(
  db: Knex,
  asking: Asking,
  transcriptId: string,
  asked: CorrectionsTake,
): Promise<CaptionCorrections> {
  return db.transaction(async (trx) => {
    const transcript = await findTranscriptFor(trx, asking.who, transcriptId, canCorrectCaptions);
    const cues = await lockCues(trx, transcriptId);
    const wanted: Wanted = asked.take
      ? await wordsWith(trx, transcriptId, cues, asked.take)
      : new Map(asked.putBack?.map(({ cueId, corrected }) => [cueId, corrected]));
    await write(trx, asking, transcript, cues, wanted);
    const was = cues.flatMap(({ id, corrected }) => (wanted.has(id) ? [{ cueId: id, corrected }] : []));
    return tell(trx, asking.who, transcript, was);
  });
}
