import { z } from 'zod';

/** What a sheet prints besides the lines. `after` and `version` as in rows.ts. */

const OrderKey = z.string().min(1);
const version = z.int().positive();
const after = z.uuid().nullable();
const id = z.uuid().optional();
const words = (max: number) => z.string().trim().max(max);
const notEmpty = (edit: object) => Object.keys(edit).length > 0;
const NOTHING = 'Nothing to change was given.';

/** What the finished piece is for, where that brings a caution of its own. */
export const Use = z.enum(['hot', 'carried', 'sleep', 'chewed', 'pet']);
export type Use = z.infer<typeof Use>;

export const Details = z.strictObject({
  introduction: words(4_000).default(''),
  gauge: words(300).default(''),
  finishedSize: words(300).default(''),
  level: z.enum(['basic', 'easy', 'intermediate', 'complex']).nullable().default(null),
  care: words(1_000).default(''),
  madeBy: words(200).default(''),
  checkedBy: words(200).default(''),
  permission: words(1_000).default(''),
  contact: words(300).default(''),
  uses: z.array(Use).max(5).default([]),
});
export type Details = z.infer<typeof Details>;

/** The open part of a material; what is not known is left out. */
export const MaterialDetails = z.strictObject({
  amount: words(120).optional(),
  colour: words(120).optional(),
  /** The trade's yarn weight, 0 lace to 7 jumbo. */
  weight: z.int().min(0).max(7).optional(),
  sizeMm: z.number().positive().max(100).optional(),
  /** As heard in the recording, where a reading suggested it. */
  heard: words(500).optional(),
  heardAtMs: z.int().min(0).optional(),
});
export const MaterialKind = z.enum(['yarn', 'hook', 'notion', 'filling']);
export const Material = z.object({
  id: z.uuid(),
  orderKey: OrderKey,
  kind: MaterialKind,
  name: z.string(),
  details: MaterialDetails,
  version,
});
export type Material = z.infer<typeof Material>;
const materialFields = z.strictObject({
  kind: MaterialKind,
  name: words(200).min(1),
  details: MaterialDetails,
  after,
});
export const MaterialCreate = materialFields.partial().required({ kind: true, name: true }).extend({ id });
export type MaterialCreate = z.infer<typeof MaterialCreate>;
export const MaterialEdit = materialFields.partial().refine(notEmpty, NOTHING);

export const CautionKind = z.enum([
  'small-parts',
  'flame',
  'wire',
  'cords',
  'heat',
  'sleep',
  'handles',
  'pets',
  'teething',
  'own',
]);
export type CautionKind = z.infer<typeof CautionKind>;
/**
 * A caution as the sheet prints it. One that a material, a step or the use brings stands there without a row of its
 * own (`id` null) in the usual words; wording it anew is a POST of its kind. It goes when what brings it goes.
 */
export const Caution = z.object({
  id: z.uuid().nullable(),
  orderKey: OrderKey.nullable(),
  kind: CautionKind,
  text: z.string(),
  /** What brings it, by name: "Safety eyes", "R15"; empty for the creator's own, which alone can be removed. */
  broughtBy: z.array(z.string()),
  version: version.nullable(),
});
export type Caution = z.infer<typeof Caution>;
export const CautionCreate = z.strictObject({ kind: CautionKind.default('own'), text: words(1_000).min(1), id });
export type CautionCreate = z.infer<typeof CautionCreate>;
export const CautionEdit = z
  .strictObject({ text: words(1_000).min(1), after })
  .partial()
  .refine(notEmpty, NOTHING);

export const Note = z.object({ id: z.uuid(), orderKey: OrderKey, text: z.string(), version });
export type Note = z.infer<typeof Note>;
export const NoteCreate = z.strictObject({ text: words(2_000).min(1), after: after.optional(), id });
export type NoteCreate = z.infer<typeof NoteCreate>;
export const NoteEdit = z
  .strictObject({ text: words(2_000).min(1), after })
  .partial()
  .refine(notEmpty, NOTHING);

export const SpecialStitch = z.object({
  id: z.uuid(),
  orderKey: OrderKey,
  name: z.string(),
  abbreviation: z.string(),
  text: z.string(),
  version,
});
export type SpecialStitch = z.infer<typeof SpecialStitch>;
const specialFields = z.strictObject({
  name: words(120).min(1),
  abbreviation: words(30),
  text: words(2_000).min(1),
  after,
});
export const SpecialStitchCreate = specialFields.partial().required({ name: true, text: true }).extend({ id });
export type SpecialStitchCreate = z.infer<typeof SpecialStitchCreate>;
export const SpecialStitchEdit = specialFields.partial().refine(notEmpty, NOTHING);
