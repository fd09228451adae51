import { type Span, type Terms } from '../span.ts';
import { readPattern } from '../language/pattern/read-pattern.ts';
import { type LineText, type PatternText } from '../language/pattern/pattern-text.ts';
import { type Totals } from '../language/tree.ts';
import { type PatternInput } from './input.ts';
import { countPattern } from './pattern.ts';
import { type LineCount } from './result.ts';

/** A pattern text as the input of the count; ids are `piece.line`. */
export function inputOf(pattern: PatternText, base: number | null = null): PatternInput {
  return {
    terms: pattern.terms,
    sizes: pattern.sizes,
    specialStitches: pattern.specialStitches,
    base: base ?? pattern.base,
    pieces: pattern.pieces.map((piece, p) => ({
      id: String(p),
      name: piece.name,
      make: piece.make,
      worked: piece.worked,
      lines: piece.lines.map((line, i) => ({
        id: `${String(p)}.${String(i)}`,
        kind: line.kind,
        label: line.label,
        from: line.from,
        to: line.to,
        text: line.text,
        written: null,
        said: null,
      })),
    })),
  };
}

/** A written pattern counted, in the shape that the count command prints. */
export function countReport(
  text: string,
  options: { readonly terms?: Terms | null; readonly base?: number | null } = {},
): unknown {
  const pattern = readPattern(text, options.terms ?? undefined);
  const counted = countPattern(inputOf(pattern, options.base ?? null));
  /** A line followed is named by its label. */
  const labelOf = (id: string): string => {
    const [piece, line] = id.split('.').map(Number);
    return pattern.pieces[piece ?? 0]?.lines[line ?? 0]?.label ?? id;
  };
  return {
    terms: pattern.terms,
    pieces: pattern.pieces.map((piece, p) => ({
      name: piece.name,
      make: piece.make,
      lines: piece.lines.flatMap((line, i) => linesOf(line, counted.pieces[p]!.lines[i]!, labelOf)),
    })),
  };
}

const place = (start: number, span: Span): Span => ({ start: start + span.start, end: start + span.end });

function linesOf(line: LineText, count: LineCount, labelOf: (id: string) => string): unknown[] {
  if (line.kind === 'note') return [];
  const { start, end } = line.span;
  if (line.kind === 'step')
    return [
      {
        kind: 'step',
        from: null,
        to: null,
        label: line.label,
        start,
        end,
        work: [],
        loops: 'both',
        base: null,
        uses: null,
        stated: null,
        count: null,
        verdict: 'no-total',
        unread: [],
      },
    ];
  const one = {
    kind: line.kind,
    from: line.from,
    to: line.to,
    label: line.label,
    start,
    end,
    work: count.work,
    loops: count.loops,
    base: count.base,
    uses: count.uses,
    stated: statedOf(count.written),
    count: count.count,
    made: count.made,
    verdict: count.verdict,
    unread: count.unread.map((span) => place(line.textSpan.start, span)),
    ...(count.countedWith && { countedWith: count.countedWith }),
    ...(count.follows && { follows: { ...count.follows, line: labelOf(count.follows.line) } }),
    ...(count.rounds && { rounds: count.rounds.map((round) => ({ ...round, stated: statedOf(round.stated) })) }),
    ...(count.message && { message: count.message }),
    ...(count.asks.length > 0 && { asks: count.asks }),
    ...(count.sizes.length > 0 && { sizes: count.sizes }),
  };
  return count.rows ? count.rows.map((row) => ({ ...one, ...row, stated: statedOf(row.stated) })) : [one];
}

/** A plain number alone, else an object with the kinds that were made. */
function statedOf(totals: Totals | null): unknown {
  if (!totals) return null;
  const kinds = Object.entries(totals);
  if (kinds.length === 1 && kinds[0]![0] === 'sts') return kinds[0]![1][0] ?? null;
  return Object.fromEntries(kinds.map(([kind, figures]) => [kind, figures[0]]));
}
