import { foundationOf } from '../../count/base.ts';
import { hasWork } from '../groups.ts';
import { type Item, type ReadLine } from '../tree.ts';

/** Work in a sentence that could stand for a round: something with a count or a place, not prose with a stray word. */
export function isCounted(read: ReadLine): boolean {
  const { items } = read.tree;
  if (!hasWork(items)) return false;
  const works = items.filter(
    (item) =>
      item.type === 'work' ||
      item.type === 'group' ||
      item.type === 'relative' ||
      item.type === 'straight' ||
      item.type === 'shaped',
  );
  if (foundationOf(items, 0)) return true;
  const prose = items.reduce(
    (sum, item) =>
      sum +
      (item.type === 'note' || item.type === 'step' || item.type === 'unread' ? item.span.end - item.span.start : 0),
    0,
  );
  const size = read.tree.span.end - read.tree.span.start;
  if (read.total !== null) return works.length > 0;
  const isFirm = works.some((item) => isFirmWork(item));
  return isFirm && prose < size * 0.6;
}

const isFirmWork = (item: Item): boolean =>
  item.type === 'group' ||
  item.type === 'relative' ||
  (item.type === 'shaped' && item.until !== null) ||
  (item.type === 'work' &&
    (item.into !== null || item.times.type === 'fill' || (item.times.type === 'n' && item.times.n[0]! > 1)));
