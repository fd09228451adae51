import { type Item, type Sized } from './tree.ts';
import { stitchOf } from '../stitches.ts';
import { readMultiple, readSized } from './amounts.ts';
import { isMark, isPlain, isWord, peek, spanFrom, take, takeAll, type Reading } from './reading.ts';

/** Lines named by number: `R3`, `round 3`, `rows 2–5`, `rnds 2 and 3`, `3rd round`, `last 2 rows`. */
export function readLineNumbers(reading: Reading): { lines: number[]; last: number } | null {
  const start = reading.at;
  takeAll(reading, 'the', 'of', 'for', 'from');
  if (peek(reading).kind === 'ord' && isWord(peek(reading, 1), 'round', 'row')) {
    const n = peek(reading).value;
    reading.at += 2;
    return { lines: [n], last: 0 };
  }
  if (isWord(peek(reading), 'last') || isPlain(peek(reading), 'previous', 'prev', 'preceding')) {
    reading.at += 1;
    const count = peek(reading).kind === 'num' ? peek(reading).value : 1;
    if (peek(reading).kind === 'num') reading.at += 1;
    if (take(reading, 'round', 'row')) return { lines: [], last: count };
    reading.at = start;
    return null;
  }
  const isLabel =
    isWord(peek(reading), 'round', 'row') || (isPlain(peek(reading), 'r') && peek(reading, 1).kind === 'num');
  if (!isLabel) {
    reading.at = start;
    return null;
  }
  reading.at += 1;
  if (isMark(peek(reading), ':') || isMark(peek(reading), '.')) reading.at += 1;
  if (peek(reading).kind !== 'num') {
    reading.at = start;
    return null;
  }
  const lines = [peek(reading).value];
  reading.at += 1;
  for (;;) {
    const here = reading.at;
    const isRange = isMark(peek(reading), '-') || isWord(peek(reading), 'to');
    const isList = isWord(peek(reading), 'and') || isMark(peek(reading), ',') || isMark(peek(reading), '+');
    if ((!isRange && !isList) || (lines.length > 1 && isWord(peek(reading), 'to'))) break;
    reading.at += 1;
    takeAll(reading, 'and', 'round', 'row');
    if (isPlain(peek(reading), 'r')) reading.at += 1;
    const lex = peek(reading);
    const next = peek(reading, 1);
    if (lex.kind !== 'num' || next.kind === 'stitch' || isWord(next, 'times', 'more', 'st')) {
      reading.at = here;
      break;
    }
    reading.at += 1;
    if (isRange) for (let n = lines.at(-1)! + 1; n <= lex.value && lines.length < 500; n += 1) lines.push(n);
    else lines.push(lex.value);
  }
  return { lines, last: 0 };
}

/** A line told by another one, or null and nothing taken. */
export function readRelative(reading: Reading, limit: number): Item | null {
  const from = reading.at;
  const rep = take(reading, 'rep');
  const same = !rep && (take(reading, 'same') || isPlain(peek(reading), 'identical') || isWord(peek(reading), 'as'));
  if (isWord(peek(reading), 'as') || isPlain(peek(reading), 'identical')) reading.at += 1;
  takeAll(reading, 'work', 'the', 'as', 'in');
  if (isPlain(peek(reading), 'for', 'set', 'established', 'before', 'above')) {
    const word = peek(reading).text;
    reading.at += 1;
    if (word === 'set' || word === 'established') {
      if (isMark(peek(reading), ',')) reading.at += 1;
      const change = readEachRound(reading);
      if (change)
        return { type: 'shaped', span: spanFrom(reading, from), change, how: 'as-set', every: 1, until: null };
    }
  }
  const named = readLineNumbers(reading);
  const more = readOneMore(reading);
  if (!named && (!same || more === 0)) {
    const isAgain = rep && (isWord(peek(reading), 'again') || reading.at >= limit);
    if (!isAgain || reading.at >= limit) {
      reading.at = from;
      return null;
    }
  }
  if (
    !rep &&
    !same &&
    !isPlain(peek(reading), 'again') &&
    !isWord(peek(reading), 'again') &&
    !isPlain(peek(reading), 'alternately')
  ) {
    reading.at = from;
    return null;
  }
  return finishRelative(reading, limit, from, named, more);
}

