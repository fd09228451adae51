import { ONE } from './amounts.ts';
import { isWord, peek, type Reading } from './reading.ts';
import { type Item, type Work } from './tree.ts';

/**
 * `2 sc in first and last sts, sc between`: what was told last is worked between the first and the last place.
 *
 * @returns whether it stood here; then it is taken, and the items stand in the order of the work.
 */
export function readBetween(reading: Reading, items: Item[]): boolean {
  const lex = peek(reading);
  const next = peek(reading, 1);
  const isAlone = isWord(lex, 'gap') && (next.kind === 'mark' || next.kind === 'end');
  const [first, last, between] = items.slice(-3);
  if (!isAlone || !isAt(first, 'first') || !isAt(last, 'last') || !isPlainOne(between)) return false;
  const rest: Work = { ...between, times: { type: 'fill', leave: ONE, leaveOf: null, to: null } };
  items.splice(-2, 2, rest, last);
  reading.at += 1;
  return true;
}

const isAt = (item: Item | undefined, which: 'first' | 'last'): item is Work =>
  item?.type === 'work' && item.into?.what === 'st' && item.into.which === which && item.into.n === undefined;

const isPlainOne = (item: Item | undefined): item is Work =>
  item?.type === 'work' && item.into === null && item.times.type === 'n' && item.times.n[0] === 1 && item.per[0] === 1;
