import { z } from 'zod';
import { PatternState } from './patterns.ts';
import { Verdict } from './rows.ts';

/** Which part of a studio's patterns is asked for. */
export const ShelfPart = z.enum(['shelf', 'archive', 'bin']);
export type ShelfPart = z.infer<typeof ShelfPart>;
export const ShelfQuery = z.strictObject({ studioId: z.uuid(), part: ShelfPart.default('shelf') });

/** One pattern as the shelf's ledger shows it, counted by the server. */
export const ShelfPattern = z.object({
  id: z.uuid(),
  code: z.string(),
  title: z.string(),
  state: PatternState,
  group: z.enum(['waiting', 'in-hand', 'at-rest']),
  pieces: z.array(z.object({ name: z.string(), make: z.int() })),
  lines: z.int(),
  /** Stitches of every round and row, times how many are made; null until something can be counted. */
  stitches: z.int().nullable(),
  /** Lines that wait for a look, worst first. */
  needs: z.array(z.object({ verdict: Verdict, lineId: z.uuid(), label: z.string(), piece: z.string() })),
  /** Label of the last marked line, where lines after it have no moment; null where none is wanting. */
  lastMarked: z.string().nullable(),
  unmarked: z.int(),
  /** The first piece's totals in working order, for its print; `rows` prints as a staff. */
  print: z.object({ form: z.enum(['rings', 'rows']), totals: z.array(z.int()) }).nullable(),
  edition: z.int().nullable(),
  touchedAt: z.iso.datetime(),
  version: z.int().positive(),
});
export type ShelfPattern = z.infer<typeof ShelfPattern>;

export const Shelf = z.object({
  studio: z.object({ id: z.uuid(), name: z.string() }),
  part: ShelfPart,
  mayCreate: z.boolean(),
  mayManage: z.boolean(),
  /** How many lie in the two other parts, so that the shelf can lead there. */
  archived: z.int(),
  binned: z.int(),
  patterns: z.array(ShelfPattern),
});
export type Shelf = z.infer<typeof Shelf>;
