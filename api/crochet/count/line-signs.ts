import { type Item } from '../language/tree.ts';
import { stitchOf } from '../stitches.ts';
import { allItems } from './tree-walk.ts';
import { type Ground } from './ground.ts';
import { pick, type Job } from './job.ts';
import { goalOf } from './named.ts';
import { type Place } from './places.ts';
import { Walker } from './walker.ts';
import { takeOne } from './take.ts';

/** Where the first side of a chain ends that is worked along both sides. */
export function sideEndOf(items: readonly Item[], places: number, hook: number): number {
  const isBoth = hook > 0 && allItems(items).some((item) => item.type === 'step' && item.what === 'far');
  return isBoth ? (places + 1) / 2 : 0;
}

/** Index of the place that travelling slip stitches end on. */
export function travelled(ground: Ground, slips: readonly Item[], size: number): number {
  const walker = new Walker(ground);
  for (const item of slips) {
    if (item.type !== 'work') continue;
    const n = item.times.type === 'n' ? pick(item.times.n, size) : 1;
    for (let i = 0; i < n; i += 1) {
      const target = goalOf(item) ?? item.into;
      takeOne(
        { walker } as Job,
        target?.which === 'first' || target?.which === 'same'
          ? { ...target, which: 'next', what: target.what === 'other' ? 'st' : target.what }
          : target,
        item,
      );
    }
  }
  return walker.last;
}

/** The first plain stitch named, which a bare `inc` or `dec` takes. */
export function firstPlain(items: readonly Item[]): string | null {
  for (const item of allItems(items)) {
    if (item.type !== 'work') continue;
    const family = stitchOf(item.stitch)?.family;
    if (family === 'plain') return item.stitch;
    const together = /^([a-z]+?)\d+tog$/.exec(item.stitch);
    if (together) return together[1]!;
  }
  return null;
}

/** A last slip stitch after everything: it finishes off and is no stitch of the line. */
export function closingSlip(items: readonly Item[]): Item | null {
  const all = items.filter((item) => item.type === 'work' || item.type === 'group' || item.type === 'skip');
  // `sl st, ch 1` closes the round and lifts the hook for the next.
  const final = all.at(-1);
  const works = final?.type === 'work' && final.stitch === 'ch' ? all.slice(0, -1) : all;
  const last = works.at(-1);
  const isSlip =
    last?.type === 'work' &&
    last.stitch === 'slst' &&
    last.times.type === 'n' &&
    last.times.n[0] === 1 &&
    (last.into === null || last.into.what === 'st' || last.into.what === 'sp');
  return isSlip &&
    works.length > 1 &&
    works.slice(0, -1).every((item) => item.type !== 'work' || item.stitch !== 'slst')
    ? last
    : null;
}

/** Markers stand where the maker put them; unknown, they are taken as evenly placed. */
export function marksOf(items: readonly Item[], places: readonly Place[], size: number): number[] {
  let n = 0;
  const visit = (list: readonly Item[], factor: number): void => {
    for (const item of list) {
      if (item.type === 'group') visit(item.items, factor * (item.times.type === 'n' ? pick(item.times.n, size) : 1));
      else if (
        item.type === 'work' &&
        (item.into?.what === 'mark' || (item.times.type === 'fill' && item.times.to?.what === 'mark'))
      )
        n += factor;
    }
  };
  visit(items, 1);
  return Array.from({ length: Math.min(n, places.length) }, (_, i) => Math.floor(((i + 0.5) * places.length) / n));
}
