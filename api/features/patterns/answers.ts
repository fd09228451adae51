import type { ZodType } from 'zod';
import { Material, Note, SpecialStitch } from '#contract/pattern-details';
import { LeftCheck } from '#contract/checks';
import { Line, Mark, Piece } from '#contract/rows';
import { z } from 'zod';
import { CautionKind } from '#contract/pattern-details';
import type { RowEntity } from './entities.ts';

/** A caution's own row, as it is answered after a write; the document says what brings it. */
export const CautionRow = z.object({
  id: z.uuid(),
  orderKey: z.string(),
  kind: CautionKind,
  text: z.string(),
  version: z.int().positive(),
});

/** What may be seen of each kind of row: the contract's fields and no other. */
export const ANSWERS: Readonly<Record<RowEntity, ZodType>> = {
  piece: Piece,
  line: Line,
  mark: Mark,
  material: Material,
  caution: CautionRow,
  note: Note,
  'special-stitch': SpecialStitch,
  'left-check': LeftCheck,
};
