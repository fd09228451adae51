import { type ChainCounts, type Group, type Item, type Sized, type Target, type Times } from './tree.ts';
import { isMark, isPlain, isTimesSign, isWord, peek, spanFrom, take, type Reading } from './reading.ts';
import { readMultiple, readSized } from './amounts.ts';
import { readTarget } from './target.ts';
import { FILL, readFill, readTimes, times } from './times.ts';
import { isGroupAfterAll, pushTotal, totalBetween } from './totals.ts';
import { readChainCounts } from './chain.ts';

const ONCE: Times = { type: 'unsaid' };

/** How far a growing list has been looked through, and whether work was found in it. */
const LOOKED = new WeakMap<readonly Item[], { n: number; found: boolean }>();

/** Whether anything among these makes or uses places. A list that grows is looked through only once. */
export function hasWork(items: readonly Item[]): boolean {
  let looked = LOOKED.get(items);
  if (!looked) {
    looked = { n: 0, found: false };
    LOOKED.set(items, looked);
  }
  while (!looked.found && looked.n < items.length) {
    looked.found = isWorking(items[looked.n]!);
    looked.n += 1;
  }
  return looked.found;
}

const isWorking = (item: Item): boolean =>
  item.type === 'work' ||
  item.type === 'skip' ||
  item.type === 'shaped' ||
  item.type === 'straight' ||
  item.type === 'relative' ||
  (item.type === 'group' && hasWork(item.items));

/** A bracket: a total, a remark, or a group with what its words behind it make of it. */
export function readBracket(reading: Reading, limit: number, before: readonly Item[]): Item[] {
  const open = reading.at;
  const close = reading.closes.get(open);
  if (close === undefined || close >= limit) {
    reading.at += 1;
    return [];
  }
  if (isRoundsRemark(reading, open, close)) {
    // `(3 rounds, 36 sts)`.
    const rest = isMark(reading.lexes[open + 3]!, ',') ? totalBetween(reading, open + 4, close) : null;
    if (rest) pushTotal(reading, rest, { start: reading.lexes[open + 4]!.start, end: reading.lexes[close - 1]!.end });
    reading.at = close + 1;
    return [{ type: 'note', span: spanFrom(reading, open), text: 'rounds' }];
  }
  const kinds = totalBetween(reading, open + 1, close);
  const isBareNumber = close === open + 2;
  const isLeading = before.length === 0 && kinds !== null && Object.keys(kinds).join('') === 'sts';
  if (kinds && !isGroupAfterAll(reading, close) && (hasWork(before) || isBareNumber || isLeading)) {
    pushTotal(reading, kinds, { start: reading.lexes[open]!.start, end: reading.lexes[close]!.end });
    reading.at = close + 1;
    return [];
  }
  const counts = readChainCounts(reading);
  if (counts) {
    sayCounts(before, counts);
    return [];
  }
  if (isMadeRemark(reading, open, close)) {
    reading.at = close + 1;
    return [{ type: 'note', span: spanFrom(reading, open), text: 'made' }];
  }
  reading.at = open + 1;
  const items = reading.readItems(reading, close);
  reading.at = close + 1;
  if (!hasWork(items)) return items;
  const mark = reading.lexes[open]!.text as Group['mark'];
  return [finishGroup(reading, open, items, mark, null)];
}

/** `dc in 4th ch from hook (3 skipped ch count as dc)`: said of the chains before the last stitch. */
function sayCounts(before: readonly Item[], counts: ChainCounts): void {
  const last = before.at(-1);
  if (last?.type !== 'work' || last.into?.which !== 'hook' || last.counts) return;
  (before as Item[])[before.length - 1] = { ...last, counts };
}

/** `(shell made)`, `(first dc made)`: what has just been worked, said again. */
function isMadeRemark(reading: Reading, open: number, close: number): boolean {
  const last = reading.lexes[close - 1]!;
  return close - open < 10 && isPlain(last, 'made', 'completed', 'formed', 'complete');
}

/** `(4 rounds)`: how many there are, which is no total. */
function isRoundsRemark(reading: Reading, open: number, close: number): boolean {
  return (
    open + 2 < close && reading.lexes[open + 1]!.kind === 'num' && isWord(reading.lexes[open + 2]!, 'round', 'row')
  );
}

/** What stands behind a group: the place it all goes into, or how often it is worked. */
export function finishGroup(
  reading: Reading,
  from: number,
  items: readonly Item[],
  mark: Group['mark'],
  stop: number | null,
): Group {
  const start = reading.at;
  let into: Target | null = null;
  let count: Times | null = null;
  if (isMark(peek(reading), ',') || isMark(peek(reading), '-') || isMark(peek(reading), ';')) {
    const ahead = peek(reading, 1);
    if (
      isWord(ahead, 'rep', 'around', 'across') ||
      isPlain(ahead, 'all', 'both') ||
      isTimesSign(ahead) ||
      (isMark(peek(reading), '-') && ahead.kind === 'num' && isWord(peek(reading, 2), 'times'))
    )
      reading.at += 1;
  }
  if (isPlain(peek(reading), 'all', 'both', 'worked')) reading.at += 1;
  take(reading, 'work');
  if (isWord(peek(reading), 'in', 'on') || isWord(peek(reading), 'corner', 'each')) {
    take(reading, 'in', 'on');
    const target = readTarget(reading);
    if (target) {
      into = target.target;
      count = target.count ? times(target.count) : target.fill ? FILL : null;
    }
  }
  const said = readGroupTimes(reading, mark);
  if (into && said?.type === 'fill' && (count?.type === 'fill' || count === null)) count = said;
  else count = said && count === null ? said : said && into && count ? count : (said ?? count);
  if (!into && !count) reading.at = Math.max(start, reading.at);
  return {
    type: 'group',
    span: spanFrom(reading, from),
    items,
    times: count ?? (into ? times([1]) : ONCE),
    into,
    mark,
    stop,
  };
}

/** `× 6`, `* 6`, `6 times`, `6`, `around`, `repeat …`. */
function readGroupTimes(reading: Reading, mark: Group['mark']): Times | null {
  const start = reading.at;
  const fill = readFill(reading);
  if (fill) {
    // `around, 6 times` says one thing twice.
    const after = reading.at;
    const n = isMark(peek(reading), ',') ? null : readMultiple(reading);
    if (n && fill === FILL) return times(n);
    reading.at = after;
    return fill;
  }
  if (isMark(peek(reading), '*') && peek(reading, 1).kind === 'num') {
    reading.at += 1;
    const n = readSized(reading);
    take(reading, 'times');
    if (n) return times(n);
  }
  const said = readTimes(reading);
  if (said) {
    if (said.type === 'rep' && mark !== '*') return times(said.n);
    readFill(reading);
    return said;
  }
  reading.at = start;
  const bare = bareNumber(reading);
  return bare ? times(bare) : null;
}

/** A number behind a closing bracket or star, and nothing after it that it could belong to. */
function bareNumber(reading: Reading): Sized | null {
  if (peek(reading).kind !== 'num') return null;
  const next = peek(reading, 1);
  const goesOn = next.kind === 'stitch' || isWord(next, 'st', 'in', 'round', 'row', 'more') || next.kind === 'word';
  return goesOn ? null : readSized(reading);
}
