import { type Span } from '../span.ts';

/**
 * The tree of one line of shorthand. Stitches are named by their key in the stitch table (US abbreviations: `sc`,
 * `fpdc`, `sl st`), whatever the terms of the text. Every node knows where it stands in the text it was read from.
 *
 * @example `R3: (sc, inc) × 6 (18)` is a group of two works, six times, with the total 18.
 */
export interface LineTree {
  readonly span: Span;
  readonly items: readonly Item[];
  /** Loops that the whole line is worked in, where it begins or ends with saying so (`BLO: …`). */
  readonly loops: Loops | null;
}

/** One figure for each size of the pattern; a single figure holds for all of them. */
export type Sized = readonly number[];

export type Loops = 'back' | 'front' | 'third' | 'both';

export type Item = Work | Group | Skip | Relative | Straight | Shaped | Lay | Step | Note | Unread;

/** Stitches of one kind: `6 sc`, `2 dc in next ch-2 sp`, `inc in each st around`, `sc to last 2 sts`. */
export interface Work {
  readonly type: 'work';
  readonly span: Span;
  readonly stitch: string;
  /** How many stitches stand in each place: 2 for `2 sc in next st`; `inc` is a stitch of its own, per 1. */
  readonly per: Sized;
  /** How many places are worked into, one after another. */
  readonly times: Times;
  readonly into: Target | null;
  readonly loops: Loops | null;
  /** `2sc` written in one piece in a series: an increase in most patterns, two stitches in a row in others. */
  readonly glued: boolean;
  /** The count was said as a multiple (`inc × 6`), which at the end of a series may mean all of it. */
  readonly multiplied: boolean;
  /** `dec 2`, with its figure behind: two decreases in most patterns, one over two stitches in others. */
  readonly behind?: true;
  /** A chain that stands between the groups of the line: `ch 1 between`. */
  readonly between?: true;
  /** Colour letter, where the line is told in colours (`A 4, B 2`). */
  readonly colour?: string;
  /** For a starting chain: what the line says about it. */
  readonly counts?: ChainCounts | null;
}

/** `(counts as dc)`, `(does not count)`, `(counts as hdc and ch 2)`. */
export interface ChainCounts {
  readonly as: string | null;
  readonly chains: number;
}

/** A bracket or a pair of stars: several items, repeated, or all in one place. */
export interface Group {
  readonly type: 'group';
  readonly span: Span;
  readonly items: readonly Item[];
  readonly times: Times;
  /** Where all of the group stands in one place. */
  readonly into: Target | null;
  readonly mark: '(' | '[' | '{' | '*' | '|' | '';
  /** Index in `items` at which the last repeat stops (`**`), or null. */
  readonly stop: number | null;
}

/** Places passed over on purpose: `sk 2`, `miss next ch-1 sp`. */
export interface Skip {
  readonly type: 'skip';
  readonly span: Span;
  readonly n: Sized;
  readonly of: Target | null;
}

/** How often. `fill`: until the places run out, `leave` of them kept back; `rep`: the disputed `rep from * n times`. */
export type Times =
  | { readonly type: 'n'; readonly n: Sized }
  | { readonly type: 'fill'; readonly leave: Sized; readonly leaveOf: Target | null; readonly to: Target | null }
  | { readonly type: 'rep'; readonly n: Sized }
  | { readonly type: 'unsaid' };

/** What a stitch is worked into. */
export interface Target {
  readonly what:
    'st' | 'ch' | 'sp' | 'gap' | 'ring' | 'row-end' | 'loop' | 'mark' | 'edge' | 'group' | 'st-or-ch' | 'other';
  readonly which: 'next' | 'same' | 'first' | 'last' | 'each' | 'nth' | 'centre' | 'skipped' | 'every' | 'hook' | 'far';
  /** For nth, every and hook: which one (2 in `2nd ch from hook`, 6 in `every 6th st`). */
  readonly n?: number;
  /** `in each dc`: only stitches of this key. */
  readonly stitch?: string;
  /** `ch-2 sp`: only spaces of that many chains. */
  readonly chains?: number;
  /** `3rd dc of shell`, `centre of group`. */
  readonly of?: string;
  /** `corner`. */
  readonly corner?: boolean;
  /** Line named: `front loops left in R10`. */
  readonly line?: number;
  /** The loops are those of the stitches of that line (`back loops of rnd 7`), not those that it left free. */
  readonly own?: true;
  /** For edge: the piece worked earlier, as its line calls it (`leg` in `around second leg`, with `n` 2). */
  readonly piece?: string;
  /** For edge: along the ends of rows. */
  readonly rows?: true;
  /** Both layers, or through another piece. */
  readonly through?: 'layers' | 'piece';
}

/** A line told by another: `rep R3`, `as round 2`, `same with one more sc between`, `rows 2–5 again`. */
export interface Relative {
  readonly type: 'relative';
  readonly span: Span;
  /** Numbers of the lines meant; empty is the line before. */
  readonly lines: readonly number[];
  /** `one more sc between`: this many more of the plain stitch before each shaping. */
  readonly more: number;
  /** `twice more`, `3 times`; null where unsaid. */
  readonly times: Sized | null;
  /** `to row 61`. */
  readonly until: number | null;
  /** `ending with a row 3`. */
  readonly ending: number | null;
}

/** `work straight`, `work even until 14 cm`: a stitch into each place. */
export interface Straight {
  readonly type: 'straight';
  readonly span: Span;
  readonly open: boolean;
}

/** Shaping told by its sum: `inc 6 evenly`, `dec 1 st each end of next and alt rows until 54 sts`, `6 more each round`. */
export interface Shaped {
  readonly type: 'shaped';
  readonly span: Span;
  /** Stitches more (or fewer, negative) a row. */
  readonly change: Sized;
  readonly how: 'evenly' | 'each-end' | 'as-set' | 'begin' | 'finish';
  /** Every which row shapes: 1 every row, 2 alternate rows. */
  readonly every: number;
  readonly until: Sized | null;
}

/** Lay of the work said before any stitch: bare loops, colours. */
export interface Lay {
  readonly type: 'loops';
  readonly span: Span;
  readonly loops: Loops;
}

/** Words that add no stitch and matter all the same. */
export interface Step {
  readonly type: 'step';
  readonly span: Span;
  readonly what: 'join' | 'turn' | 'no-turn' | 'ring' | 'leave' | 'far' | 'colour' | 'finish' | 'marker' | 'do';
  /** For ring: chains joined into it; for leave: places left on purpose. */
  readonly n?: number;
  /** For a join: where it goes, which tells whether the starting chain counts. */
  readonly into?: 'chain' | 'stitch' | 'unsaid';
  readonly text: string;
}

/** Prose in which nothing that could change the count can hide. */
export interface Note {
  readonly type: 'note';
  readonly span: Span;
  readonly text: string;
}

/** A stretch that could change the count and was not understood. */
export interface Unread {
  readonly type: 'unread';
  readonly span: Span;
}

/** One line read. */
export interface ReadLine {
  readonly tree: LineTree;
  /** The total in the text, and where it stands. */
  readonly total: Totals | null;
  readonly totalSpan: Span | null;
  readonly unread: readonly Span[];
  /** Slips of a scanner or of the fingers, and what they were read as. */
  readonly readAs?: readonly { readonly span: Span; readonly as: string }[];
}

/** Totals by kind, one figure a size: `{"sts":[24],"ch-2 sp":[4]}`. "sts" is a plain number. */
export type Totals = Readonly<Record<string, readonly number[]>>;
