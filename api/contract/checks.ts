import { z } from 'zod';
import { CHECK_KINDS, type CheckSource } from '#crochet';
import type { Counted } from './pattern-input.ts';
import { toPatternInput } from './pattern-input.ts';
import type { Caution, Details, Material, Note } from './pattern-details.ts';
import type { Line, Mark } from './rows.ts';

/** The automatic checks: those that were left as they are, and the list as the server reads it. */

const CheckKind = z.enum(CHECK_KINDS);
const subject = z.string().max(200);
const says = z.string().regex(/^[0-9a-f]{16}$/, 'What a check says is told by 16 hexadecimal digits.');
const reason = z.string().trim().min(1, 'Say in a few words why it stays.').max(500);

/** A check that somebody left as it is, with the reason. It is open again once it says something else. */
export const LeftCheck = z.object({
  id: z.uuid(),
  kind: CheckKind,
  subject: z.string(),
  says: z.string(),
  reason: z.string(),
  version: z.int().positive(),
});
export type LeftCheck = z.infer<typeof LeftCheck>;

/** Body of POST /api/patterns/:patternId/left-checks: `kind`, `subject` and `says` as the check has them. */
export const LeftCheckCreate = z.strictObject({
  kind: CheckKind,
  subject: subject.default(''),
  says,
  reason,
  id: z.uuid().optional(),
});
export type LeftCheckCreate = z.input<typeof LeftCheckCreate>;
export const LeftCheckEdit = z
  .strictObject({ says, reason })
  .partial()
  .refine((edit) => Object.keys(edit).length > 0, 'Nothing to change was given.');
export type LeftCheckEdit = z.infer<typeof LeftCheckEdit>;

/** A check in words; `refs` are the lines and pieces it is about. */
export const CheckAnswer = z.object({
  kind: CheckKind,
  subject: z.string(),
  isAdvice: z.boolean(),
  refs: z.array(z.object({ lineId: z.string().nullable(), pieceId: z.string().nullable(), name: z.string() })),
  sentence: z.string(),
  says: z.string(),
  /** Why it was left; null for one that is open. */
  leftBecause: z.string().nullable(),
});
export type CheckAnswer = z.infer<typeof CheckAnswer>;

/** Answer of GET /api/patterns/:patternId/checks, worst first: what is open, what was left, and what is advice alone. */
export const CheckList = z.object({
  open: z.array(CheckAnswer),
  left: z.array(CheckAnswer),
  advice: z.array(CheckAnswer),
});
export type CheckList = z.infer<typeof CheckList>;

/** The part of a pattern that the checks look at. */
interface Checkable extends Omit<Counted, 'lines'> {
  readonly title: string;
  readonly lines: readonly Line[];
  readonly details: Details;
  readonly materials: readonly Material[];
  readonly notes: readonly Note[];
  readonly cautions: readonly Caution[];
  readonly marks: readonly Mark[];
  readonly recordings: readonly { readonly id: string; readonly title: string; readonly durationMs: number | null }[];
}

/** What the checks read of a pattern. Server and browser ask it the same way, so that they find the same. */
export function toCheckSource(pattern: Checkable): CheckSource {
  const input = toPatternInput(pattern);
  const lines = new Map(pattern.lines.map((line) => [line.id, line]));
  return {
    ...input,
    title: pattern.title,
    details: pattern.details,
    pieces: input.pieces.map((piece) => ({
      ...piece,
      lines: piece.lines.map((line) => {
        const { note = '', filmed = true, putAsideReason = null } = lines.get(line.id) ?? {};
        return { ...line, note, filmed, putAsideReason };
      }),
    })),
    materials: pattern.materials,
    notes: pattern.notes,
    cautions: pattern.cautions,
    marks: pattern.marks,
    recordings: pattern.recordings,
  };
}
