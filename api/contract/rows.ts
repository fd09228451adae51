import { z } from 'zod';

/**
 * The rows a pattern is made of. Each has a `version`; a write to one carries it as `If-Match`, and may carry a
 * `Deed-Id` header (uuid), so that several writes count as one step for undo and history.
 * Places in an order are asked for by `after`: the id of the row it shall follow, null for the first place.
 */

/** Totals by kind, one figure a size: `{"sts":[24],"ch-2 sp":[4]}`; "sts" is a plain number. */
export const Totals = z
  .record(z.string().trim().min(1).max(40), z.array(z.int().min(0).max(1_000_000)).min(1).max(20))
  .refine((totals) => Object.keys(totals).length <= 12, 'At most twelve kinds.');
export type Totals = z.infer<typeof Totals>;

export const Terms = z.enum(['US', 'UK']);
export const LineKind = z.enum(['foundation', 'round', 'row', 'step', 'note']);
export const Worked = z.enum(['spiral', 'joined', 'rows']);
export const Verdict = z.enum(['agrees', 'differs', 'does-not-fit', 'unread', 'no-total']);

const OrderKey = z.string().min(1);
const version = z.int().positive();
const after = z.uuid().nullable();
const atMs = z.int().min(0).max(2_147_483_647);
const roundNo = z.int().min(0).max(9_999).nullable();
/** A body that changes nothing is a mistake of the caller, not a save. */
const notEmpty = (edit: object) => Object.keys(edit).length > 0;
const NOTHING = 'Nothing to change was given.';

export const Piece = z.object({
  id: z.uuid(),
  orderKey: OrderKey,
  name: z.string(),
  /** How many to make of it. */
  make: z.int().positive(),
  worked: Worked,
  startsOnLineId: z.uuid().nullable(),
  version,
});
export type Piece = z.infer<typeof Piece>;

const pieceFields = z.strictObject({
  name: z.string().trim().min(1).max(120),
  make: z.int().min(1).max(999),
  worked: Worked,
  startsOnLineId: z.uuid().nullable(),
  after,
});
export const PieceCreate = pieceFields.partial().required({ name: true }).extend({ id: z.uuid().optional() });
export type PieceCreate = z.infer<typeof PieceCreate>;
export const PieceEdit = pieceFields.partial().refine(notEmpty, NOTHING);
export type PieceEdit = z.infer<typeof PieceEdit>;

export const Line = z.object({
  id: z.uuid(),
  /** Printed in addresses for ever: lower case letters and digits without the ones that look alike. */
  shortId: z.string(),
  pieceId: z.uuid(),
  orderKey: OrderKey,
  kind: LineKind,
  label: z.string(),
  from: z.int().nullable(),
  to: z.int().nullable(),
  /** The instruction as typed; may hold its own total, "(24)". */
  text: z.string(),
  note: z.string(),
  /** A written total that does not stand in the text. */
  written: Totals.nullable(),
  /** The said total in force. */
  said: Totals.nullable(),
  /** The said total as the reading heard it, whatever `said` has become since. */
  heardTotal: Totals.nullable(),
  filmed: z.boolean(),
  putAsideReason: z.string().nullable(),
  /** What was meant, where the speaker made a slip that cannot be filmed again. */
  spokenSlip: z.string().nullable(),
  version,
});
export type Line = z.infer<typeof Line>;

const lineFields = z.strictObject({
  pieceId: z.uuid(),
  kind: LineKind,
  label: z.string().trim().max(60),
  from: roundNo,
  to: roundNo,
  text: z.string().max(4_000),
  note: z.string().max(2_000),
  written: Totals.nullable(),
  said: Totals.nullable(),
  filmed: z.boolean(),
  putAsideReason: z.string().trim().min(1).max(500).nullable(),
  spokenSlip: z.string().trim().min(1).max(500).nullable(),
  after,
});
export const LineCreate = lineFields
  .partial()
  .required({ pieceId: true, kind: true })
  .extend({ id: z.uuid().optional() });
export type LineCreate = z.infer<typeof LineCreate>;
export const LineEdit = lineFields.partial().refine(notEmpty, NOTHING);
export type LineEdit = z.infer<typeof LineEdit>;

export const Mark = z.object({
  id: z.uuid(),
  lineId: z.uuid().nullable(),
  recordingId: z.uuid(),
  startMs: z.int(),
  endMs: z.int().nullable(),
  /** The moment printed for the line; a line's other marks are "also here". */
  main: z.boolean(),
  title: z.string().nullable(),
  madeBy: z.enum(['reading', 'person']),
  version,
});
export type Mark = z.infer<typeof Mark>;

const markFields = z.strictObject({
  lineId: z.uuid().nullable(),
  recordingId: z.uuid(),
  startMs: atMs,
  endMs: atMs.nullable(),
  main: z.boolean(),
  title: z.string().trim().min(1).max(200).nullable(),
});
const ENDS_EARLY = 'A mark cannot end before it starts.';
const endsAfterStart = (m: { startMs?: number | undefined; endMs?: number | null | undefined }) =>
  m.startMs === undefined || m.endMs === undefined || m.endMs === null || m.endMs >= m.startMs;
export const MarkCreate = markFields
  .partial()
  .required({ recordingId: true, startMs: true })
  .extend({ id: z.uuid().optional() })
  .refine(endsAfterStart, { message: ENDS_EARLY, path: ['endMs'] });
export type MarkCreate = z.infer<typeof MarkCreate>;
export const MarkEdit = markFields
  .partial()
  .refine(notEmpty, NOTHING)
  .refine(endsAfterStart, { message: ENDS_EARLY, path: ['endMs'] });
export type MarkEdit = z.infer<typeof MarkEdit>;

/** Where in a transcript a drafted line comes from; word numbers count over the whole transcript. */
export const Evidence = z.object({
  id: z.uuid(),
  lineId: z.uuid(),
  transcriptId: z.uuid(),
  role: z.enum(['announcement', 'work', 'total', 'unread']),
  firstWord: z.int(),
  lastWord: z.int(),
  startMs: z.int(),
  endMs: z.int(),
  words: z.string(),
});
export type Evidence = z.infer<typeof Evidence>;
