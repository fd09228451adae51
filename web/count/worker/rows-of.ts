import type { LineCount, PieceCount, PieceInput, PieceText, Span } from '#crochet';
import { nameOf, spokenNameOf } from './line-name.ts';
import { type PieceRows, type Row } from './protocol.ts';

const from = ({ start, end }: Span, zero: number): Span => ({ start: start - zero, end: end - zero });

/** How many rounds or rows a line stands for; 1 where its end is open. */
const roundsOf = (line: { readonly from: number | null; readonly to: number | null }) =>
  line.from !== null && line.to !== null && line.to > line.from ? line.to - line.from + 1 : 1;

/** Stitches of one of a piece, every round of a range counted; null while a line of it cannot be counted. */
function stitchesOf(input: PieceInput, counts: readonly LineCount[]): number | null {
  let sum = 0;
  for (const [i, line] of input.lines.entries()) {
    if (line.kind !== 'round' && line.kind !== 'row') continue;
    const count = counts[i]!;
    const each = count.count ?? count.written?.sts?.[0];
    if (each === undefined) return null;
    if (count.rows) sum += count.rows.reduce((total, row) => total + (row.count ?? each), 0);
    else if (count.rounds) sum += count.rounds.reduce((total, round) => total + (round.count ?? each), 0);
    else sum += each * roundsOf(line);
  }
  return sum;
}

/** A counted piece as the page shows it. */
export function rowsOf(of: PieceText, input: PieceInput, count: PieceCount): PieceRows {
  const names = new Map(input.lines.map((line) => [line.id, nameOf(line)]));
  const rows = of.lines.map((line, i): Row => {
    const one = count.lines[i]!;
    const { id, verdict, base, uses, made, written, writtenSpan, said, odd, unread, atFault, message, asks, sizes } =
      one;
    return {
      id,
      kind: line.kind,
      name: nameOf(line),
      spoken: spokenNameOf(line),
      text: line.text,
      whole: from({ start: line.span.start, end: Math.max(line.span.end, line.textSpan.end) }, of.span.start),
      body: from(line.textSpan, of.span.start),
      uncertain: line.uncertain,
      follows: one.follows ? (names.get(one.follows.line) ?? null) : null,
      verdict,
      base,
      uses,
      count: one.count,
      made,
      written,
      writtenSpan,
      said,
      odd,
      unread,
      atFault,
      message,
      asks,
      sizes,
    };
  });
  const { id, name, make, worked } = input;
  return { id, name, make, worked, rows, stitches: stitchesOf(input, count.lines) };
}