function finishRelative(
  reading: Reading,
  limit: number,
  from: number,
  named: { lines: number[]; last: number } | null,
  more: number,
): Item {
  let times: Sized | null = null;
  let until: number | null = null;
  let ending: number | null = null;
  let extra = more;
  for (;;) {
    const here = reading.at;
    if (isMark(peek(reading), ',') && reading.at + 1 < limit && isTail(reading)) reading.at += 1;
    if (isPlain(peek(reading), 'alternately', 'for')) reading.at += 1;
    takeAll(reading, 'again', 'in');
    const multiple = readMultiple(reading) ?? moreTimes(reading);
    if (multiple) {
      times = multiple;
      take(reading, 'more');
      take(reading, 'again');
      take(reading, 'times');
      continue;
    }
    if (take(reading, 'to', 'through')) {
      const goal = readLineNumbers(reading);
      if (goal) {
        until = goal.lines.at(-1) ?? null;
        continue;
      }
      // `until piece measures 25 cm`: open in number.
      if (peek(reading).kind === 'word' || peek(reading).kind === 'measure') {
        while (reading.at < limit && !isMark(peek(reading), '.') && !isMark(peek(reading), ';')) reading.at += 1;
        continue;
      }
      reading.at = here;
    }
    if (isPlain(peek(reading), 'ending', 'end', 'finishing') || isWord(peek(reading), 'end')) {
      reading.at += 1;
      takeAll(reading, 'with', 'the', 'on', 'in', 'after');
      if (isPlain(peek(reading), 'a', 'after')) reading.at += 1;
      const goal = readLineNumbers(reading);
      if (goal) {
        ending = goal.lines.at(-1) ?? null;
        continue;
      }
      reading.at = here;
    }
    if (extra === 0) {
      extra = readOneMore(reading);
      if (extra > 0) continue;
    }
    reading.at = here;
    break;
  }
  const lines = named
    ? named.last > 1
      ? Array.from({ length: named.last }, (_, i) => i - named.last)
      : named.lines
    : [];
  return { type: 'relative', span: spanFrom(reading, from), lines, more: extra, times, until, ending };
}

const isTail = (reading: Reading): boolean =>
  isPlain(peek(reading, 1), 'ending', 'with', 'end') || isWord(peek(reading, 1), 'with', 'end');

function moreTimes(reading: Reading): Sized | null {
  const start = reading.at;
  const n = readSized(reading);
  if (n && take(reading, 'more')) {
    take(reading, 'times');
    return n;
  }
  reading.at = start;
  return null;
}

/** `with one more sc between`, `with 1 more st between increases`, `working 2 more …`. */
function readOneMore(reading: Reading): number {
  const start = reading.at;
  if (isMark(peek(reading), ',')) reading.at += 1;
  takeAll(reading, 'with', 'the', 'work', 'but');
  if (isPlain(peek(reading), 'but', 'having')) reading.at += 1;
  takeAll(reading, 'with', 'work');
  const n = peek(reading);
  const isNumber = n.kind === 'num';
  if (isNumber) reading.at += 1;
  if (isWord(peek(reading), 'more') || isPlain(peek(reading), 'extra', 'another')) {
    reading.at += 1;
    if (peek(reading).kind === 'stitch' || isWord(peek(reading), 'st')) {
      reading.at += 1;
      while (
        isWord(peek(reading), 'gap', 'in', 'each', 'the', 'rep', 'st', 'from') ||
        (peek(reading).kind === 'stitch' && stitchOf(peek(reading).text)?.family !== 'plain') ||
        isPlain(peek(reading), 'before', 'every', 'them')
      )
        reading.at += 1;
      return isNumber ? n.value : 1;
    }
  }
  reading.at = start;
  return 0;
}

/** `6 more each round`, `increasing 6 each round`. */
function readEachRound(reading: Reading): Sized | null {
  const start = reading.at;
  const sign = peek(reading).kind === 'stitch' && stitchOf(peek(reading).text)?.family === 'decrease' ? -1 : 1;
  if (peek(reading).kind === 'stitch' && ['increase', 'decrease'].includes(stitchOf(peek(reading).text)?.family ?? ''))
    reading.at += 1;
  const n = readSized(reading);
  if (n) {
    const fewer = isPlain(peek(reading), 'fewer', 'less');
    if (fewer) reading.at += 1;
    takeAll(reading, 'more', 'st', 'times');
    if (peek(reading).kind === 'stitch') reading.at += 1;
    if (take(reading, 'each')) {
      takeAll(reading, 'round', 'row');
      return n.map((k) => k * (fewer ? -1 : sign));
    }
  }
  reading.at = start;
  return null;
}
