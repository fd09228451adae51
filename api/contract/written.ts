import { z } from 'zod';
import { MaterialKind } from './pattern-details.ts';
import { LineKind, Terms, Worked } from './rows.ts';

/** A written pattern that comes in whole, told apart and confirmed in the browser. */

/** So many lines, steps and notes of lines are taken at once. */
export const MOST_WRITTEN_LINES = 3_000;
const roundNo = z.int().min(0).max(9_999).nullable();

export const WrittenLine = z.strictObject({
  kind: LineKind,
  label: z.string().trim().max(60),
  from: roundNo,
  to: roundNo,
  /** The instruction as written, with its total where it stands in it. */
  text: z.string().trim().min(1).max(4_000),
});
export type WrittenLine = z.infer<typeof WrittenLine>;

export const WrittenPiece = z.strictObject({
  name: z.string().trim().min(1).max(120),
  make: z.int().min(1).max(999),
  worked: Worked,
  lines: z.array(WrittenLine).max(MOST_WRITTEN_LINES),
});
export type WrittenPiece = z.infer<typeof WrittenPiece>;

/** Body of POST /api/patterns/written. The caller chooses `id`: sent twice, it makes one pattern. */
export const WrittenPattern = z
  .strictObject({
    id: z.uuid(),
    studioId: z.uuid(),
    title: z.string().trim().min(1, 'A pattern needs a title.').max(200),
    terms: Terms,
    sizes: z.array(z.string().trim().min(1).max(40)).max(20),
    pieces: z.array(WrittenPiece).min(1, 'There is no piece in it.').max(200),
    materials: z.array(z.strictObject({ kind: MaterialKind, name: z.string().trim().min(1).max(200) })).max(200),
    notes: z.array(z.string().trim().min(1).max(2_000)).max(1_000),
    specialStitches: z
      .array(
        z.strictObject({
          name: z.string().trim().min(1).max(120),
          abbreviation: z.string().trim().max(30),
          text: z.string().trim().min(1).max(2_000),
        }),
      )
      .max(100),
  })
  .refine((pattern) => pattern.pieces.reduce((sum, piece) => sum + piece.lines.length, 0) <= MOST_WRITTEN_LINES, {
    message: 'At most 3,000 lines come in at once.',
    path: ['pieces'],
  });
export type WrittenPattern = z.infer<typeof WrittenPattern>;
