import { type Group, type Item, type LineTree, type Relative, type Work } from '../language/tree.ts';
import { stitchOf } from '../stitches.ts';

/** The one item of a line that is told by another line, or null. */
export function relativeOf(tree: LineTree): Relative | null {
  const working = tree.items.filter((item) => item.type !== 'note' && item.type !== 'step' && item.type !== 'loops');
  const first = working.find((item) => item.type === 'relative');
  return first?.type === 'relative' ? first : null;
}

/** Whether work of its own stands beside the reference (`rep R3, then 6 sc`). */
export const isMixed = (tree: LineTree): boolean =>
  tree.items.some((item) => item.type === 'relative') &&
  tree.items.some((item) => item.type === 'work' || item.type === 'group');

/**
 * The tree with so many more plain stitches before each shaping.
 *
 * @example `(2 sc, inc) × 6` with one more is `(3 sc, inc) × 6`.
 */
export function withMore(tree: LineTree, more: number): LineTree {
  return more === 0 ? tree : { ...tree, items: moreIn(tree.items, more) };
}

function moreIn(items: readonly Item[], more: number): readonly Item[] {
  if (items.some((item) => item.type === 'group' && !item.into)) {
    return items.map((item) =>
      item.type === 'group' && !item.into ? { ...item, items: moreInGroup(item.items, more) } : item,
    );
  }
  const only = items.findIndex((item) => isShaping(item));
  const shaping = items[only];
  if (shaping?.type !== 'work') return items;
  // `inc × 6` becomes `(sc, inc) × 6`.
  const group: Group = {
    type: 'group',
    span: shaping.span,
    items: [plainBefore(shaping, more), { ...shaping, times: { type: 'n', n: [1] }, multiplied: false }],
    times: shaping.times,
    into: null,
    mark: '(',
    stop: null,
  };
  return [...items.slice(0, only), group, ...items.slice(only + 1)];
}

function moreInGroup(items: readonly Item[], more: number): readonly Item[] {
  const index = items.findIndex(
    (item) => item.type === 'work' && !isShaping(item) && item.stitch !== 'ch' && item.times.type === 'n',
  );
  const plain = items[index];
  if (plain?.type === 'work' && plain.times.type === 'n') {
    const wider: Work = { ...plain, times: { type: 'n', n: plain.times.n.map((n) => n + more) } };
    return items.map((item, i) => (i === index ? wider : item));
  }
  const shaping = items.find((item) => isShaping(item)) as Work | undefined;
  return shaping ? [plainBefore(shaping, more), ...items] : items;
}

const isShaping = (item: Item): boolean =>
  item.type === 'work' && (['increase', 'decrease'].includes(stitchOf(item.stitch)?.family ?? '') || item.per[0]! > 1);

const plainBefore = (shaping: Work, more: number): Work => {
  const base = /^([a-z]+?)\d+tog$/.exec(shaping.stitch)?.[1];
  const stitch = base ?? (stitchOf(shaping.stitch)?.family === 'plain' ? shaping.stitch : 'sc');
  return { ...shaping, stitch, per: [1], times: { type: 'n', n: [more] }, into: null, glued: false, multiplied: false };
};
