import { z } from 'zod';
import { LeftCheck } from './checks.ts';
import { Caution, Details, Material, Note, SpecialStitch } from './pattern-details.ts';
import { Evidence, Line, Mark, Piece, Terms } from './rows.ts';

/** A pattern as the bench holds it. Its rows are in rows.ts and pattern-details.ts, the shelf in shelf.ts. */

export const PatternState = z.enum(['reading', 'drafting', 'in-proof', 'published']);
export type PatternState = z.infer<typeof PatternState>;
export const Visibility = z.enum(['private', 'unlisted', 'listed']);

export const PatternRecording = z.object({
  id: z.uuid(),
  /** Printed in addresses (`?r=2&t=90`); never given twice in a pattern. */
  number: z.int().positive(),
  title: z.string(),
  /** Null while there is none; `url` only of a whole clip. */
  clip: z
    .object({ state: z.enum(['arriving', 'ready']), url: z.string().nullable(), type: z.string(), bytes: z.number() })
    .nullable(),
  publicUrl: z.string().nullable(),
  publicOffsetMs: z.int(),
  durationMs: z.int().nullable(),
  /** Terms it is spoken in, where a person said so. */
  spokenTerms: Terms.nullable(),
  /** The newest transcript, if there is one. */
  transcriptId: z.uuid().nullable(),
  version: z.int().positive(),
});
export type PatternRecording = z.infer<typeof PatternRecording>;

/** The pattern's own row, without what belongs to it. */
export const PatternHead = z.object({
  id: z.uuid(),
  studioId: z.uuid(),
  code: z.string(),
  title: z.string(),
  state: PatternState,
  visibility: Visibility,
  terms: Terms,
  sizes: z.array(z.string()),
  details: Details,
  touchedAt: z.iso.datetime(),
  archivedAt: z.iso.datetime().nullable(),
  binnedAt: z.iso.datetime().nullable(),
  version: z.int().positive(),
});
export type PatternHead = z.infer<typeof PatternHead>;

/** The bench document: everything of a pattern, every list in its order (lines by piece, then place). */
export const Pattern = PatternHead.extend({
  studioName: z.string(),
  /** Who asked. */
  me: z.object({ id: z.uuid(), name: z.string() }),
  mayEdit: z.boolean(),
  /** May bin, archive and change who sees it. */
  mayManage: z.boolean(),
  /** Number of the newest change in it: grows with every save by anybody. */
  lastChange: z.int(),
  mayUndo: z.boolean(),
  mayRedo: z.boolean(),
  pieces: z.array(Piece),
  lines: z.array(Line),
  marks: z.array(Mark),
  evidence: z.array(Evidence),
  recordings: z.array(PatternRecording),
  materials: z.array(Material),
  cautions: z.array(Caution),
  notes: z.array(Note),
  specialStitches: z.array(SpecialStitch),
  leftChecks: z.array(LeftCheck),
});
export type Pattern = z.infer<typeof Pattern>;

const Title = z.string().trim().min(1, 'A pattern needs a title.').max(200);
const sizes = z.array(z.string().trim().min(1).max(40)).max(20);

/** Body of POST /api/patterns. `id` may be chosen by the caller: sent twice, it makes one pattern. */
export const PatternCreate = z.strictObject({
  id: z.uuid().optional(),
  studioId: z.uuid(),
  title: Title,
  terms: Terms.optional(),
  sizes: sizes.optional(),
});
export type PatternCreate = z.infer<typeof PatternCreate>;

/** Body of PATCH /api/patterns/:patternId. `details` holds only the parts that change. */
export const PatternEdit = z
  .strictObject({
    title: Title,
    visibility: Visibility,
    terms: Terms,
    sizes,
    details: z.strictObject(
      Object.fromEntries(Object.entries(Details.shape).map(([key, field]) => [key, field.unwrap().optional()])) as {
        [K in keyof typeof Details.shape]: z.ZodOptional<ReturnType<(typeof Details.shape)[K]['unwrap']>>;
      },
    ),
  })
  .partial()
  .refine((edit) => Object.keys(edit).length > 0, 'Nothing to change was given.');
export type PatternEdit = z.infer<typeof PatternEdit>;

/** Body of POST /api/patterns/:patternId/state. Publishing has a door of its own. */
export const PatternStateChange = z.strictObject({ state: z.enum(['drafting', 'in-proof']) });
