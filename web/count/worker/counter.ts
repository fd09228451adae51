import {
  countPattern,
  type LineText,
  type PatternInput,
  type PatternText,
  type PieceCount,
  type PieceInput,
  type PieceText,
  type Repair,
  repairsFor,
} from '#crochet';
import type { RingLine } from '#crochet/shape';
import { cutText } from './cut-text.ts';
import { houseChanges } from './house-changes.ts';
import { keepIds } from './keep-ids.ts';
import { type Asked, type Change, type Counted, type PieceAt, type PieceRows } from './protocol.ts';
import { ringLines } from './ring-lines.ts';
import { rowsOf } from './rows-of.ts';

/** A piece as it was counted last. */
interface Piece {
  readonly id: string;
  readonly of: PieceText;
  readonly input: PieceInput;
  /** All else that its count depends on. */
  readonly around: string;
  readonly count: PieceCount;
  readonly rows: PieceRows;
  /** Whether the page knows these rows: a count that was broken off has told nothing. */
  readonly isTold: boolean;
}

/** A word with the one who asked, between two pieces: how far it is, and whether to go on. */
export type Between = (done: number, of: number) => Promise<boolean>;

const isSameLine = (a: LineText, b: LineText) => a.text === b.text && a.label === b.label && a.kind === b.kind;

function isSamePiece(a: PieceText, b: PieceText): boolean {
  return (
    a.name === b.name &&
    a.make === b.make &&
    a.worked === b.worked &&
    a.lines.length === b.lines.length &&
    a.lines.every((line, i) => {
      const other = b.lines[i]!;
      return (
        isSameLine(line, other) &&
        line.from === other.from &&
        line.to === other.to &&
        line.span.start - a.span.start === other.span.start - b.span.start &&
        line.textSpan.start - a.span.start === other.textSpan.start - b.span.start
      );
    })
  );
}

/**
 * Counts a text again and again as it is written. What an earlier count says of a piece, and of a line, is kept as long
 * as nothing it depends on has changed.
 */
export class Counter {
  #pieces: readonly Piece[] = [];
  #pattern: PatternText | null = null;
  #ids = 0;

  readonly #newId = () => String((this.#ids += 1));

  #inputOf(piece: PieceText, id: string, before: Piece | undefined): PieceInput {
    const old = before?.of.lines.map((of, i) => ({ id: before.input.lines[i]!.id, of })) ?? [];
    const ids = keepIds(old, piece.lines, isSameLine, this.#newId);
    return {
      id,
      name: piece.name,
      make: piece.make,
      worked: piece.worked,
      lines: piece.lines.map(({ kind, label, from, to, text }, i) => ({
        id: ids[i]!,
        kind,
        label,
        from,
        to,
        text,
        written: null,
        said: null,
      })),
    };
  }

  #patternOf(pieces: readonly PieceInput[], base: number | null): PatternInput {
    const { terms, sizes, specialStitches } = this.#pattern!;
    return { terms, sizes, specialStitches, pieces, base };
  }

  #countPiece(of: PieceText, id: string, base: number | null, around: string, before: Piece | undefined): Piece {
    const input = this.#inputOf(of, id, before);
    const previous = before?.around === around ? { pieces: [before.count] } : undefined;
    const count = countPattern(this.#patternOf([input], base), previous).pieces[0]!;
    return { id, of, input, around, count, rows: rowsOf(of, input, count), isTold: false };
  }

  /** @returns null where `between` said to stop: something newer waits */
  async count({ text, terms, base }: Asked, between: Between): Promise<Counted | null> {
    const pattern = cutText(text, terms);
    if (!(await between(0, pattern.pieces.length))) return null;
    this.#pattern = pattern;
    const known = this.#pieces;
    const ids = keepIds(known, pattern.pieces, isSamePiece, this.#newId);
    const told = new Map(known.map((piece) => [piece.id, piece]));
    const pieces: Piece[] = [];
    const at: PieceAt[] = [];
    for (const [i, of] of pattern.pieces.entries()) {
      const before = told.get(ids[i]!);
      const own = pattern.specialStitches.map(({ name, abbreviation, text: words }) => [name, abbreviation, words]);
      const given = i === 0 ? (base ?? pattern.base) : null;
      const around = JSON.stringify([pattern.terms, pattern.sizes, own, given]);
      const isKept = before?.around === around && isSamePiece(before.of, of);
      const piece = isKept ? { ...before, of } : this.#countPiece(of, ids[i]!, given, around, before);
      pieces.push(piece);
      at.push({ id: piece.id, start: of.span.start, rows: piece.isTold ? null : piece.rows });
      if (!isKept && !(await between(i + 1, pattern.pieces.length))) {
        // What is counted already is not counted again by the next, which has to tell it.
        const done = new Set(pieces.map((one) => one.id));
        this.#pieces = [...pieces, ...known.filter((one) => !done.has(one.id))];
        return null;
      }
    }
    this.#pieces = pieces.map((piece) => ({ ...piece, isTold: true }));
    return {
      terms: pattern.terms,
      termsReason: pattern.termsReason,
      title: pattern.title,
      sizes: pattern.sizes,
      notes: [...pattern.materials, ...pattern.notes].map((stretch) => stretch.text.trim()),
      pieces: at,
    };
  }

  #inputWith(pieceId: string): PatternInput | null {
    const at = this.#pieces.findIndex((one) => one.id === pieceId);
    const piece = this.#pieces[at];
    if (!piece) return null;
    const base = (JSON.parse(piece.around) as unknown[])[3] as number | null;
    return this.#patternOf([piece.input], base);
  }

  /** The edits that mend a line, best first. */
  repairs(lineId: string): readonly Repair[] {
    const piece = this.#pieces.find((one) => one.input.lines.some((line) => line.id === lineId));
    const input = piece && this.#inputWith(piece.id);
    return input ? repairsFor(input, lineId) : [];
  }

  /** The rings or rows of a piece, to be drawn. */
  draw(pieceId: string): readonly RingLine[] {
    const piece = this.#pieces.find((one) => one.id === pieceId);
    return piece ? ringLines(piece.input, piece.count.lines) : [];
  }

  /** The whole text in house style, as changes of single instructions; none where all is so already. */
  house(): readonly Change[] {
    return this.#pieces.flatMap((piece) => houseChanges(piece.of, this.#inputWith(piece.id)!, piece.count));
  }
}
