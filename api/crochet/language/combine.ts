import { type Group, type Item, type Work } from './tree.ts';
import { FILL, times } from './times.ts';

const plainWork = (item: Item | undefined): Work | null =>
  item?.type === 'work' && item.per.length === 1 && item.per[0] === 1 && !item.into?.through ? item : null;

/** `sc around`, `sc in each st`: a plain stitch into every place. */
const isAllRound = (item: Item | undefined): boolean => {
  const work = plainWork(item);
  return work?.times.type === 'fill' && (work.into === null || work.into.which === 'each');
};

/**
 * What a sentence says of the stitches named just before it: `sc around, skip every fifth st`, `sc in each st, 2 sc in every
 * 3rd`, `2 sc in every 3rd st, 1 sc in the others`, `sc around, inc 6 evenly`. The items so far with the new ones laid on.
 */
export function combine(items: Item[], found: readonly Item[]): void {
  for (const item of found) {
    const last = items.at(-1);
    if (item.type === 'shaped' && (item.how === 'evenly' || item.how === 'each-end') && isAllRound(last)) items.pop();
    else if (item.type === 'work' && item.into?.which === 'every' && isAllRound(last)) items.pop();
    else if (item.type === 'work' && isShaping(item) && isAllRound(last)) {
      // `sc around and make 6 increases`.
      items[items.length - 1] = spread(item);
      continue;
    } else if (item.type === 'skip' && item.of?.which === 'every' && isSpread(items)) {
      items[items.length - 1] = skipping(last as Work, item, item.of.n ?? 2);
      continue;
    } else if (
      last?.type === 'work' &&
      last.into?.which === 'every' &&
      item.type === 'work' &&
      isAllRound(item) &&
      item.stitch === last.stitch
    ) {
      // The places between are worked plain anyhow.
      continue;
    }
    items.push(item);
  }
}

const isShaping = ({ stitch, into, times: count }: Work): boolean =>
  ['inc', 'dec', 'invdec'].includes(stitch) && into === null && count.type === 'n';

function spread({ span, stitch, times: count }: Work): Item {
  const n = count.type === 'n' ? count.n : [1];
  return {
    type: 'shaped',
    span,
    change: n.map((k) => (stitch === 'inc' ? k : -k)),
    how: 'evenly',
    every: 1,
    until: null,
  };
}

/** The last item is a plain stitch all round, or the only work so far. */
function isSpread(items: readonly Item[]): boolean {
  const last = items.at(-1);
  if (isAllRound(last)) return true;
  const works = items.filter((item) => item.type === 'work' && item.stitch !== 'ch');
  const work = plainWork(last);
  return work?.times.type === 'n' && works.length === 1 && work.times.n[0] === 1;
}

/** `skip every fifth`: four worked, one passed over, all round. */
function skipping(work: Work, skip: Extract<Item, { type: 'skip' }>, n: number): Group {
  return {
    type: 'group',
    span: { start: work.span.start, end: skip.span.end },
    items: [
      { ...work, times: times([Math.max(1, n - 1)]), into: null },
      { ...skip, n: [1], of: null },
    ],
    times: FILL,
    into: null,
    mark: '(',
    stop: null,
  };
}
