import { type Item, type Target } from '../language/tree.ts';

/** Trees are never changed, so what is in a list of items is gathered once. */
const ITEMS = new WeakMap<readonly Item[], readonly Item[]>();
const TARGETS = new WeakMap<readonly Item[], readonly Target[]>();

/** Every item at any depth, groups before what stands in them. */
export function allItems(items: readonly Item[]): readonly Item[] {
  const known = ITEMS.get(items);
  if (known) return known;
  const all: Item[] = [];
  gather(items, all);
  ITEMS.set(items, all);
  return all;
}

function gather(items: readonly Item[], all: Item[]): void {
  for (const item of items) {
    all.push(item);
    if (item.type === 'group') gather(item.items, all);
  }
}

/** Every place that is named, in the order of the text. */
export function targetsIn(items: readonly Item[]): readonly Target[] {
  const known = TARGETS.get(items);
  if (known) return known;
  const targets = allItems(items).flatMap((item) =>
    (item.type === 'work' || item.type === 'group') && item.into ? [item.into] : [],
  );
  TARGETS.set(items, targets);
  return targets;
}

/** Whether the line goes over what short rows before it left: it speaks of skipped stitches and skips none itself. */
export const takesBack = (items: readonly Item[]): boolean =>
  targetsIn(items).some((target) => target.which === 'skipped') &&
  !allItems(items).some((item) => item.type === 'skip');

/** Whether the line works along the ends of rows. */
export const isAlongRows = (items: readonly Item[]): boolean =>
  targetsIn(items).some((target) => target.what === 'row-end');
