import type { LineCount, LineKind, Repair, Span, Terms } from '#crochet';
import type { RingLine } from '#crochet/shape';

/** What the page and its counting thread say to each other. Offsets are UTF-16 units. */

/** What is to be counted. */
export interface Asked {
  readonly text: string;
  /** As the person chose; null: to be inferred. */
  readonly terms: Terms | null;
  /** What the first line works into, where it begins in neither a ring nor a chain. */
  readonly base: number | null;
}

/** One line of the ledger: everything the count knows of it but the walk, which only drawings need. */
export interface Row extends Pick<
  LineCount,
  | 'id'
  | 'verdict'
  | 'base'
  | 'uses'
  | 'count'
  | 'made'
  | 'written'
  | 'writtenSpan'
  | 'said'
  | 'odd'
  | 'unread'
  | 'atFault'
  | 'message'
  | 'asks'
  | 'sizes'
> {
  readonly kind: LineKind;
  /** `R5–8`, `Row 3`, or the label as written. */
  readonly name: string;
  /** The same as it is read out: "rounds 5 to 8". */
  readonly spoken: string;
  /** The instruction, line ends made spaces. */
  readonly text: string;
  /** The whole line and its instruction, counted from where the piece begins. */
  readonly whole: Span;
  readonly body: Span;
  /** Name of the line whose slip this one only follows. */
  readonly follows: string | null;
  /** Why the cut of the text is not certain here. */
  readonly uncertain: string | null;
}

export interface PieceRows {
  readonly id: string;
  readonly name: string;
  readonly make: number;
  readonly worked: 'spiral' | 'joined' | 'rows';
  readonly rows: readonly Row[];
  /** Stitches of one of it; null while a line of it cannot be counted. */
  readonly stitches: number | null;
}

/** Where a piece begins in the text; its rows only where they are not as they were told before. */
export interface PieceAt {
  readonly id: string;
  readonly start: number;
  readonly rows: PieceRows | null;
}

export interface Counted {
  readonly terms: Terms;
  readonly termsReason: string;
  readonly title: string | null;
  readonly sizes: readonly string[];
  /** Stretches kept as they are: materials, notes and the pattern's own stitches. */
  readonly notes: readonly string[];
  readonly pieces: readonly PieceAt[];
}

/** A change of the text: what stands in `span` becomes `text`. */
export interface Change {
  readonly span: Span;
  readonly text: string;
}

export type Request =
  | { readonly kind: 'count'; readonly seq: number; readonly asked: Asked }
  | { readonly kind: 'repairs'; readonly seq: number; readonly lineId: string }
  | { readonly kind: 'draw'; readonly seq: number; readonly pieceId: string }
  | { readonly kind: 'house'; readonly seq: number };

export type Reply =
  | { readonly kind: 'progress'; readonly seq: number; readonly done: number; readonly of: number }
  | { readonly kind: 'counted'; readonly seq: number; readonly counted: Counted; readonly ms: number }
  | { readonly kind: 'repairs'; readonly seq: number; readonly lineId: string; readonly repairs: readonly Repair[] }
  | { readonly kind: 'draw'; readonly seq: number; readonly pieceId: string; readonly lines: readonly RingLine[] }
  | { readonly kind: 'house'; readonly seq: number; readonly changes: readonly Change[] };
