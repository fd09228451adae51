import { type Item, type Sized } from './tree.ts';
import { stitchOf } from '../stitches.ts';
import { readSized } from './amounts.ts';
import { isMark, isPlain, isWord, peek, spanFrom, take, takeAll, type Reading } from './reading.ts';
import { takeClause } from './steps.ts';

/** `dec 1 st each end of next and foll alt rows until 54 sts`; `inc 6 evenly`; `dec 7 evenly until 28`. */
export function readShaped(reading: Reading, limit: number): Item | null {
  const from = reading.at;
  const lead = readSized(reading);
  const lex = peek(reading);
  const family = lex.kind === 'stitch' ? stitchOf(lex.text)?.family : undefined;
  if (family !== 'increase' && family !== 'decrease') {
    reading.at = from;
    return null;
  }
  const sign = family === 'increase' ? 1 : -1;
  reading.at += 1;
  const n = lead ?? readSized(reading) ?? [1];
  takeAll(reading, 'st', 'times');
  const isSpread = isInRound(reading);
  if (isSpread > 0) reading.at += isSpread;
  if (isSpread > 0 || take(reading, 'evenly')) {
    takeAll(reading, 'around', 'across', 'in', 'evenlytail');
    while (isWord(peek(reading), 'the', 'round', 'row', 'around', 'each') || isPlain(peek(reading), 'spaced', 'apart'))
      reading.at += 1;
    const until = readUntilSts(reading);
    return {
      type: 'shaped',
      span: spanFrom(reading, from),
      change: n.map((k) => k * sign),
      how: 'evenly',
      every: 1,
      until,
    };
  }
  if (isPlain(peek(reading), 'at')) reading.at += 1;
  takeAll(reading, 'in', 'the', 'work');
  const each = isWord(peek(reading), 'each') || isPlain(peek(reading), 'both');
  const one = each ? null : oneEnd(reading);
  if (one || (each && isWord(peek(reading, 1), 'end', 'side'))) {
    if (!one) reading.at += 2;
    let every = 1;
    const start = reading.at;
    while (
      reading.at < limit &&
      !isMark(peek(reading), ',') &&
      !isMark(peek(reading), '.') &&
      !isWord(peek(reading), 'to')
    ) {
      if (isWord(peek(reading), 'other') || (peek(reading).kind === 'ord' && peek(reading).value === 2)) every = 2;
      if (peek(reading).kind === 'num' || peek(reading).kind === 'stitch') break;
      if (peek(reading).kind === 'mark' && isMark(peek(reading), '(')) break;
      reading.at += 1;
    }
    if (start === limit) every = 1;
    const until = readUntilSts(reading);
    return {
      type: 'shaped',
      span: spanFrom(reading, from),
      change: n.map((k) => k * sign * (one ? 1 : 2)),
      how: one ?? 'each-end',
      every: until ? every : 1,
      until,
    };
  }
  reading.at = from;
  return null;
}

/** `inc 6 sc in rnd`: so many more in the round, wherever. How many meanings that is. */
function isInRound(reading: Reading): number {
  let i = peek(reading).kind === 'stitch' ? 1 : 0;
  if (!isWord(peek(reading, i), 'in', 'on', 'each')) return 0;
  while (isWord(peek(reading, i), 'in', 'on', 'the', 'each')) i += 1;
  return isWord(peek(reading, i), 'round', 'row') ? i + 1 : 0;
}

/** `at beg of next and foll alt rows`, `at end of next row`. */
function oneEnd(reading: Reading): 'begin' | 'finish' | null {
  let i = isPlain(peek(reading), 'at') ? 1 : 0;
  while (isWord(peek(reading, i), 'the', 'in')) i += 1;
  const isEnd = isWord(peek(reading, i), 'first', 'end') && isWord(peek(reading, i + 1), 'of');
  if (!isEnd) return null;
  const how = isWord(peek(reading, i), 'first') ? 'begin' : 'finish';
  reading.at += i + 2;
  return how;
}

export function readUntilSts(reading: Reading): Sized | null {
  const start = reading.at;
  if (take(reading, 'to')) {
    if (isPlain(peek(reading), 'there', 'are', 'you', 'have')) while (peek(reading).kind === 'word') reading.at += 1;
    const n = readSized(reading);
    if (n) {
      takeAll(reading, 'st', 'remain');
      if (peek(reading).kind === 'stitch') reading.at += 1;
      return n;
    }
  }
  reading.at = start;
  return null;
}

/** `work straight until 14 cm`, `work even for 5 rounds`. */
export function readStraight(reading: Reading, limit: number): Item | null {
  const from = reading.at;
  if (isPlain(peek(reading), 'continue', 'cont', 'carry', 'keep')) reading.at += 1;
  takeAll(reading, 'work', 'on', 'in');
  if (!take(reading, 'even')) {
    reading.at = from;
    return null;
  }
  const start = reading.at;
  takeClause(reading, limit, [',', ';', '.']);
  const open = reading.lexes.slice(start, reading.at).some((lex) => isWord(lex, 'to') || lex.kind === 'measure');
  return { type: 'straight', span: spanFrom(reading, from), open };
}
