import { type Terms } from '../span.ts';
import { type Totals } from '../language/tree.ts';

export type LineKind = 'foundation' | 'round' | 'row' | 'step' | 'note';

/** A line of a pattern as it is stored: what the maker typed, and the totals that stand beside it. */
export interface LineInput {
  readonly id: string;
  readonly kind: LineKind;
  readonly label: string;
  readonly from: number | null;
  readonly to: number | null;
  /** The instruction in shorthand as typed; may hold its own total. */
  readonly text: string;
  /** Written total stored beside the text, only where it does not stand in the text. */
  readonly written: Totals | null;
  /** Total spoken in the recording. */
  readonly said: Totals | null;
}

export interface PieceInput {
  readonly id: string;
  readonly name: string;
  readonly make: number;
  readonly worked: 'spiral' | 'joined' | 'rows';
  readonly lines: readonly LineInput[];
}

/** A stitch that a pattern defines for itself: `Shell: 5 dc in one st`. */
export interface SpecialStitch {
  readonly name: string;
  readonly abbreviation?: string;
  readonly text: string;
}

export interface PatternInput {
  readonly terms: Terms;
  readonly sizes: readonly string[];
  readonly pieces: readonly PieceInput[];
  readonly specialStitches?: readonly SpecialStitch[];
  /** What the first counted line of the first piece works into, where it does not begin in a ring or a chain. */
  readonly base?: number | null;
}
