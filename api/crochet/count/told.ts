import { type Span } from '../span.ts';
import { type LineTree, type ReadLine, type Totals } from '../language/tree.ts';
import { allItems } from './tree-walk.ts';
import { type Given, type Judged } from './judge.ts';
import { type LineCount, type RoundCount, type RowCount } from './result.ts';
import { madeOf, workOf } from './tally.ts';
import { type Around } from './count-line.ts';
import { type Pass } from './passes.ts';

export function loopsOf(read: ReadLine): LineCount['loops'] {
  const works = allItems(read.tree.items).filter(
    (item) => item.type === 'work' && item.stitch !== 'ch' && item.stitch !== 'slst',
  );
  const kinds = new Set(
    works.map((item) => (item.type === 'work' ? (item.loops ?? read.tree.loops ?? 'both') : 'both')),
  );
  if (kinds.size > 1) return 'mixed';
  return [...kinds][0] ?? read.tree.loops ?? 'both';
}

/** Stitches; or blocks and groups, where the total counts those and comes out. */
export function countOf({ work, verdict }: Judged, given: Given): number {
  const kinds = Object.entries(given.written ?? {});
  const [kind, figures] = kinds[0] ?? ['sts', []];
  const isGrouped = kinds.length === 1 && ['group', 'shell', 'vst'].includes(kind) && verdict === 'agrees';
  return isGrouped ? (figures[0] ?? work.tally.sts) : work.tally.sts;
}

/** One entry a round where the rounds of a range do not all come out the same. */
export function roundsOf(
  judged: readonly Judged[],
  passes: readonly Pass[],
  given: Given,
  around: Around,
): RoundCount[] | null {
  if (judged.length < 2) return null;
  const isEven = judged.every(
    (one) => one.work.tally.sts === judged[0]!.work.tally.sts && one.work.base === judged[0]!.work.base,
  );
  if (isEven) return null;
  const figures = given.written?.sts;
  const perRound = around.sizes === 1 && figures?.length === judged.length;
  return judged.map((one, i) => {
    const isLast = i === judged.length - 1;
    const stated: Totals | null = perRound ? { sts: [figures[i]!] } : isLast ? given.written : null;
    return { n: passes[i]?.n ?? i + 1, base: one.work.base, stated, count: one.work.tally.sts, verdict: one.verdict };
  });
}

/** One entry a row where a group of rows is repeated. */
export function rowsOf(judged: readonly Judged[], passes: readonly Pass[], given: Given): RowCount[] | null {
  const isGroup = new Set(passes.map((pass) => pass.source)).size > 1;
  if (!isGroup) return null;
  return judged.map(({ work, verdict }, i) => ({
    from: passes[i]!.n,
    to: passes[i]!.n,
    source: passes[i]!.source ?? passes[i]!.n,
    work: workOf(work.walk),
    base: work.base,
    uses: work.uses,
    stated: i === judged.length - 1 ? given.written : null,
    count: work.tally.sts,
    made: madeOf(work.tally),
    verdict,
  }));
}

export function lastSpan(tree: LineTree): Span | null {
  const working = tree.items.filter((item) => item.type !== 'note' && item.type !== 'step');
  return working.at(-1)?.span ?? null;
}
