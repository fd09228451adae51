import { type ReadLine } from '../language/tree.ts';
import { allItems } from './tree-walk.ts';

const SIZES = new WeakMap<ReadLine, number>();

/** How many sizes the figures of a line speak of; 1 where it has one figure everywhere. */
export function sizesIn(read: ReadLine): number {
  const known = SIZES.get(read);
  if (known !== undefined) return known;
  let most = 1;
  for (const item of allItems(read.tree.items)) {
    if (item.type === 'work' && item.times.type === 'n') most = Math.max(most, item.times.n.length);
    if (item.type === 'group' && item.times.type === 'n') most = Math.max(most, item.times.n.length);
    if (item.type === 'skip') most = Math.max(most, item.n.length);
  }
  SIZES.set(read, most);
  return most;
}
