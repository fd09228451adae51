import { z } from 'zod';
import { CheckAnswer } from './checks.ts';
import { Visibility } from './patterns.ts';
import { LineKind, Terms, Verdict, Worked } from './rows.ts';

/** Editions: what goes out, what holds one back, and the document everybody with the link may see. */

const BothTerms = z.object({ US: z.string(), UK: z.string() });
const Figures = z.record(z.string(), z.array(z.number()));

export const Erratum = z.object({
  shortId: z.string().nullable(),
  place: z.string(),
  weight: z.enum(['correction', 'clearer', 'added', 'look']),
  was: z.string(),
  now: z.string(),
  why: z.string(),
});
export type Erratum = z.infer<typeof Erratum>;

export const PublicLine = z.object({
  shortId: z.string(),
  kind: LineKind,
  label: z.string(),
  from: z.number().nullable(),
  to: z.number().nullable(),
  text: BothTerms,
  note: BothTerms,
  totals: Figures.nullable(),
  total: BothTerms.nullable(),
  count: z.number().nullable(),
  each: z.boolean(),
  made: z.record(z.string(), z.number()),
  mark: z.object({ recordingNumber: z.number(), startMs: z.number(), endMs: z.number().nullable() }).nullable(),
  walk: z.array(z.object({ stitch: z.string(), on: z.array(z.number()), makes: z.number() })),
  rounds: z.array(z.object({ n: z.number(), count: z.number().nullable() })).nullable(),
  repeats: z.array(z.object({ stitches: z.number(), times: z.number(), makes: z.number(), rest: z.number() })),
  slips: z.array(z.object({ difference: z.number(), text: z.string() })),
});
export type PublicLine = z.infer<typeof PublicLine>;

export const PublicPiece = z.object({
  id: z.string(),
  name: z.string(),
  make: z.number(),
  worked: Worked,
  lines: z.array(PublicLine),
});
export type PublicPiece = z.infer<typeof PublicPiece>;

/**
 * The edition document as anybody with the link sees it. An allow-list: what is not named here does not leave, so
 * the studio's own part of a line (its id, what was said, why it was left as it is) stays behind.
 */
export const PublicEdition = z.object({
  schemaVersion: z.number(),
  engineVersion: z.string(),
  code: z.string(),
  title: z.string(),
  edition: z.number().nullable(),
  publishedAt: z.string().nullable(),
  studio: z.object({ name: z.string(), foot: z.string() }),
  maker: z.string(),
  checker: z.string(),
  terms: Terms,
  sizes: z.array(z.string()),
  details: z.object({
    introduction: z.string(),
    gauge: z.string(),
    finishedSize: z.string(),
    level: z.enum(['basic', 'easy', 'intermediate', 'complex']).nullable(),
    care: z.string(),
    permission: z.string(),
    contact: z.string(),
  }),
  materials: z.array(z.object({ kind: z.enum(['yarn', 'hook', 'notion', 'filling']), text: z.string() })),
  abbreviations: z.array(z.object({ abbreviation: BothTerms, name: BothTerms })),
  specialStitches: z.array(z.object({ name: z.string(), abbreviation: z.string(), text: BothTerms })),
  notes: z.array(BothTerms),
  cautions: z.array(z.object({ kind: z.string(), title: z.string(), text: z.string() })),
  deferral: z.string(),
  pieces: z.array(PublicPiece),
  recordings: z.array(
    z.object({
      number: z.number(),
      title: z.string(),
      durationMs: z.number().nullable(),
      publicUrl: z.string().nullable(),
      publicOffsetMs: z.number(),
      hasClip: z.boolean(),
    }),
  ),
  captions: z.array(
    z.object({ recordingNumber: z.number(), startMs: z.number(), endMs: z.number(), text: z.string() }),
  ),
  errata: z.array(Erratum),
});
export type PublicEdition = z.infer<typeof PublicEdition>;

export const Paper = z.enum(['A4', 'Letter']);
export type Paper = z.infer<typeof Paper>;
/** Query of every sheet's address; what is left out is the studio's paper and the pattern's own terms. */
export const SheetQuery = z.strictObject({ paper: Paper.optional(), terms: Terms.optional() });
export type SheetQuery = z.infer<typeof SheetQuery>;

/** A line that holds the next edition back. */
export const Block = z.object({
  lineId: z.uuid(),
  piece: z.string(),
  label: z.string(),
  verdict: Verdict,
  reason: z.enum(['empty', 'unread', 'differs', 'does-not-fit']),
  /** "Body, R9 is not understood." */
  sentence: z.string(),
});
export type Block = z.infer<typeof Block>;

/**
 * What the next edition would be. Its ETag is the number of the pattern's newest change: publishing sends it back,
 * so nobody publishes what they have not seen.
 */
export const PublishDesk = z.object({
  lastChange: z.int(),
  number: z.int().positive(),
  visibility: Visibility,
  mayPublish: z.boolean(),
  lines: z.int(),
  /** Rounds and rows: what can agree. Steps and notes cannot. */
  counted: z.int(),
  agreeing: z.int(),
  blocks: z.array(Block),
  /** What the automatic checks find and nobody has settled; none of it holds the edition back. */
  checks: z.array(CheckAnswer),
  /** Signs that none of the sheet's fonts has; they would be left out. */
  unprintable: z.array(z.string()),
  countsChanged: z.boolean(),
  /** Drafted from the difference to the edition before; empty for the first. */
  errata: z.array(Erratum),
  /** Paper of the studio. */
  paper: Paper,
});
export type PublishDesk = z.infer<typeof PublishDesk>;

/** Body of POST …/editions. `errata` settles drafted entries by their place in the list of the desk. */
export const Publish = z.strictObject({
  visibility: Visibility,
  errata: z
    .array(z.strictObject({ index: z.int().min(0), told: z.boolean(), why: z.string().trim().max(300).default('') }))
    .max(2_000)
    .default([]),
});
export type Publish = z.infer<typeof Publish>;

export const EditionFile = z.object({ paper: Paper, terms: Terms, bytes: z.int() });
export type EditionFile = z.infer<typeof EditionFile>;

export const Edition = z.object({
  number: z.int().positive(),
  publishedAt: z.iso.datetime(),
  publishedBy: z.string().nullable(),
  isCurrent: z.boolean(),
  withdrawnAt: z.iso.datetime().nullable(),
  withdrawnReason: z.string().nullable(),
  /** Path of its watch page. */
  path: z.string(),
  lines: z.int(),
  moments: z.int(),
  captions: z.int(),
  errata: z.array(Erratum),
  /** Sheets that are ready; two are made for each edition, a moment after it goes out. */
  files: z.array(EditionFile),
});
export type Edition = z.infer<typeof Edition>;

/** Every edition of a pattern, newest first. */
export const EditionList = z.object({
  code: z.string(),
  visibility: Visibility,
  /** The pattern's lasting address, whole. */
  address: z.string(),
  mayManage: z.boolean(),
  editions: z.array(Edition),
});
export type EditionList = z.infer<typeof EditionList>;

/** Body of PUT …/editions/:number/withdrawal. */
export const Withdrawal = z.strictObject({
  reason: z.string().trim().min(1, 'Say in a sentence why, for those who come with the sheet in hand.').max(500),
});
export type Withdrawal = z.infer<typeof Withdrawal>;
