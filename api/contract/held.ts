import { z } from 'zod';
import { type Evidence, LineKind, Terms, Totals, Verdict } from './rows.ts';

/** A written pattern held against a recording of it, and the moments of a recording that was cut anew. */

/** A line as it is written, or as it was said, with what the count makes of it. */
export const HeldSide = z.object({
  text: z.string(),
  total: Totals.nullable(),
  count: z.int().nullable(),
  verdict: Verdict,
});
export type HeldSide = z.infer<typeof HeldSide>;

/** How a line fared: said as it is written, said otherwise, never said, said but not written, meant to be not filmed. */
export const HeldState = z.enum(['as-written', 'differently', 'never-said', 'not-written', 'not-filmed']);
export type HeldState = z.infer<typeof HeldState>;

export const HeldLine = z.object({
  /** Null for what is not written. */
  lineId: z.uuid().nullable(),
  /** Version of the written line; 0 for what is not written. */
  version: z.int(),
  kind: LineKind,
  /** "R9", "Rows 2–5"; empty for a step. */
  name: z.string(),
  state: HeldState,
  /** What was said otherwise than it is written. */
  unlike: z.array(z.enum(['instruction', 'total', 'number'])),
  written: HeldSide.nullable(),
  said: HeldSide.extend({
    /** Names it in its reading: "0.4". */
    key: z.string(),
    name: z.string(),
    atMs: z.int(),
    /** The words themselves. */
    words: z.string(),
  }).nullable(),
  /** Its moment in this recording; null while it has none. */
  markMs: z.int().nullable(),
  /** The words that were said for it by this reading are its evidence already. */
  isTaken: z.boolean(),
});
export type HeldLine = z.infer<typeof HeldLine>;

export const HeldPiece = z.object({
  /** Null for a piece that is not written. */
  pieceId: z.uuid().nullable(),
  name: z.string(),
  make: z.int().positive(),
  /** The name that was said, where it is another. */
  saidName: z.string().nullable(),
  /** Recordings in which lines of it have moments, by their numbers. */
  recordings: z.array(z.int()),
  lines: z.array(HeldLine),
});
export type HeldPiece = z.infer<typeof HeldPiece>;

/** Answer of GET /api/patterns/:patternId/recordings/:recordingId/held. */
export const HeldAgainst = z.object({
  recordingId: z.uuid(),
  /** Null while nothing of the recording has been read. */
  readingId: z.uuid().nullable(),
  /** Terms that the pattern is written in, and that the recording speaks. */
  terms: Terms,
  spokenTerms: Terms.nullable(),
  /** The pattern's newest change when this was told; taking sends it back. */
  lastChange: z.int(),
  mayTake: z.boolean(),
  pieces: z.array(HeldPiece),
});
export type HeldAgainst = z.infer<typeof HeldAgainst>;

/** Body of POST …/held: moments, words and said totals of these lines, or of all. Nothing that is written changes. */
export const HeldTake = z.strictObject({
  lastChange: z.int().min(0),
  lineIds: z.array(z.uuid()).max(20_000).optional(),
});
export type HeldTake = z.infer<typeof HeldTake>;

/** Answer of POST …/held and …/cut: how many lines or moments it was. */
export const Followed = z.object({ deedId: z.uuid(), taken: z.int() });
export type Followed = z.infer<typeof Followed>;

const ms = z.int().min(-86_400_000).max(86_400_000);

/** A part of a recording that is still in its new cut, in times of the recording as it was. */
export const Shift = z.object({ fromMs: z.int(), toMs: z.int(), byMs: ms, words: z.int(), isCutAfter: z.boolean() });
export type Shift = z.infer<typeof Shift>;

/** A moment set by an earlier transcript, and where its words stand now; null: they were cut out. */
export const ShiftedMoment = z.object({
  markId: z.uuid(),
  lineId: z.uuid().nullable(),
  name: z.string(),
  isMs: z.int(),
  wouldMs: z.int().nullable(),
});
export type ShiftedMoment = z.infer<typeof ShiftedMoment>;

/** Answer of GET /api/patterns/:patternId/recordings/:recordingId/cut. */
export const NewCut = z.object({
  recordingId: z.uuid(),
  /** Every moment in it, also those that stand by the newest words. */
  moments: z.int(),
  lastMs: z.int(),
  /** By each earlier transcript that moments still stand by. */
  parts: z.array(
    z.object({
      transcriptId: z.uuid(),
      fileName: z.string(),
      /** Share of its words that are in the newest transcript, from 0 to 1. */
      found: z.number(),
      shifts: z.array(Shift),
      moments: z.array(ShiftedMoment),
    }),
  ),
  newestFileName: z.string().nullable(),
  newestTranscriptId: z.uuid().nullable(),
  lastChange: z.int(),
  mayTake: z.boolean(),
});
export type NewCut = z.infer<typeof NewCut>;

/**
 * Body of POST …/cut. `words`: each moment goes where its words went, and those that were cut out are taken away if
 * asked; `hand`: all moments from one on move by as much; `stand`: they are right as they are.
 */
export const CutTake = z.discriminatedUnion('how', [
  z.strictObject({ how: z.literal('words'), lastChange: z.int().min(0), removeCutOut: z.boolean() }),
  z.strictObject({
    how: z.literal('hand'),
    lastChange: z.int().min(0),
    byMs: ms,
    fromMs: z.int().min(0).max(86_400_000),
  }),
  z.strictObject({ how: z.literal('stand'), lastChange: z.int().min(0) }),
]);
export type CutTake = z.infer<typeof CutTake>;

/** Words of a drafted line as they were spoken, in order. */
export const SPOKEN_ROLES: readonly z.infer<typeof Evidence>['role'][] = ['announcement', 'work', 'unread', 'total'];
