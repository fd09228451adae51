import { type FreeLoop } from './base.ts';
import { type Item, type Target } from '../language/tree.ts';
import { NOTHING, PLAIN, plainLeft, type Left } from './places.ts';
import { allItems } from './tree-walk.ts';
import { type Step } from './walker.ts';

/** Stitches passed over and the chain made across them, once or several times along a line: armholes, thumbs, slits. */
export interface Opening {
  readonly skipped: number;
  readonly chains: number;
}

/** What a piece worked earlier offers to the pieces after it. */
export interface Finished {
  /** Its heading, in lower case. */
  readonly name: string;
  /** What its last line left, one a size. */
  readonly lefts: readonly Left[];
  readonly rows: number;
  /** Loops that its lines left free, by line number. */
  readonly free: ReadonlyMap<number, FreeLoop>;
  readonly opening: Opening | null;
}

const single = (word: string): string => word.replace(/(?:ves|s)$/u, (tail) => (tail === 'ves' ? 'f' : ''));

/** Stitches along the last line of the piece that a line names; null where there is no such piece or its number is not known. */
export function edgeOf(finished: readonly Finished[], target: Target, size: number): number | null {
  const noun = single(target.piece ?? '');
  const piece = finished.findLast(({ name }) => name.split(/[^\p{L}]+/u).some((word) => single(word) === noun));
  const left = piece && (piece.lefts[size] ?? piece.lefts[0]);
  return left && !left.open ? left.count : null;
}

/** The first opening of a line: places skipped side by side, and the chain beside them. */
export function openingOf(walk: readonly Step[]): Opening | null {
  const runs: { stitch: string; n: number }[] = [];
  for (const { stitch } of walk) {
    const last = runs.at(-1);
    if (last?.stitch === stitch) last.n += 1;
    else runs.push({ stitch, n: 1 });
  }
  for (const [i, run] of runs.entries()) {
    if (run.stitch !== 'sk' || run.n < LEAST) continue;
    const chain = [runs[i - 1], runs[i + 1]].find((one) => one?.stitch === 'ch');
    if (chain) return { skipped: run.n, chains: chain.n };
  }
  return null;
}

/** Fewer stitches passed over are lace, no opening. */
const LEAST = 3;

/** Whether a line goes round an opening and nowhere else: into stitches skipped before, and the chain across them. */
export function isRoundOpening(items: readonly Item[]): boolean {
  const targets = allItems(items).flatMap((item) =>
    (item.type === 'work' || item.type === 'group') && !(item.type === 'work' && item.stitch === 'ch')
      ? [item.into]
      : [],
  );
  return (
    targets.some((target) => target?.which === 'skipped') &&
    targets.every((target) => target?.which === 'skipped' || (target?.what === 'ch' && target.which !== 'hook'))
  );
}

/** An opening as places: its stitches, then its chain. */
export function openingLeft({ skipped, chains }: Opening): Left {
  const { made } = plainLeft(skipped);
  const left: Left = { ...NOTHING, open: false, shape: 'ring', count: skipped, made };
  return chains > 0 ? { ...left, made: [...made, { ...PLAIN, kind: 'chs', stitch: 'ch', chains }] } : left;
}
