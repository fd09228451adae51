import { type Group, type Item, type LineTree, type Work } from '../language/tree.ts';

/** What the words leave open, and what is taken for now. The first of each is the usual one. */
export interface Choices {
  /** `rep from * 3 times`: three in all, or three more. */
  readonly rep: 'all' | 'more';
  /** `2sc` in a series: an increase, or two stitches. */
  readonly pair: 'plain' | 'increase';
  /** `× 4` behind a series without a bracket: the last, or all of it. */
  readonly tail: 'last' | 'all';
  /** A group with no words behind it: as often as there is room, or once. */
  readonly unsaid: 'fill' | 'once';
  /** A starting chain of which nothing is said: a stitch or none. */
  readonly chain: 'usual' | 'other';
  /** Chains of the line before as places for stitches. */
  readonly chains: 'spaces' | 'places';
  /** A last repeat cut short without a word. */
  readonly cut: 'whole' | 'cut';
  /** `dec 2`: two decreases, or one over two. */
  readonly dec: 'several' | 'one';
  /** A whole line without words of repeat: once, or all round. */
  readonly whole: 'once' | 'round';
}

export const USUAL: Choices = {
  rep: 'all',
  pair: 'plain',
  tail: 'last',
  unsaid: 'fill',
  chain: 'usual',
  chains: 'spaces',
  cut: 'whole',
  dec: 'several',
  whole: 'once',
};

type Key = keyof Choices;

const OTHER: Readonly<Record<Key, string>> = {
  rep: 'more',
  pair: 'increase',
  tail: 'all',
  unsaid: 'once',
  chain: 'other',
  chains: 'places',
  cut: 'cut',
  dec: 'one',
  whole: 'round',
};

/** Which choices a line leaves open at all. */
export function openChoices(tree: LineTree): Key[] {
  const keys = new Set<Key>();
  const works = tree.items.filter((item) => item.type === 'work' || item.type === 'group' || item.type === 'skip');
  const last = works.at(-1);
  if (
    works.length > 1 &&
    last &&
    ((last.type === 'work' && last.multiplied) ||
      (last.type === 'group' && last.mark === '' && last.times.type === 'n' && !last.into)) &&
    works.every((item) => item.type !== 'group' || item === last)
  )
    keys.add('tail');
  if (works.length > 1 && works.every((item) => isSmall(item))) keys.add('whole');
  if (isUnitRound(works) || (works.length === 1 && isBare(works[0]!))) keys.add('whole');
  look(tree.items, keys, 0);
  // Who writes `inc` for two in one place writes `2sc` for two stitches in a row.
  if (hasIncrease(tree.items)) keys.delete('pair');
  return [...keys];
}

/** `sc, inc around`: the words of the last stitch may be meant for all before it. */
function isUnitRound(works: readonly Item[]): boolean {
  const last = works.at(-1);
  return (
    works.length > 1 &&
    works[0]?.type === 'work' &&
    works[0].stitch !== 'ch' &&
    isOpenEnd(last) &&
    works.slice(0, -1).every((item) => isSmall(item))
  );
}

const isOpenEnd = (item: Item | undefined): item is Work =>
  item?.type === 'work' &&
  item.times.type === 'fill' &&
  item.times.leave[0] === 0 &&
  item.times.to === null &&
  (item.into === null || (item.into.what === 'st' && item.into.which === 'next'));

/** A line that is only the name of a stitch: `Rounds 6–16: sc`. */
const isBare = (item: Item): boolean =>
  item.type === 'work' &&
  item.into === null &&
  item.times.type === 'n' &&
  item.times.n[0] === 1 &&
  item.per[0] === 1 &&
  !item.multiplied &&
  !['ch', 'slst', 'picot'].includes(item.stitch);

const isSmall = (item: Item): boolean =>
  item.type === 'skip' ||
  (item.type === 'work' &&
    item.times.type === 'n' &&
    item.into?.what !== 'ring' &&
    item.into?.which !== 'hook' &&
    item.into?.which !== 'first' &&
    item.into?.which !== 'last' &&
    (item.into === null || item.into.what === 'st'));

function look(items: readonly Item[], keys: Set<Key>, depth: number): void {
  const isSeries = items.filter((item) => item.type === 'work').length > 1;
  items.forEach((item, i) => {
    if (item.type === 'group') {
      if (item.times.type === 'rep') keys.add('rep');
      if (item.times.type === 'unsaid' && !item.into) keys.add('unsaid');
      if (item.times.type === 'fill') keys.add('cut');
      look(item.items, keys, depth + 1);
    } else if (item.type === 'work') {
      if (isPair(item) && (isSeries || depth > 0) && (item.glued || isBesideItself(items, i))) keys.add('pair');
      if (item.stitch === 'ch' && i <= 3 && depth === 0) keys.add('chain');
      if (item.behind) keys.add('dec');
      if (item.times.type === 'fill' || item.into === null) keys.add('chains');
    }
  });
}

