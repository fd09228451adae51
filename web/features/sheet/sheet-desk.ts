import type { CautionCreate, MaterialCreate, NoteCreate, SpecialStitchCreate } from '#contract/pattern-details';
import type { Pattern, PatternEdit } from '#contract/patterns';

interface Rows {
  material: MaterialCreate;
  caution: CautionCreate;
  note: NoteCreate;
  'special-stitch': SpecialStitchCreate;
}
export type SheetRow = keyof Rows;

/** What the sheet's forms need of a pattern: its rows with one's own changes in them, and ways to change them. */
export interface SheetDesk {
  readonly pattern: Pattern;
  editPattern(fields: PatternEdit): void;
  add<K extends SheetRow>(kind: K, fields: Rows[K]): string;
  edit<K extends SheetRow>(kind: K, id: string, fields: Partial<Omit<Rows[K], 'id'>>): void;
  remove(kind: SheetRow, id: string): void;
}
