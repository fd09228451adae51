import { z } from 'zod';

/** The change log of a pattern: history, undo and restore all read it. */

/** `lifecycle`: made, binned, archived, sent to proof; these have buttons of their own and are not undone by undo. */
export const Entity = z.enum([
  'pattern',
  'lifecycle',
  'piece',
  'line',
  'mark',
  'material',
  'caution',
  'note',
  'special-stitch',
  'left-check',
  'recording',
]);
export type Entity = z.infer<typeof Entity>;

const Fields = z.record(z.string(), z.unknown());

export const Change = z.object({
  id: z.int(),
  deedId: z.uuid(),
  at: z.iso.datetime(),
  /** Null: made by a reading. A member who has left keeps the name. */
  person: z.object({ id: z.uuid(), name: z.string() }).nullable(),
  entity: Entity,
  entityId: z.uuid(),
  /** Only the fields that changed, named as in the rows; null before it was made. */
  before: Fields.nullable(),
  after: Fields.nullable(),
  /** Where `entityId` was asked for: every field as this step left it. */
  row: Fields.nullable(),
  undoesDeedId: z.uuid().nullable(),
});
export type Change = z.infer<typeof Change>;

export const ChangesQuery = z.strictObject({
  /** Only the steps of one row, e.g. "R14 from the start". */
  entityId: z.uuid().optional(),
  /** Only changes older than this one. */
  before: z.coerce.number<string | number>().int().positive().optional(),
  limit: z.coerce.number<string | number>().int().min(1).max(200).default(50),
});

/** Newest first. */
export const ChangePage = z.object({ changes: z.array(Change), more: z.boolean() });
export type ChangePage = z.infer<typeof ChangePage>;

/** Answer of POST …/undo and …/redo: which rows to read again. */
export const Undone = z.object({
  deedId: z.uuid(),
  undoesDeedId: z.uuid(),
  rows: z.array(z.object({ entity: Entity, id: z.uuid() })),
});
export type Undone = z.infer<typeof Undone>;
