import { type Item, type Work } from '../language/tree.ts';
import { stitchOf } from '../stitches.ts';
import { NOTHING, plainLeft, type Left } from './places.ts';
import { firstStitch } from './start.ts';
import { pick } from './job.ts';
import { allItems, targetsIn } from './tree-walk.ts';

/** Loops that a back- or front-loop line left free, by line number. */
export type FreeLoops = ReadonlyMap<number, FreeLoop>;

/** Loops worked into, and how many of the others so stay free. */
export interface FreeLoop {
  readonly loops: 'back' | 'front' | 'third';
  /** One figure a size. */
  readonly n: readonly number[];
}

/** A chain at the start that the same line works into: `ch 14, sc in 2nd ch from hook and in each ch across`. */
export function ownChain(items: readonly Item[], size: number): { chains: number; index: number } | null {
  const index = items.findIndex((item) => item.type === 'work');
  const first = items[index];
  if (first?.type !== 'work' || first.stitch !== 'ch' || first.times.type !== 'n') return null;
  const next = items
    .slice(index + 1)
    .find((item) => item.type !== 'note' && (item.type !== 'step' || item.what === 'far'));
  const isHook = (item: Item | undefined): boolean =>
    (item?.type === 'work' && item.into?.which === 'hook') || (item?.type === 'group' && item.into?.which === 'hook');
  if (!isHook(next) && !(next?.type === 'skip' && next.of?.what === 'ch')) return null;
  return { chains: pick(first.times.n, size), index };
}

/** A chain joined into a ring at the start of the line that goes on into it: `ch 5, join in a ring, 12 dc in ring`. */
export function ownRing(items: readonly Item[], size: number): { chains: number; index: number } | null {
  const index = items.findIndex((item) => item.type === 'work');
  const first = items[index];
  if (first?.type !== 'work' || first.stitch !== 'ch' || first.times.type !== 'n') return null;
  const next = index + 1 + items.slice(index + 1).findIndex((item) => item.type !== 'note');
  const join = items[next];
  const isJoin = join?.type === 'step' && (join.what === 'ring' || join.what === 'join') && next > index;
  const goesOn = items.slice(next + 1).some((item) => item.type === 'work' || item.type === 'group');
  return isJoin && goesOn ? { chains: pick(first.times.n, size), index: next } : null;
}

/** One slip stitch, into the first chain or nowhere named; a row of them is fabric. */
const isJoining = ({ times, per, into }: Work): boolean =>
  times.type === 'n' && times.n[0] === 1 && per[0] === 1 && into?.which !== 'hook' && into?.which !== 'each';

/** A line that is only a chain, perhaps joined into a ring. */
export function foundationOf(items: readonly Item[], size: number): Left | null {
  const works = items.filter(
    (item) =>
      item.type === 'work' ||
      item.type === 'group' ||
      item.type === 'skip' ||
      item.type === 'relative' ||
      item.type === 'straight' ||
      item.type === 'shaped',
  );
  const only = works.every(
    (item): item is Work =>
      item.type === 'work' && (item.stitch === 'ch' || (item.stitch === 'slst' && works.length > 1 && isJoining(item))),
  );
  const first = works[0];
  if (!only || first?.type !== 'work' || first.stitch !== 'ch' || first.times.type !== 'n') return null;
  const isRing =
    works.length > 1 || items.some((item) => item.type === 'step' && (item.what === 'ring' || item.what === 'join'));
  return { ...NOTHING, shape: isRing ? 'ring' : 'chain', chains: pick(first.times.n, size), open: false };
}

export interface Base {
  readonly left: Left;
  /** Chains skipped before the first stitch; 0 where the base is no chain. */
  readonly hook: number;
  /** Base as it is told, where it is not the number of counted places (a ring of chains). */
  readonly told: number | null;
}

/** Places along a chain, once or along both sides, from the chain that the first stitch goes into. */
export function chainBase(chains: number, items: readonly Item[], isRing: boolean): Base {
  const all = allItems(items);
  const targets = targetsIn(items);
  if (isRing) {
    const isIntoChains =
      targets.some((target) => target.what === 'ch' || target.what === 'st-or-ch' || target.what === 'st') ||
      all.some((item) => (item.type === 'work' || item.type === 'group') && item.times.type === 'fill');
    const inRing = targets.some((target) => target.what === 'ring' || target.what === 'sp') || !isIntoChains;
    const left: Left = { ...plainLeft(chains), shape: 'ring', open: inRing };
    return { left, hook: 0, told: inRing ? chains : null };
  }
  const hook = hookOf(all, chains);
  const places = Math.max(0, chains - hook + 1);
  const far = all.some(
    (item) => (item.type === 'step' && item.what === 'far') || (item.type === 'work' && item.into?.which === 'far'),
  );
  const n = far ? 2 * places - 1 : places;
  return { left: plainLeft(n), hook, told: null };
}

/** Which chain from the hook the first stitch goes into: the one named, else what its height asks for. */
function hookOf(all: readonly Item[], chains: number): number {
  for (const item of all) {
    const target = item.type === 'work' || item.type === 'group' ? item.into : item.type === 'skip' ? item.of : null;
    if (target?.which === 'hook') return target.n ?? 2;
    if (item.type === 'skip' && target?.which === 'first') return pick(item.n, 0) + 1;
    if (
      item.type === 'skip' &&
      all.indexOf(item) <= 1 &&
      (target === null || target.what === 'ch' || target.what === 'st')
    )
      return pick(item.n, 0) + 1;
  }
  const stitch = firstStitch(all);
  const height = stitch ? (stitchOf(stitch)?.height ?? 1) : 1;
  return chains === 1 ? 1 : Math.max(2, height + 1);
}
