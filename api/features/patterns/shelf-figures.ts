import type { LineCount, PatternCount } from '#crochet';
import type { Counted } from '#contract/pattern-input';
import type { ShelfPattern } from '#contract/shelf';

type Lines = readonly (Counted['lines'][number] & { readonly isMarked: boolean })[];

const isWorked = ({ kind }: { kind: string }) => kind === 'round' || kind === 'row';

/** Stitches of each round or row that a line stands for, in order; what could not be counted is left out. */
export function roundTotals(line: Lines[number], count: LineCount | undefined): number[] {
  if (!count || !isWorked(line)) return [];
  if (count.rounds) return count.rounds.flatMap((round) => (round.count === null ? [] : [round.count]));
  const given = count.count ?? count.written?.sts?.[0] ?? count.said?.sts?.[0];
  if (given === undefined) return [];
  const rounds = line.from !== null && line.to !== null ? line.to - line.from + 1 : 1;
  return Array.from({ length: Math.max(1, rounds) }, () => given);
}

const WORST_FIRST = ['unread', 'does-not-fit', 'differs'] as const;

/** What a pattern's counts come to on the shelf. */
export function shelfFigures(
  pattern: Pick<Counted, 'pieces'> & { readonly lines: Lines },
  count: PatternCount,
  isFilmed: boolean,
): Pick<ShelfPattern, 'lines' | 'stitches' | 'needs' | 'lastMarked' | 'unmarked' | 'print'> {
  const counts = new Map(count.pieces.flatMap((piece) => piece.lines.map((line) => [line.id, line] as const)));
  const byPiece = pattern.pieces.map((piece) => ({
    piece,
    lines: pattern.lines.filter((line) => line.pieceId === piece.id),
  }));
  const totalsOf = (lines: Lines) => lines.flatMap((line) => roundTotals(line, counts.get(line.id)));

  const needs = byPiece.flatMap(({ piece, lines }) =>
    lines.flatMap((line) => {
      const verdict = counts.get(line.id)?.verdict;
      return verdict && WORST_FIRST.some((worst) => worst === verdict)
        ? [{ verdict, lineId: line.id, label: line.label, piece: piece.name }]
        : [];
    }),
  );
  const rank = (verdict: string) => WORST_FIRST.findIndex((worst) => worst === verdict);
  needs.sort((a, b) => rank(a.verdict) - rank(b.verdict));

  const wanted = isFilmed ? byPiece.flatMap(({ lines }) => lines.filter(isWorked)) : [];
  const last = wanted.findLastIndex((line) => line.isMarked);
  const stitches = byPiece.reduce((sum, { piece, lines }) => sum + piece.make * sumOf(totalsOf(lines)), 0);
  const first = byPiece.find(({ lines }) => lines.some(isWorked));
  return {
    lines: pattern.lines.filter(({ kind }) => kind !== 'note').length,
    stitches: stitches === 0 ? null : stitches,
    needs,
    lastMarked: last >= 0 && last < wanted.length - 1 ? (wanted[last]?.label ?? null) : null,
    unmarked: wanted.filter((line) => !line.isMarked).length,
    print: first ? { form: first.piece.worked === 'rows' ? 'rows' : 'rings', totals: totalsOf(first.lines) } : null,
  };
}

const sumOf = (figures: readonly number[]) => figures.reduce((sum, figure) => sum + figure, 0);

/** What waits for a person: creators mend what a count found, editors proofread; what is out and quiet is at rest. */
export function shelfGroup(
  pattern: Pick<ShelfPattern, 'state' | 'needs'>,
  role: 'owner' | 'creator' | 'editor',
): ShelfPattern['group'] {
  if (pattern.state === 'reading') return 'in-hand';
  if (pattern.state === 'in-proof') return role === 'editor' ? 'waiting' : 'in-hand';
  if (pattern.needs.length > 0) return role === 'editor' ? 'in-hand' : 'waiting';
  return pattern.state === 'published' ? 'at-rest' : 'in-hand';
}
