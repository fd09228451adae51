import { printLine } from '../language/print.ts';
import { readLine } from '../language/read-line.ts';
import { translate } from '../language/translate.ts';
import { type Totals } from '../language/tree.ts';
import { type Terms } from '../span.ts';
import { type DraftLine } from './draft.ts';
import { matchHeldLines, type LinePair } from './held-lines.ts';
import { matchHeldPieces } from './held-pieces.ts';

/** A written line, as far as it is held against what was said. */
export interface WrittenLine {
  readonly id: string;
  readonly kind: string;
  readonly label: string;
  readonly from: number | null;
  readonly to: number | null;
  readonly text: string;
  /** The written total in force. */
  readonly total: Totals | null;
  /** Stitch by stitch, as the count worked it; empty where it could not. */
  readonly work: readonly string[];
  /** Whether it is meant to be in a recording. */
  readonly filmed: boolean;
}

export interface WrittenPiece {
  readonly id: string;
  readonly name: string;
  readonly make: number;
  readonly lines: readonly WrittenLine[];
}

/** A drafted line with its work stitch by stitch, as the count of the draft worked it. */
export type SaidLine = Pick<DraftLine, 'kind' | 'label' | 'from' | 'to' | 'text' | 'said'> & {
  readonly work: readonly string[];
};

export interface SaidPiece {
  readonly name: string;
  readonly make: number;
  readonly lines: readonly SaidLine[];
}

export interface HeldInput {
  readonly written: { readonly terms: Terms; readonly pieces: readonly WrittenPiece[] };
  readonly said: { readonly terms: Terms; readonly pieces: readonly SaidPiece[] };
}

/** What of a line was said otherwise than it is written. */
export type Unlike = 'instruction' | 'total' | 'number';

/** Where a line stands in a draft: its piece and its place there, from 0. */
export interface SaidAt {
  readonly piece: number;
  readonly line: number;
}

export interface HeldLine {
  readonly lineId: string;
  /** Empty where it was never said; several where its range was said one by one. */
  readonly said: readonly SaidAt[];
  readonly unlike: readonly Unlike[];
}

export interface Held {
  /** Every written line that can be said, in the order of the pattern; notes are left out, nobody says them. */
  readonly lines: readonly HeldLine[];
  /** What was said and is not written. */
  readonly unwritten: readonly SaidAt[];
  /** The written piece that each drafted piece is; null for one that is not written. */
  readonly pieces: readonly (string | null)[];
}

const sameTotals = (a: Totals, b: Totals): boolean => {
  const kinds = Object.keys(a).filter((kind) => kind in b);
  // A total in other kinds of stitches says nothing against it.
  return kinds.every((kind) => a[kind]!.join() === b[kind]!.join());
};

const plainText = (text: string) =>
  text
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim();

/** An instruction in house style, without its total, all brackets alike; null where it is not understood throughout. */
function inHouseStyle(text: string, terms: Terms): string | null {
  const { tree, unread } = readLine(text, { terms });
  if (unread.length > 0 || tree.items.length === 0) return null;
  return printLine(tree, { terms }).replace(/[[{]/g, '(').replace(/[\]}]/g, ')');
}

/** An instruction without a total in brackets at its end. */
const withoutTotal = (text: string) => text.replace(/[([]\s*\d[^()[\]]*[)\]]\s*$/, '');

/** The one stitch that a line is worked in all the way, however many there are; null where it is not so. */
const onlyStitch = ({ work, text }: Pick<WrittenLine, 'work' | 'text'>): string | null =>
  work.length > 0 && !/\d/.test(withoutTotal(text)) && work.every((stitch) => stitch === work[0]) ? work[0]! : null;

/**
 * Whether both are the same work: by their wording, or stitch by stitch. Stitches all of one kind around are the same
 * also where a slip in the line before left another number of them.
 */
function isSameWork(written: WrittenLine, said: SaidLine, terms: Terms, saidTerms: Terms): boolean {
  const text = translate(said.text, saidTerms, terms);
  if (plainText(text) === plainText(written.text)) return true;
  if (written.work.length > 0 && written.work.join() === said.work.join()) return true;
  const only = onlyStitch(written);
  if (only !== null && only === onlyStitch(said)) return true;
  const house = inHouseStyle(written.text, terms);
  return house !== null && house === inHouseStyle(text, terms);
}

const isStep = ({ kind }: { readonly kind: string }) => kind === 'step' || kind === 'note';

function unlikeIn({ written, said }: Matched, terms: Terms, saidTerms: Terms): Unlike[] {
  // A step is told in anybody's own words.
  if (isStep(written) || said.length === 0) return [];
  const unlike: Unlike[] = [];
  if (!said.every((line) => isSameWork(written, line, terms, saidTerms))) unlike.push('instruction');
  const total = written.total;
  if (total && said.some((line) => line.said && !sameTotals(total, line.said))) unlike.push('total');
  if (written.from !== null && !said.some((line) => isWithin(line, written))) unlike.push('number');
  return unlike;
}

const isWithin = (line: SaidLine, { from, to }: WrittenLine) =>
  line.from !== null && from !== null && line.from <= (to ?? from) && (line.to ?? line.from) >= from;

interface Matched {
  readonly written: WrittenLine;
  readonly said: readonly SaidLine[];
}

/**
 * Holds what was drafted from a recording against a pattern that was written before it, both ways. Lines are found by
 * their piece, then by the numbers that were spoken, then by their work. Takes time linear in the lines, but for
 * sorting.
 */
export function heldAgainst({ written, said }: HeldInput): Held {
  const pieces = matchHeldPieces(written.pieces, said.pieces);
  const saidOf = new Map<string, number>();
  pieces.forEach((index, n) => index !== null && saidOf.set(written.pieces[index]!.id, n));
  const lines: HeldLine[] = [];
  const met = new Set<string>();
  for (const piece of written.pieces) {
    const n = saidOf.get(piece.id);
    const drafted = n === undefined ? [] : said.pieces[n]!.lines;
    const pairs: LinePair[] = matchHeldLines(piece.lines, drafted);
    piece.lines.forEach((line, i) => {
      if (line.kind === 'note') return;
      const found = pairs[i]!.said;
      found.forEach((at) => met.add(`${n}.${at}`));
      const matched = { written: line, said: found.map((at) => drafted[at]!) };
      const unlike = unlikeIn(matched, written.terms, said.terms);
      lines.push({ lineId: line.id, said: found.map((at) => ({ piece: n!, line: at })), unlike });
    });
  }
  const unwritten = said.pieces.flatMap((piece, n) =>
    piece.lines.flatMap((_, i) => (met.has(`${n}.${i}`) ? [] : [{ piece: n, line: i }])),
  );
  return { lines, unwritten, pieces: pieces.map((index) => (index === null ? null : written.pieces[index]!.id)) };
}
