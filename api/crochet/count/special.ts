import { type Item } from '../language/tree.ts';
import { readLine } from '../language/read-line.ts';
import { keyOf } from '../language/special.ts';
import { type Terms } from '../span.ts';
import { type SpecialStitch } from './input.ts';

/** What each stitch of the pattern's own is made of: `Shell: 5 dc in one st` is five dc on the place it goes into. */
export function ownStitches(special: readonly SpecialStitch[], terms: Terms): Map<string, readonly Item[]> {
  const own = new Map<string, readonly Item[]>();
  for (const stitch of special) {
    const read = readLine(stitch.text, { terms });
    const items = read.tree.items.flatMap((item) =>
      item.type === 'group' && item.times.type !== 'fill'
        ? [item]
        : item.type === 'work' && item.times.type === 'n'
          ? [flat(item)]
          : [],
    );
    if (items.length > 0 && read.unread.length === 0 && !isClosing(stitch.text)) own.set(keyOf(stitch), items);
  }
  return own;
}

/** A stitch that is drawn together at the top is one stitch, whatever its legs. */
const isClosing = (text: string): boolean =>
  /yo|yarn over|yrh|draw through|pull through|tog|remaining loops|loops? on hook/i.test(text);

const flat = (item: Extract<Item, { type: 'work' }>): Item => ({
  ...item,
  times: item.into && item.times.type === 'n' ? item.times : item.times,
});
