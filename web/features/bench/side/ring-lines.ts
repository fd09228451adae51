import { type LineCount } from '#crochet';
import { type Line } from '#contract/rows';
import { type RingLine } from '#crochet/shape';
import { type Counts, isCounted } from '../desk/bench-count.ts';
import { knotLabel } from '../desk/line-name.ts';

/** A range of rounds gives a ring each; an open range gives one. */
function countsOf(line: Line, count: LineCount | undefined): (number | null)[] {
  const rounds = line.from !== null && line.to !== null && line.to > line.from ? line.to - line.from + 1 : 1;
  const given = count?.count ?? count?.written?.sts?.[0] ?? count?.said?.sts?.[0] ?? null;
  return Array.from({ length: rounds }, (_, i) => count?.rounds?.[i]?.count ?? given);
}

/** Lines of a piece as ring map and staff need them; `doneTo` is the line in hand, before which all is done. */
export function ringLines(lines: readonly Line[], counts: Counts, doneTo: string | null): RingLine[] {
  const counted = lines.filter((line) => isCounted(line.kind));
  const at = counted.findIndex((line) => line.id === doneTo);
  return counted.map((line, i) => {
    const count = counts.get(line.id);
    return {
      id: line.id,
      label: knotLabel(line).replace(/^\d+–/, ''),
      counts: countsOf(line, count),
      verdict: count?.verdict ?? 'no-total',
      walk: count?.walk ?? [],
      isDone: at < 0 || i < at,
    };
  });
}
