import { type Item, type Target, type Work } from '../language/tree.ts';
import { type Named } from './places.ts';

/** All places aimed at; null is the next stitch. */
export function aimsIn(items: readonly Item[]): (Target | null)[] {
  const aims: (Target | null)[] = [];
  for (const item of items) {
    if (item.type === 'group' && !item.into) aims.push(...aimsIn(item.items));
    else if (item.type === 'work' || item.type === 'group') {
      if (item.type === 'work' && (item.stitch === 'ch' || item.stitch === 'picot')) continue;
      if (
        item.into?.which === 'first' ||
        item.into?.which === 'same' ||
        item.into?.what === 'ring' ||
        item.into?.what === 'edge'
      )
        continue;
      aims.push(
        item.into && item.into.which !== 'hook'
          ? item.into.which === 'nth' && item.into.of === undefined
            ? { ...item.into, which: 'next' }
            : item.into
          : null,
      );
    } else if (item.type === 'straight' || item.type === 'shaped') aims.push(null);
    else if (item.type === 'skip' && item.of?.what === 'sp') aims.push(item.of);
  }
  return aims;
}

interface Found {
  st: boolean;
  ch: boolean;
  gap: boolean;
  sps: Target[];
}

/** Which kinds of places a line works into. Travelling and joining slip stitches and skips name none. */
export function namedIn(items: readonly Item[]): Named {
  const found: Found = { st: false, ch: false, gap: false, sps: [] };
  const travels = travelling(items);
  walk(items.slice(travels), found);
  return found;
}

/** How many items at the start only travel: slip stitches before a starting chain. */
export function travelling(items: readonly Item[]): number {
  let n = 0;
  let slips = 0;
  for (const item of items) {
    const isSlip = item.type === 'work' && item.stitch === 'slst' && (item.times.type === 'n' || goalOf(item) !== null);
    if (isSlip) slips += 1;
    else if (item.type !== 'note' && item.type !== 'step' && item.type !== 'loops') break;
    n += 1;
  }
  const next = items[n];
  if (slips === 0) return 0;
  const last = items[n - 1];
  const isInSpace = last?.type === 'work' && last.into?.what === 'sp' && last.into.which === 'first';
  const isEachSpace = next?.type === 'group' && next.into?.what === 'sp' && next.into.which === 'each';
  return (next?.type === 'work' && next.stitch === 'ch') || (isInSpace && isEachSpace) ? n : 0;
}

/** `sl st along to ch-3 sp`: the place that the slip stitches go up to. */
export const goalOf = ({ times }: Work): Target | null => (times.type === 'fill' ? times.to : null);

function walk(items: readonly Item[], found: Found): void {
  let local = false;
  for (const [i, item] of items.entries()) {
    if (item.type === 'group') {
      if (item.into) note(item.into, found);
      walk(
        item.into
          ? item.items.filter((inner) => inner.type === 'work' && inner.into !== null && inner.into.which !== 'same')
          : item.items,
        found,
      );
      local = false;
    } else if (item.type === 'work') {
      // What is worked into a chain just made goes on along that chain.
      if (item.into?.which === 'hook') {
        local = true;
        continue;
      }
      if (item.stitch === 'ch' || item.stitch === 'picot') continue;
      // `ch 2, dc in first sc` at the end closes the last space.
      if (
        item.into?.which === 'first' &&
        i > 1 &&
        items[i - 1]?.type === 'work' &&
        (items[i - 1] as { stitch?: string }).stitch === 'ch' &&
        i > 2
      )
        continue;
      if (
        local &&
        !item.into?.stitch &&
        (item.into === null || item.into.what === 'st' || item.into.what === 'ch') &&
        item.times.type === 'n'
      )
        continue;
      if (item.into) note(item.into, found);
      else found.st = true;
    } else if (item.type === 'skip') {
      if (item.of?.what === 'sp') note(item.of, found);
      else if (item.of?.which === 'every') found.st = true;
    } else if (item.type === 'straight' || item.type === 'shaped') found.st = true;
    if (item.type === 'work' && item.times.type === 'fill' && item.times.to) {
      if (item.times.to.what === 'sp') note(item.times.to, found);
    }
  }
}

function note(target: Target, found: Found): void {
  switch (target.what) {
    case 'sp':
      found.sps.push(target);
      return;
    case 'gap':
      found.gap = true;
      return;
    case 'ch':
      if (target.which !== 'hook') found.ch = true;
      return;
    case 'st-or-ch':
      found.ch = true;
      found.st = true;
      return;
    case 'ring':
    case 'edge':
      return;
    case 'other':
      if (target.which !== 'same') found.st = true;
      return;
    default:
      if (target.which !== 'same') found.st = true;
  }
}
