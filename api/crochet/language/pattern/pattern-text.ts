import { type Span, type Terms } from '../../span.ts';
import { type LineKind, type SpecialStitch } from '../../count/input.ts';
import { type Totals } from '../tree.ts';

/** A whole written pattern told apart into its parts, each with its place in the text. */
export interface PatternText {
  readonly terms: Terms;
  /** Why these terms, in one sentence. */
  readonly termsReason: string;
  readonly title: string | null;
  readonly sizes: readonly string[];
  readonly pieces: readonly PieceText[];
  readonly materials: readonly TextStretch[];
  readonly notes: readonly TextStretch[];
  readonly specialStitches: readonly (SpecialStitch & { readonly span: Span })[];
  /** What the first line works into, where the text says so (`--base`). */
  readonly base: number | null;
}

export interface TextStretch {
  readonly text: string;
  readonly span: Span;
}

export interface PieceText {
  readonly name: string;
  readonly make: number;
  readonly worked: 'spiral' | 'joined' | 'rows';
  readonly lines: readonly LineText[];
  readonly span: Span;
}

export interface LineText {
  readonly kind: LineKind;
  readonly label: string;
  readonly from: number | null;
  readonly to: number | null;
  /** The instruction without its label; `text` is `source.slice(textSpan)` with line ends made spaces. */
  readonly text: string;
  readonly textSpan: Span;
  /** From the label's first unit to the end of the total. */
  readonly span: Span;
  readonly written: Totals | null;
  /** A cut that a person should confirm, with the reason. */
  readonly uncertain: string | null;
}
