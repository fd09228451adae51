import type { LineInput, PieceInput, SpecialStitch } from '../count/input.ts';
import type { Terms } from '../span.ts';
import type { EditionCaption, EditionDetails, EditionMark, EditionRecording, Erratum } from './document.ts';
import type { SourceMaterial } from './material-text.ts';

export interface SourceLine extends LineInput {
  readonly shortId: string;
  readonly note: string;
  /** "Leave as it is, because …"; null where nothing was settled. */
  readonly leftBecause: string | null;
  /** The moment printed for the line. */
  readonly mark: EditionMark | null;
}

export interface SourcePiece extends Omit<PieceInput, 'lines'> {
  readonly lines: readonly SourceLine[];
}

/** All that a pattern brings to its edition, every list in its order. */
export interface EditionSource {
  readonly code: string;
  readonly title: string;
  /** Null for a draft. */
  readonly edition: number | null;
  /** ISO 8601 in UTC; null for a draft. */
  readonly publishedAt: string | null;
  readonly studio: { readonly name: string; readonly foot: string };
  readonly maker: string;
  readonly checker: string;
  readonly terms: Terms;
  readonly sizes: readonly string[];
  readonly details: EditionDetails;
  readonly materials: readonly SourceMaterial[];
  readonly specialStitches: readonly Required<SpecialStitch>[];
  readonly notes: readonly string[];
  readonly cautions: readonly { readonly kind: string; readonly text: string }[];
  readonly pieces: readonly SourcePiece[];
  readonly recordings: readonly EditionRecording[];
  readonly captions: readonly EditionCaption[];
  /** What changed since the edition before, as the creator settled it; empty for the first. */
  readonly errata: readonly Erratum[];
}
