import { z } from 'zod';
import { Terms, Verdict, Worked } from './rows.ts';

/** Recordings of a pattern with their transcripts and readings; a clip's way up is in uploads.ts. */

const version = z.int().positive();
const atMs = z.int().min(0).max(2_147_483_647);

/** Five megabytes: what a transcript may weigh. */
export const TRANSCRIPT_BYTES = 5_000_000;
/** Endings by which a transcript is known. */
export const TRANSCRIPT_ENDINGS = ['.srt', '.vtt', '.txt', '.md'] as const;

/** An address on the web where a recording stands; it is linked to and never fetched. */
export const PublicUrl = z
  .string()
  .trim()
  .max(2_000)
  .refine((text) => {
    const url = URL.parse(text);
    return (
      url !== null &&
      (url.protocol === 'https:' || url.protocol === 'http:') &&
      url.username === '' &&
      url.password === ''
    );
  }, 'An address begins with https:// or http:// and holds no password.');

/** Something found in a transcript's file, and what was done about it. Lines count from 1. */
export const TranscriptProblem = z.object({ line: z.int(), what: z.string(), done: z.string() });
export type TranscriptProblem = z.infer<typeof TranscriptProblem>;

export const TranscriptFormat = z.enum(['srt', 'vtt', 'text']);

export const ReadingPiece = z.object({
  name: z.string(),
  make: z.int().positive(),
  worked: Worked,
  lines: z.int(),
  /** Rounds and rows, each one of a range counted. */
  rounds: z.int(),
  /** Stitches of each round or row in order, as far as they could be counted; for its print. */
  totals: z.array(z.int()),
  /** Each line that is counted, for its ring map: a figure a round, null where it could not be counted. */
  rings: z.array(z.object({ label: z.string(), counts: z.array(z.int().nullable()), verdict: Verdict })),
});
export type ReadingPiece = z.infer<typeof ReadingPiece>;

/** What a reading made of a transcript, in figures. */
export const ReadingSummary = z.object({
  id: z.uuid(),
  terms: Terms,
  termsReason: z.string(),
  pieces: z.array(ReadingPiece),
  /** Lines by verdict; steps and foundations have none. */
  verdicts: z.record(Verdict, z.int()),
  /** Lines that wait for a look: differing, not fitting, not understood or without a total. */
  toLook: z.int(),
  unread: z.array(z.object({ quote: z.string(), atMs: z.int() })),
  /** What was said of materials and cautions, and where another recording was pointed to. */
  suggestions: z.array(
    z.object({
      kind: z.enum(['hook', 'yarn', 'notion', 'caution', 'technique', 'gauge']),
      text: z.string(),
      atMs: z.int(),
    }),
  ),
  /** Trade words that were mis-heard, whether put right in the captions by now or not. */
  corrections: z.int(),
  /** Set where nothing could be drafted, with the reason. */
  notice: z.string().nullable(),
  /** Whether lines of the pattern come from it. */
  taken: z.boolean(),
});
export type ReadingSummary = z.infer<typeof ReadingSummary>;

export const TranscriptHead = z.object({
  id: z.uuid(),
  number: z.int().positive(),
  fileName: z.string(),
  format: TranscriptFormat,
  encoding: z.string(),
  captions: z.int(),
  lastMs: z.int().nullable(),
  problems: z.array(TranscriptProblem),
  reading: z.object({ state: z.enum(['waiting', 'done', 'failed']), summary: ReadingSummary.nullable() }),
});
export type TranscriptHead = z.infer<typeof TranscriptHead>;

export const UploadState = z.enum(['arriving', 'completing', 'ready', 'refused', 'given-up']);
export type UploadState = z.infer<typeof UploadState>;

/** A clip on its way up; `haveBytes` is what has safely arrived. */
export const Upload = z.object({
  id: z.uuid(),
  recordingId: z.uuid(),
  name: z.string(),
  size: z.int(),
  state: UploadState,
  /** Why the clip was not taken, in a sentence. */
  refusal: z.string().nullable(),
  partSize: z.int(),
  have: z.array(z.int()),
  haveBytes: z.int(),
  touchedAt: z.iso.datetime(),
});
export type Upload = z.infer<typeof Upload>;

export const Recording = z.object({
  id: z.uuid(),
  /** Printed in addresses; never given twice in a pattern. */
  number: z.int().positive(),
  orderKey: z.string(),
  title: z.string(),
  publicUrl: z.string().nullable(),
  publicOffsetMs: z.int(),
  durationMs: z.int().nullable(),
  codec: z.string().nullable(),
  /** Only of a whole clip. */
  clip: z.object({ url: z.string(), type: z.string(), bytes: z.int() }).nullable(),
  /** The newest clip on its way up or refused; null once it is whole. */
  upload: Upload.nullable(),
  transcript: TranscriptHead.nullable(),
  version,
});
export type Recording = z.infer<typeof Recording>;

/** Answer of GET /api/patterns/:patternId/recordings, in their order. */
export const RecordingList = z.object({
  recordings: z.array(Recording),
  mayEdit: z.boolean(),
  storage: z.object({ quotaBytes: z.int(), usedBytes: z.int() }),
});
export type RecordingList = z.infer<typeof RecordingList>;

const Title = z.string().trim().min(1, 'A recording needs a name.').max(200);

/** Body of POST /api/patterns/:patternId/recordings. `id` may be chosen by the caller: sent twice, it makes one. */
export const RecordingCreate = z.strictObject({
  id: z.uuid().optional(),
  title: Title,
  publicUrl: PublicUrl.nullable().optional(),
  publicOffsetMs: atMs.optional(),
});
export type RecordingCreate = z.infer<typeof RecordingCreate>;

/** Body of PATCH /api/patterns/:patternId/recordings/:recordingId. `after`: as in rows.ts. */
export const RecordingEdit = z
  .strictObject({
    title: Title,
    publicUrl: PublicUrl.nullable(),
    publicOffsetMs: atMs,
    after: z.uuid().nullable(),
  })
  .partial()
  .refine((edit) => Object.keys(edit).length > 0, 'Nothing to change was given.');
export type RecordingEdit = z.infer<typeof RecordingEdit>;

/** Answer of GET /api/transcripts/:transcriptId: the file as it came, for "as it was" beside "as we read it". */
export const Transcript = TranscriptHead.extend({ recordingId: z.uuid(), sourceText: z.string() });
export type Transcript = z.infer<typeof Transcript>;

/** A caption. `heard` is what the file said and is never changed; `corrected` is what a person made of it. */
export const Cue = z.object({
  id: z.uuid(),
  ordinal: z.int().positive(),
  startMs: z.int(),
  endMs: z.int(),
  heard: z.string(),
  corrected: z.string().nullable(),
  version,
});
export type Cue = z.infer<typeof Cue>;

/** Answer of GET /api/transcripts/:transcriptId/cues. */
export const CueList = z.object({ transcriptId: z.uuid(), recordingId: z.uuid(), cues: z.array(Cue) });
export type CueList = z.infer<typeof CueList>;

/** Body of PATCH /api/cues/:cueId; null takes the correction back. */
export const CueEdit = z.strictObject({ corrected: z.string().trim().min(1).max(2_000).nullable() });
export type CueEdit = z.infer<typeof CueEdit>;

/** Answer of POST /api/patterns/:patternId/readings/:readingId/take. */
export const ReadingTaken = z.object({ pieces: z.int(), lines: z.int() });
export type ReadingTaken = z.infer<typeof ReadingTaken>;
