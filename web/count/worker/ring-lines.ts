import type { LineCount, LineInput, PieceInput } from '#crochet';
import type { RingLine } from '#crochet/shape';
import { nameOf } from './line-name.ts';

/** A range gives a ring for each of its rounds; rows told as a group give each of theirs. */
function countsOf(line: LineInput, count: LineCount): (number | null)[] {
  if (count.rows) return count.rows.map((row) => row.count);
  const many = line.from !== null && line.to !== null && line.to > line.from ? line.to - line.from + 1 : 1;
  const given = count.count ?? count.written?.sts?.[0] ?? null;
  return Array.from({ length: Math.min(many, 1_000) }, (_, i) => count.rounds?.[i]?.count ?? given);
}

/** A counted piece as ring map and staff need it. */
export function ringLines(piece: PieceInput, counts: readonly LineCount[]): RingLine[] {
  return piece.lines.flatMap((line, i): RingLine[] => {
    const count = counts[i];
    if (!count || (line.kind !== 'round' && line.kind !== 'row')) return [];
    const label = nameOf(line).replace(/^(?:R|Row )(?=\d)/, '');
    return [
      {
        id: line.id,
        label: label.replace(/^\d+–/, ''),
        counts: countsOf(line, count),
        verdict: count.verdict,
        walk: count.walk.map(({ on, makes }) => ({ on, makes })),
        isDone: true,
      },
    ];
  });
}
