import { type Group, type Item } from './tree.ts';
import { isMark, isPlain, isWord, peek, spanFrom, take, takeAll, type Reading } from './reading.ts';
import { times } from './times.ts';
import { isGroupAfterAll, totalBetween } from './totals.ts';
import { finishGroup, hasWork } from './groups.ts';

/** Between stars, or from a star to `rep from *`. */
export function readStars(reading: Reading, limit: number): Item[] {
  const from = reading.at;
  reading.at += 1;
  const end = starEnd(reading, limit);
  let stop: number | null = null;
  const items: Item[] = [];
  while (reading.at < end.at) {
    const inner = innerStop(reading, end.at);
    items.push(...reading.readItems(reading, inner ?? end.at));
    if (inner !== null) {
      stop = items.length;
      reading.at = inner + 1;
    }
  }
  reading.at = end.at;
  if (end.kind === 'star') {
    reading.at += 1;
    const again = peek(reading, isMark(peek(reading), ',') || isMark(peek(reading), ';') ? 1 : 0);
    if (!isWord(again, 'rep') && !hasWork(items)) return items;
    if (isWord(again, 'rep') && (isMark(peek(reading), ',') || isMark(peek(reading), ';'))) reading.at += 1;
  }
  if (!hasWork(items)) return items;
  const opened = end.kind === 'open' ? timesOfLast(items) : null;
  if (opened) return [{ type: 'group', span: spanFrom(reading, from), ...opened, into: null, mark: '*', stop: null }];
  const group = finishGroup(reading, from, lifted(items), '*', stop);
  const last = items.at(-1);
  const ownFill =
    end.kind !== 'star' &&
    group.times.type === 'unsaid' &&
    last?.type === 'work' &&
    last.times.type === 'fill' &&
    !last.into;
  const whole: Group = ownFill ? { ...group, times: last.times } : group;
  return [withEnding(reading, whole)];
}

/** `*sc, inc x6`: the times of a star that was never closed stand behind its last stitch. */
function timesOfLast(items: readonly Item[]): Pick<Group, 'items' | 'times'> | null {
  const last = items.at(-1);
  if (items.length < 2 || last?.type !== 'work' || !last.multiplied || last.times.type !== 'n') return null;
  return { items: [...items.slice(0, -1), { ...last, times: times([1]), multiplied: false }], times: last.times };
}

/** A star that was never closed takes the `around` of its last stitch for itself. */
export function lifted(items: readonly Item[]): readonly Item[] {
  const last = items.at(-1);
  if (items.length < 2 || last?.type !== 'work' || last.times.type !== 'fill' || last.into) return items;
  return [...items.slice(0, -1), { ...last, times: times([1]) }];
}

/** `then from * to ** once`, `ending last rep at **`: one more pass that stops at the second mark. */
export function withEnding(reading: Reading, group: Group): Group {
  const start = reading.at;
  if (isMark(peek(reading), ',') || isMark(peek(reading), ';')) reading.at += 1;
  if (isPlain(peek(reading), 'ending', 'end', 'finishing') || isWord(peek(reading), 'end')) {
    const from = reading.at;
    reading.at += 1;
    takeAll(reading, 'last', 'the', 'rep', 'in', 'on', 'to');

    if (isPlain(peek(reading), 'at')) reading.at += 1;
    if (isMark(peek(reading), '**')) {
      reading.at += 1;
      return group;
    }
    reading.at = from;
  }
  takeAll(reading, 'and');
  if (isPlain(peek(reading), 'then')) reading.at += 1;
  take(reading, 'rep', 'work');
  if (
    isWord(peek(reading), 'from') &&
    isMark(peek(reading, 1), '*') &&
    isWord(peek(reading, 2), 'to') &&
    isMark(peek(reading, 3), '**')
  ) {
    reading.at += 4;
    take(reading, 'once');
    const n = group.times.type === 'n' || group.times.type === 'rep' ? group.times.n : null;
    if (n) return { ...group, times: { type: group.times.type === 'rep' ? 'rep' : 'n', n: n.map((k) => k + 1) } };
    return group;
  }
  reading.at = start;
  return { ...group, stop: null };
}

export function innerStop(reading: Reading, end: number): number | null {
  for (let at = reading.at; at < end; at += 1) if (isMark(reading.lexes[at]!, '**')) return at;
  return null;
}

/** Where the group begun by a star ends: at the next star, at `rep`, or at the limit. */
export function starEnd(reading: Reading, limit: number): { at: number; kind: 'star' | 'rep' | 'open' } {
  const doubled = isMark(reading.lexes[reading.at - 1]!, '**');
  for (let at = reading.at; at < limit; at += 1) {
    const lex = reading.lexes[at]!;
    const close = isMark(lex, '(') || isMark(lex, '[') || isMark(lex, '{') ? reading.closes.get(at) : undefined;
    if (close !== undefined && close < limit) {
      at = close;
      continue;
    }
    if (isMark(lex, doubled ? '**' : '*')) {
      // `inc * 6` inside stars cannot be told from the closing star: a closing star it is.
      return { at, kind: 'star' };
    }
    if (isWord(lex, 'rep') && !isMark(reading.lexes[at + 1]!, '(')) return { at, kind: 'rep' };
  }
  return { at: openEnd(reading, limit), kind: 'open' };
}

/** A star without a partner reaches to the total or to the step that ends the round. */
export function openEnd(reading: Reading, limit: number): number {
  for (let at = reading.at; at < limit; at += 1) {
    const lex = reading.lexes[at]!;
    if (isWord(lex, 'join', 'turn')) return at;
    if (isMark(lex, '(') || isMark(lex, '[')) {
      const close = reading.closes.get(at);
      if (close !== undefined && totalBetween(reading, at + 1, close) && !isGroupAfterAll(reading, close)) return at;
      if (close !== undefined && close < limit) at = close;
    }
    if (isMark(lex, '=')) return at;
  }
  return limit;
}
