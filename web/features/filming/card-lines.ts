import { countPattern, type LineCount, lineLabel, placeTotal, printTotals, roundsOf, type Totals } from '#crochet';
import { toPatternInput } from '#contract/pattern-input';
import { type Pattern } from '#contract/patterns';
import { type Line } from '#contract/rows';

/** One line as it is read to the camera. */
export interface CardLine {
  readonly id: string;
  readonly pieceId: string;
  /** "R9", "R5–8", "Rows 2–5"; for a line without a number what it is. */
  readonly name: string;
  /** The number as it is said: "round 9", "rounds 5 to 8"; null where the line has none. */
  readonly spoken: string | null;
  readonly from: number | null;
  readonly to: number | null;
  /** The instruction without its total. */
  readonly text: string;
  readonly note: string;
  /** "18", "24 each"; empty for what has no total. */
  readonly total: string;
  readonly filmed: boolean;
}

export interface CardPiece {
  readonly id: string;
  readonly name: string;
  readonly make: number;
  readonly lines: readonly CardLine[];
}

const isNumbered = ({ kind, from }: Pick<Line, 'kind' | 'from'>) =>
  from !== null && (kind === 'round' || kind === 'row');

function nameOf(line: Line): string {
  return (
    lineLabel(line) || (line.kind === 'foundation' ? 'Chain' : line.label || (line.kind === 'note' ? 'Note' : 'Step'))
  );
}

function spokenNumber(line: Line): string | null {
  if (!isNumbered(line)) return null;
  const { kind, from, to } = line;
  if (roundsOf(line) > 1) return `${kind}s ${from} to ${to}`;
  return to === null ? `${kind} ${from} on` : `${kind} ${from}`;
}

/** What was written, else what the instruction comes to: the figure that shall be said. */
function totalOf(line: Line, count: LineCount | undefined): string {
  if (line.kind === 'step' || line.kind === 'note') return '';
  const written: Totals | null = count?.written ?? line.written;
  const figure = written ? printTotals(written) : String(count?.count ?? '');
  return figure !== '' && roundsOf(line) > 1 ? `${figure} each` : figure;
}

function cardLine(line: Line, count: LineCount | undefined): CardLine {
  const { id, pieceId, from, to, note, filmed } = line;
  const span = count?.writtenSpan;
  const text = (span ? placeTotal(line.text, span, null) : line.text).trim();
  const numbers = isNumbered(line) ? { from, to } : { from: null, to: null };
  return {
    id,
    pieceId,
    name: nameOf(line),
    spoken: spokenNumber(line),
    ...numbers,
    text,
    note,
    total: totalOf(line, count),
    filmed,
  };
}

/** A pattern as it is read aloud: pieces with their lines in order, each with the total to say after it. */
export function cardOf(pattern: Pattern): readonly CardPiece[] {
  const counts = new Map(
    countPattern(toPatternInput(pattern)).pieces.flatMap(({ lines }) => lines.map((line) => [line.id, line] as const)),
  );
  return pattern.pieces.map(({ id, name, make }) => ({
    id,
    name,
    make,
    lines: pattern.lines.filter(({ pieceId }) => pieceId === id).map((line) => cardLine(line, counts.get(line.id))),
  }));
}

/** The lines that are read, in order: what is not filmed is passed over. */
export const linesToRead = (pieces: readonly CardPiece[]): readonly CardLine[] =>
  pieces.flatMap(({ lines }) => lines.filter(({ filmed }) => filmed));

/**
 * The line that holds a number, sought first in the piece in hand, then in the others in order.
 * @returns undefined where no line has it
 */
export function lineAtNumber(lines: readonly CardLine[], n: number, pieceId: string | undefined): CardLine | undefined {
  const holds = ({ from, to }: CardLine) => from !== null && n >= from && n <= Math.max(from, to ?? from);
  return lines.find((line) => line.pieceId === pieceId && holds(line)) ?? lines.find(holds);
}
