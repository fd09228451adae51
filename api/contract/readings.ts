import { z } from 'zod';
import { LineKind, Terms, Totals, Verdict, Worked } from './rows.ts';

/** A reading held against its pattern, what is taken of it, and words of a transcript that a person chose. */

const wordNo = z.int().min(0).max(10_000_000);

/** A line as it stands, or as the reading has it, counted among its neighbours. */
export const ComparedSide = z.object({
  label: z.string(),
  kind: LineKind,
  text: z.string(),
  said: Totals.nullable(),
  written: Totals.nullable(),
  count: z.int().nullable(),
  verdict: Verdict,
});
export type ComparedSide = z.infer<typeof ComparedSide>;

export const LineDifference = z.object({
  /** Names it when it is taken. */
  key: z.string(),
  /** `gone`: heard before and no longer found; `taken-away`: somebody deleted it, and it is heard again. */
  change: z.enum(['changed', 'new', 'gone', 'taken-away']),
  lineId: z.uuid().nullable(),
  /** A person wrote what would change: it is never taken unasked. */
  touched: z.boolean(),
  is: ComparedSide.nullable(),
  would: ComparedSide.nullable(),
  /** Where the reading hears it; null for what is gone. */
  atMs: z.int().nullable(),
});
export type LineDifference = z.infer<typeof LineDifference>;

export const PieceDifference = z.object({
  /** Place in the reading; names it when it is taken. */
  index: z.int(),
  name: z.string(),
  make: z.int().positive(),
  worked: Worked,
  /** The piece of the pattern that it is; null where the pattern has none. */
  piece: z.object({ id: z.uuid(), name: z.string(), version: z.int() }).nullable(),
  /** Lines that stand as they were heard. */
  same: z.int(),
  lines: z.array(LineDifference),
});
export type PieceDifference = z.infer<typeof PieceDifference>;

/** A moment that a person set by the words of another transcript, and where these words stand now; null: they do not. */
export const MovedMoment = z.object({
  markId: z.uuid(),
  lineId: z.uuid().nullable(),
  isMs: z.int(),
  wouldMs: z.int().nullable(),
});

/** Answer of GET /api/patterns/:patternId/readings/:readingId/differences. */
export const ReadingDifferences = z.object({
  readingId: z.uuid(),
  transcriptId: z.uuid(),
  recordingId: z.uuid(),
  recordingTitle: z.string(),
  /** The pattern's newest change when this was told; taking sends it back. */
  lastChange: z.int(),
  mayTake: z.boolean(),
  pieces: z.array(PieceDifference),
  gone: z.array(LineDifference.extend({ pieceName: z.string() })),
  moments: z.array(MovedMoment),
});
export type ReadingDifferences = z.infer<typeof ReadingDifferences>;

/**
 * Body of POST /api/patterns/:patternId/readings/:readingId/take; one step for undo. Empty: all that is new and nothing
 * that a person wrote. With `lastChange` it is refused (412) where the pattern has changed since the differences were told.
 */
export const ReadingTake = z.strictObject({
  lastChange: z.int().min(0).optional(),
  /** Only these pieces of the reading. */
  pieces: z.array(z.int().min(0)).max(1_000).optional(),
  /** Exactly these differences by key, whoever wrote what they change. */
  lines: z.array(z.string().max(60)).max(20_000).optional(),
  /** False: moments that people set stay where they are. */
  moments: z.boolean().optional(),
  /** Materials and cautions; they come along where neither pieces nor lines were chosen. */
  suggestions: z.boolean().optional(),
});
export type ReadingTake = z.infer<typeof ReadingTake>;

/** Body of POST /api/transcripts/:transcriptId/readings. `terms` overrules what is inferred; null infers again. */
export const ReadingAsk = z.strictObject({ terms: Terms.nullable().optional() });
export type ReadingAsk = z.infer<typeof ReadingAsk>;

/** What chosen words become. */
export const WordsUse = z.enum(['line', 'again', 'total', 'step', 'note', 'material']);
export type WordsUse = z.infer<typeof WordsUse>;

/** Body of POST /api/patterns/:patternId/heard-words: words of a transcript that a person chose, by their numbers. */
export const HeardWords = z
  .strictObject({
    transcriptId: z.uuid(),
    firstWord: wordNo,
    lastWord: wordNo,
    as: WordsUse,
    /** The line that is read again, or given the total. */
    lineId: z.uuid().optional(),
  })
  .refine((words) => words.lastWord >= words.firstWord && words.lastWord - words.firstWord < 2_000, {
    message: 'At most 2,000 words, the first before the last.',
    path: ['lastWord'],
  })
  .refine(({ as, lineId }) => lineId !== undefined || (as !== 'again' && as !== 'total'), {
    message: 'Which line is it of?',
    path: ['lineId'],
  });
export type HeardWords = z.infer<typeof HeardWords>;

/** What was made or changed: a line, or a material. */
export const WordsUsed = z.object({ as: WordsUse, id: z.uuid(), text: z.string() });
export type WordsUsed = z.infer<typeof WordsUsed>;

/** A trade word that was mis-heard, where it stands in the captions. */
export const CaptionCorrection = z.object({
  /** Names it when it is taken: its words' numbers. */
  key: z.string(),
  cueId: z.uuid(),
  atMs: z.int(),
  heard: z.string(),
  meant: z.string(),
  before: z.string(),
  after: z.string(),
  isTaken: z.boolean(),
});
export type CaptionCorrection = z.infer<typeof CaptionCorrection>;

/** Answer of GET and POST /api/transcripts/:transcriptId/corrections. */
export const CaptionCorrections = z.object({
  transcriptId: z.uuid(),
  mayTake: z.boolean(),
  corrections: z.array(CaptionCorrection),
  /** After taking: what the captions said before, to put back. */
  was: z.array(z.object({ cueId: z.uuid(), corrected: z.string().nullable() })),
});
export type CaptionCorrections = z.infer<typeof CaptionCorrections>;

/** Body of POST /api/transcripts/:transcriptId/corrections: take some by key, or put captions back as they were. */
export const CorrectionsTake = z
  .strictObject({
    take: z.array(z.string().max(40)).max(10_000).optional(),
    putBack: z
      .array(z.strictObject({ cueId: z.uuid(), corrected: z.string().max(2_000).nullable() }))
      .max(10_000)
      .optional(),
  })
  .refine(({ take, putBack }) => (take === undefined) !== (putBack === undefined), 'Either take or put back.');
export type CorrectionsTake = z.infer<typeof CorrectionsTake>;
