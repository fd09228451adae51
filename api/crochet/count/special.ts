import { type Item } from '../language/tree.ts';
import { readLine } from '../language/read-line.ts';
import { keyOf } from '../language/special.ts';
import { type Terms } from '../span.ts';
import { type SpecialStitch } from './input.ts';
import { allItems } from './tree-walk.ts';

/** What each stitch of the pattern's own is made of: `Shell: 5 dc in one st` is five dc on the place it goes into. */
export function ownStitches(special: readonly SpecialStitch[], terms: Terms): Map<string, readonly Item[]> {
  const own = new Map<string, readonly Item[]>();
  for (const stitch of special) {
    const read = readLine(stitch.text, { terms });
    const items = read.tree.items.filter(
      (item) =>
        (item.type === 'group' && item.times.type !== 'fill') || (item.type === 'work' && item.times.type === 'n'),
    );
    if (items.length > 0 && read.unread.length === 0 && !isClosing(stitch.text)) own.set(keyOf(stitch), items);
  }
  return withoutCircles(own);
}

/** A stitch told by itself, also by way of others, is no stitch that can be worked. */
function withoutCircles(own: ReadonlyMap<string, readonly Item[]>): Map<string, readonly Item[]> {
  const isSound = new Map<string, boolean>();
  const sound = (key: string): boolean => {
    const known = isSound.get(key);
    if (known !== undefined) return known;
    isSound.set(key, false);
    const inner = allItems(own.get(key)!).flatMap((item) => (item.type === 'work' ? [item.stitch] : []));
    const is = inner.every((other) => !own.has(other) || sound(other));
    isSound.set(key, is);
    return is;
  };
  return new Map([...own].filter(([key]) => sound(key)));
}

/** A stitch that is drawn together at the top is one stitch, whatever its legs. */
const isClosing = (text: string): boolean =>
  /yo|yarn over|yrh|draw through|pull through|tog|remaining loops|loops? on hook/i.test(text);
