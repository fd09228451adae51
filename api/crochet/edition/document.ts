import type { LineKind } from '../count/input.ts';
import type { Stitch, Verdict } from '../count/result.ts';
import type { Totals } from '../language/tree.ts';
import type { Terms } from '../span.ts';

/** Raised when a field changes its meaning; a reader of old documents looks here first. */
export const SCHEMA_VERSION = 1;

/** Whatever is printed in the reader's terms stands in both. */
export type BothTerms = Readonly<Record<Terms, string>>;

/** A moment of a recording, in milliseconds from the start of the clip. */
export interface EditionMark {
  /** The number the recording has in this pattern; it is printed and never given twice. */
  readonly recordingNumber: number;
  readonly startMs: number;
  readonly endMs: number | null;
}

/** A stretch of a line's work that comes again: `times` passes of `stitches` stitches each, then what is left. */
export interface Repeat {
  readonly stitches: number;
  readonly times: number;
  /** Stitches made in one pass. */
  readonly makes: number;
  /** Entries of the walk after the last pass. */
  readonly rest: number;
}

/** What most often went wrong where a maker's count is off by `difference` (theirs less the sheet's). */
export interface Slip {
  readonly difference: number;
  readonly text: string;
}

/** What only the studio may see of a line. Never in the public projection. */
export interface StudioLine {
  readonly id: string;
  readonly verdict: Verdict;
  readonly said: Totals | null;
  readonly written: Totals | null;
  /** "Leave as it is, because …": why the line goes out although its totals do not agree. */
  readonly leftBecause: string | null;
}

export interface EditionLine {
  readonly shortId: string;
  readonly kind: LineKind;
  /** "R5–8", "Row 1"; empty for a step or a note. */
  readonly label: string;
  readonly from: number | null;
  readonly to: number | null;
  /** The instruction without its total. */
  readonly text: BothTerms;
  readonly note: BothTerms;
  /** The total in force (the written one, else what was worked out) by kind, one figure a size. */
  readonly totals: Totals | null;
  /** The same as it is printed: "24", "12 dc, 4 ch-2 sps"; null where there is none. */
  readonly total: BothTerms | null;
  /** Stitches after the line (the last round of a range), null where they are not known. */
  readonly count: number | null;
  /** The same total holds after each round of the range. */
  readonly each: boolean;
  /** Stitches by kind that the line makes. */
  readonly made: Readonly<Record<string, number>>;
  readonly mark: EditionMark | null;
  readonly walk: readonly Stitch[];
  /** The rounds of a range that shapes, else null. */
  readonly rounds: readonly { readonly n: number; readonly count: number | null }[] | null;
  readonly repeats: readonly Repeat[];
  readonly slips: readonly Slip[];
  readonly studio: StudioLine;
}

export interface EditionPiece {
  /** Holds over editions; addresses inside the page use it. */
  readonly id: string;
  readonly name: string;
  readonly make: number;
  readonly worked: 'spiral' | 'joined' | 'rows';
  readonly lines: readonly EditionLine[];
}

export interface EditionRecording {
  readonly number: number;
  readonly title: string;
  readonly durationMs: number | null;
  /** Where the recording stands elsewhere, and by how many milliseconds its clock runs ahead of ours. */
  readonly publicUrl: string | null;
  readonly publicOffsetMs: number;
  readonly hasClip: boolean;
}

export interface EditionCaption {
  readonly recordingNumber: number;
  readonly startMs: number;
  readonly endMs: number;
  readonly text: string;
}

export interface EditionDetails {
  readonly introduction: string;
  readonly gauge: string;
  readonly finishedSize: string;
  readonly level: 'basic' | 'easy' | 'intermediate' | 'complex' | null;
  readonly care: string;
  /** What may be done with the piece and the pattern, in the creator's words. */
  readonly permission: string;
  readonly contact: string;
}

export interface EditionMaterial {
  readonly kind: 'yarn' | 'hook' | 'notion' | 'filling';
  readonly text: string;
}

export interface EditionCaution {
  readonly kind: string;
  /** "Small parts"; empty for one of the creator's own. */
  readonly title: string;
  readonly text: string;
}

/** One entry of "changed in this edition". `weight`: correction, made clearer, added, or of the look only. */
export interface Erratum {
  readonly shortId: string | null;
  readonly place: string;
  readonly weight: 'correction' | 'clearer' | 'added' | 'look';
  readonly was: string;
  readonly now: string;
  readonly why: string;
}

export interface EditionAbbreviation {
  readonly abbreviation: BothTerms;
  readonly name: BothTerms;
}

/** A whole pattern as it goes out: sheet, watch page and exports render this and nothing else. */
export interface EditionDocument {
  readonly schemaVersion: number;
  readonly engineVersion: string;
  readonly code: string;
  readonly title: string;
  /** Null while it is a draft. */
  readonly edition: number | null;
  /** ISO 8601 in UTC; null while it is a draft. */
  readonly publishedAt: string | null;
  readonly studio: { readonly name: string; readonly foot: string };
  /** Who made it, and who checked it; empty where nobody is named. */
  readonly maker: string;
  readonly checker: string;
  readonly terms: Terms;
  readonly sizes: readonly string[];
  readonly details: EditionDetails;
  readonly materials: readonly EditionMaterial[];
  readonly abbreviations: readonly EditionAbbreviation[];
  readonly specialStitches: readonly {
    readonly name: string;
    readonly abbreviation: string;
    readonly text: BothTerms;
  }[];
  readonly notes: readonly BothTerms[];
  readonly cautions: readonly EditionCaution[];
  /** The sentence that defers to the rules where the maker lives; it stands in every edition. */
  readonly deferral: string;
  readonly pieces: readonly EditionPiece[];
  readonly recordings: readonly EditionRecording[];
  readonly captions: readonly EditionCaption[];
  readonly errata: readonly Erratum[];
}