/** `2sc`, `2 sc` without a place. */
export const isPair = (item: Work): boolean =>
  item.into === null &&
  item.times.type === 'n' &&
  item.times.n.length === 1 &&
  item.times.n[0]! >= 2 &&
  item.times.n[0]! <= 3 &&
  !['ch', 'slst', 'inc', 'dec', 'invdec', 'st', 'picot'].includes(item.stitch) &&
  !item.stitch.endsWith('tog') &&
  !item.multiplied &&
  !item.colour;

/** A writer who says `sc, 2 sc` cannot mean three plain stitches: the second is an increase. */
export function usualFor(tree: LineTree): Choices {
  const pair = hasNeighbours(tree.items) && !hasIncrease(tree.items) ? 'increase' : USUAL.pair;
  // `sc, inc around` shapes all round; `dec, sc around` goes on plain to the end.
  const works = tree.items.filter((item) => item.type === 'work' || item.type === 'group' || item.type === 'skip');
  const last = works.at(-1);
  const isShaping = last?.type === 'work' && /^(inc|dec|invdec|.*tog)$/.test(last.stitch);
  return { ...USUAL, pair, whole: isShaping && isUnitRound(works) ? 'round' : USUAL.whole };
}

function hasNeighbours(items: readonly Item[]): boolean {
  return items.some((item, i) => (item.type === 'group' ? hasNeighbours(item.items) : isBesideItself(items, i)));
}

/** A pair beside plain stitches of the same kind. */
function isBesideItself(items: readonly Item[], i: number): boolean {
  const item = items[i];
  if (item?.type !== 'work' || !isPair(item)) return false;
  const isLike = (other: Item | undefined): boolean =>
    other?.type === 'work' &&
    other.stitch === item.stitch &&
    other.times.type === 'n' &&
    (other.into === null || (other.into.which === 'next' && other.into.what !== 'edge')) &&
    other.per[0] === 1 &&
    other.loops === item.loops;
  return isLike(items[i + 1]) || isLike(items[i - 1]);
}

function hasIncrease(items: readonly Item[]): boolean {
  return items.some((item) =>
    item.type === 'group'
      ? hasIncrease(item.items)
      : item.type === 'work' && (item.stitch === 'inc' || (item.per[0]! > 1 && item.into?.what === 'st')),
  );
}

/** The choices with one of them taken the other way. */
export const turned = (choices: Choices, key: Key): Choices => ({
  ...choices,
  [key]: choices[key] === USUAL[key] ? OTHER[key] : USUAL[key],
});

/** Every mixture of what is open, the usual one first, then one turned at a time, then two. Made only as asked for. */
export function* mixtures(tree: LineTree, usual: Choices): Generator<Choices> {
  yield usual;
  const open = openChoices(tree);
  for (const key of open) yield turned(usual, key);
  for (const [i, key] of open.entries()) for (const other of open.slice(i + 1)) yield turned(turned(usual, key), other);
}

/** The tree with `tail` and `whole` taken as chosen. */
export function shaped(tree: LineTree, choices: Choices): readonly Item[] {
  if (choices.tail === 'last' && choices.whole === 'once') return tree.items;
  const isWork = (item: Item) => item.type === 'work' || item.type === 'group' || item.type === 'skip';
  const first = tree.items.findIndex(isWork);
  const end = tree.items.findLastIndex(isWork);
  const last = tree.items[end];
  if (!last || first < 0) return tree.items;
  const before = tree.items.slice(first, end);
  let group: Group;
  if (choices.tail === 'all' && last.type === 'work' && last.multiplied) {
    group = { ...wrapped([...before, { ...last, times: { type: 'n', n: [1] } }]), times: last.times };
  } else if (choices.tail === 'all' && last.type === 'group') group = { ...last, items: [...before, ...last.items] };
  else group = wrapped([...before, isOpenEnd(last) ? { ...last, times: { type: 'n', n: [1] } } : last]);
  return [...tree.items.slice(0, first), group, ...tree.items.slice(end + 1)];
}

function wrapped(items: readonly Item[]): Group {
  const span = { start: items[0]!.span.start, end: items.at(-1)!.span.end };
  return {
    type: 'group',
    span,
    items,
    times: { type: 'fill', leave: [0], leaveOf: null, to: null },
    into: null,
    mark: '',
    stop: null,
  };
}
