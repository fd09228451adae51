import { type Span } from '../span.ts';
import { type Totals } from '../language/tree.ts';

/** How a line came out, worst first: unread, does-not-fit, differs, agrees; no-total where nobody gave one. */
export type Verdict = 'agrees' | 'differs' | 'does-not-fit' | 'unread' | 'no-total';

/** One stitch made, in working order, and the places (of the line before) it stands on. */
export interface Stitch {
  /** Key in the stitch table: `sc`, `sc2tog`, `ch`, `sk`. */
  readonly stitch: string;
  /** Indices of the places worked into, counted from 0 along the line before, in the order of this line. */
  readonly on: readonly number[];
  readonly makes: number;
}

export interface RoundCount {
  readonly n: number;
  readonly base: number | null;
  readonly stated: Totals | null;
  readonly count: number | null;
  readonly verdict: Verdict;
}

export interface RowCount {
  readonly from: number;
  readonly to: number;
  readonly source: number;
  readonly work: readonly string[];
  readonly base: number | null;
  readonly uses: number | null;
  readonly stated: Totals | null;
  readonly count: number | null;
  readonly made: Readonly<Record<string, number>>;
  readonly verdict: Verdict;
}

export interface Ask {
  readonly kind: string;
  readonly text: string;
}

/** Everything the count knows of a line. */
export interface LineCount {
  readonly id: string;
  readonly verdict: Verdict;
  /** Places there are to work into, of the kinds the line names; null for a ring or where not known. */
  readonly base: number | null;
  /** Places used or passed over; equals base where the line fits. */
  readonly uses: number | null;
  /** Stitches the line leaves: each round of a range, of the last where they differ. */
  readonly count: number | null;
  readonly made: Readonly<Record<string, number>>;
  /** The written total in force: from the text, else the stored one. */
  readonly written: Totals | null;
  readonly writtenSpan: Span | null;
  readonly said: Totals | null;
  /** Which of the totals is unlike the others. */
  readonly odd: readonly ('said' | 'written' | 'worked')[];
  readonly unread: readonly Span[];
  /** The phrase where the places run out. */
  readonly atFault: Span | null;
  readonly message: string | null;
  /** The line whose written or said total this one works into, after a fault there. */
  readonly follows: { readonly line: string; readonly as: 'written' | 'said' | 'made' } | null;
  /** Stitch by stitch for one round, in short words: `sc`, `2sc`, `sc2tog`, `[dc,dc,ch,ch,dc,dc]`. */
  readonly work: readonly string[];
  readonly loops: 'both' | 'back' | 'front' | 'third' | 'mixed';
  readonly rounds: readonly RoundCount[] | null;
  /** For rows told as a group (`repeat rows 3–4 twice more`): each row, with the line it is taken from. */
  readonly rows: readonly RowCount[] | null;
  readonly asks: readonly Ask[];
  readonly countedWith: 'stitches' | 'chains' | 'spaces' | null;
  readonly walk: readonly Stitch[];
  /** The other sizes, where the pattern has several. */
  readonly sizes: readonly SizeCount[];
}

export interface SizeCount {
  readonly base: number | null;
  readonly uses: number | null;
  readonly count: number | null;
  readonly made: Readonly<Record<string, number>>;
  readonly verdict: Verdict;
}

export interface PieceCount {
  readonly id: string;
  readonly lines: readonly LineCount[];
}

export interface PatternCount {
  readonly pieces: readonly PieceCount[];
}

/** An edit that mends a line; it has been worked again before it is offered. */
export interface Repair {
  readonly lineId: string;
  readonly text: string;
  readonly written?: Totals | null;
  /** Why, in one line: "R8 fits if the repeat is 6". */
  readonly sentence: string;
  readonly fits: { readonly base: number; readonly count: number };
}
