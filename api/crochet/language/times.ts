import { type Sized, type Target, type Times } from './tree.ts';
import { readMultiple, readSized } from './amounts.ts';
import { isMark, isPlain, isWord, peek, take, takeAll, type Reading } from './reading.ts';
import { readNoun } from './noun.ts';
import { isSpaceNumber } from './ordinals.ts';

const NONE: Sized = [0];
export const FILL: Times = { type: 'fill', leave: NONE, leaveOf: null, to: null };
export const times = (n: Sized): Times => ({ type: 'n', n });

/**
 * Until the places run out: `around`, `across`, `to end`, `to last 2 sts`, `until 3 sts remain`, `to marker`,
 * `to next corner`. Null, and nothing taken, where no such words stand here.
 */
export function readFill(reading: Reading): Times | null {
  const start = reading.at;
  let fill: Times | null = null;
  for (;;) {
    const here = reading.at;
    if (take(reading, 'around', 'across')) {
      while (isWord(peek(reading), 'round', 'row', 'the', 'of')) reading.at += 1;
      fill ??= FILL;
      continue;
    }
    const next = peek(reading);
    if (isWord(next, 'round', 'row') && peek(reading, 1).kind !== 'num' && fill === null && start === here) {
      reading.at += 1;
      fill = FILL;
      continue;
    }
    if (isWord(next, 'in') || isWord(next, 'for')) {
      const isRest =
        isWord(peek(reading, 1), 'remain') || (isWord(peek(reading, 1), 'the') && isWord(peek(reading, 2), 'remain'));
      if (isRest && isRoundAfter(reading, 2)) {
        skipToRound(reading);
        fill ??= FILL;
        continue;
      }
    }
    const rest: Times | null = fill === null ? readRest(reading) : null;
    if (rest) {
      fill = rest;
      continue;
    }
    const until = readUntil(reading);
    if (until) {
      fill = until;
      continue;
    }
    reading.at = here;
    break;
  }
  if (!fill) reading.at = start;
  return fill;
}

/** `sc the rest`, `rest of the way around`, `in all but the last 2 sts`. */
function readRest(reading: Reading): Times | null {
  const start = reading.at;
  const isBut = isPlain(peek(reading), 'but', 'except');
  if (isBut) reading.at += 1;
  if (isBut || take(reading, 'allbut')) {
    takeAll(reading, 'the');
    if (take(reading, 'last')) {
      const n = readSized(reading) ?? [1];
      const noun = readNoun(reading);
      return { type: 'fill', leave: n, leaveOf: noun ? { ...noun, which: 'last' } : null, to: null };
    }
  }
  reading.at = start;
  takeAll(reading, 'the');
  if (take(reading, 'remain')) {
    while (isPlain(peek(reading), 'way') || isWord(peek(reading), 'of', 'the', 'around', 'across', 'round', 'row'))
      reading.at += 1;
    const next = peek(reading);
    if (next.kind === 'end' || next.kind === 'mark' || isWord(next, 'join', 'turn', 'and')) return FILL;
  }
  reading.at = start;
  return null;
}

function isRoundAfter(reading: Reading, ahead: number): boolean {
  for (let i = ahead; i < ahead + 4; i += 1) if (isWord(peek(reading, i), 'round', 'row')) return true;
  return false;
}

function skipToRound(reading: Reading): void {
  while (!isWord(peek(reading), 'round', 'row')) reading.at += 1;
  reading.at += 1;
}

/** `to end`, `to last 2 sts`, `to within 3 sts of end`, `until 2 sts remain`, `to marker`, `to corner`. */
function readUntil(reading: Reading): Times | null {
  const start = reading.at;
  const within = isPlain(peek(reading), 'within');
  if (!within && !take(reading, 'to', 'from')) return null;
  takeAll(reading, 'the', 'in');
  if (isPlain(peek(reading), 'within')) reading.at += 1;
  takeAll(reading, 'the');
  if (take(reading, 'end', 'marker')) {
    ofRound(reading);
    return FILL;
  }
  if (isPlain(peek(reading), 'st') && isWord(peek(reading, 1), 'marker')) {
    reading.at += 2;
    return FILL;
  }
  if (take(reading, 'last')) {
    takeAll(reading, 'of');
    const n = readSized(reading) ?? [1];
    const noun = readNoun(reading);
    ofRound(reading);
    return { type: 'fill', leave: n, leaveOf: noun ? { ...noun, which: 'last' } : null, to: null };
  }
  const n = isSpaceNumber(reading) ? null : readSized(reading);
  if (n) {
    const noun = readNoun(reading);
    if (take(reading, 'remain') || isPlain(peek(reading), 'before', 'unworked', 'from')) {
      while (
        isPlain(peek(reading), 'before', 'unworked', 'from', 'left') ||
        isWord(peek(reading), 'the', 'end', 'of', 'marker')
      )
        reading.at += 1;
      return { type: 'fill', leave: n, leaveOf: noun ? { ...noun, which: 'last' } : null, to: null };
    }
    if (isWord(peek(reading), 'of', 'from') && isWord(peek(reading, 1), 'end', 'the', 'marker')) {
      takeAll(reading, 'of', 'from', 'the', 'end', 'marker');
      return { type: 'fill', leave: n, leaveOf: noun ? { ...noun, which: 'last' } : null, to: null };
    }
    reading.at = start;
    return null;
  }
  const to = readGoal(reading);
  if (to) return { type: 'fill', leave: NONE, leaveOf: null, to };
  reading.at = start;
  return null;
}

function ofRound(reading: Reading): void {
  const start = reading.at;
  takeAll(reading, 'of', 'the', 'in');
  if (!take(reading, 'round', 'row')) reading.at = start;
  if (isWord(peek(reading), 'st') && reading.lexes[reading.at - 1]?.text === 'marker') reading.at += 1;
}

/** A place named that is worked up to: `to next corner`, `to marked st`, `to centre sp`. */
function readGoal(reading: Reading): Target | null {
  takeAll(reading, 'the', 'each');
  const which = take(reading, 'next')
    ? 'next'
    : take(reading, 'centre')
      ? 'centre'
      : take(reading, 'first')
        ? 'first'
        : 'next';
  if (take(reading, 'marked')) {
    take(reading, 'st');
    return { what: 'mark', which: 'next' };
  }
  const noun = readNoun(reading);
  if (!noun) return null;
  const place = { ...noun };
  delete (place as { also?: unknown }).also;
  return { ...place, which };
}

/**
 * How often a group is worked, from the words behind it. `rep from * 3 times` is disputed and stays so in the tree;
 * `3 times more` is four.
 */
export function readTimes(reading: Reading): Times | null {
  const start = reading.at;
  const said = take(reading, 'rep');
  const starred = (said || isFromStar(reading)) && skipFromStar(reading);
  const repeated = said || starred;
  if (repeated) {
    takeEmptyBrackets(reading);
    takeAll(reading, 'the', 'in', 'this');
  }
  const fillFirst = readFill(reading);
  if (fillFirst) return fillFirst;
  if (isPlain(peek(reading), 'for')) reading.at += 1;
  takeAll(reading, 'total', 'of', 'the', 'in');
  const inAll = isWord(reading.lexes[reading.at - 1]!, 'total') || reading.lexes[reading.at - 2]?.text === 'total';
  const more = readMore(reading);
  if (more) return times(more.map((n) => n + 1));
  const multiple = readMultiple(reading);
  if (multiple) {
    if (take(reading, 'more', 'again')) return times(multiple.map((n) => n + 1));
    takeAll(reading, 'total');
    if (
      isWord(peek(reading), 'in') &&
      isWord(peek(reading, 1), 'each') &&
      peek(reading, 1).end - peek(reading, 1).start === 3
    )
      reading.at += 2;
    const after = reading.at;
    if (!readFill(reading)) reading.at = after;
    return starred && !inAll ? { type: 'rep', n: multiple } : times(multiple);
  }
  if (repeated) return FILL;
  reading.at = start;
  return null;
}

/** `(sc, inc) from * around`, with its *repeat* left out. */
const isFromStar = (reading: Reading): boolean => isWord(peek(reading), 'from') && isMark(peek(reading, 1), '*');

/** `rep ( ) 6 times`, `rep [] around`: the brackets meant, empty. */
function takeEmptyBrackets(reading: Reading): void {
  const isOpen = isMark(peek(reading), '(') || isMark(peek(reading), '[');
  if (isOpen && reading.closes.get(reading.at) === reading.at + 1) reading.at += 2;
}

/** `3 more times`, `3 times more`, `twice more`, `once more`, `5 more`. */
function readMore(reading: Reading): Sized | null {
  const start = reading.at;
  const n = readSized(reading);
  if (n && take(reading, 'more')) {
    take(reading, 'times');
    return n;
  }
  reading.at = start;
  const multiple = readMultiple(reading);
  if (multiple && take(reading, 'more', 'again')) return multiple;
  reading.at = start;
  return null;
}

/** `from *`, `from * to *`, `* to **`, `between *s`: true where stars are named. */
function skipFromStar(reading: Reading): boolean {
  let starred = false;
  for (;;) {
    const lex = peek(reading);
    if (isMark(lex, '*') || isMark(lex, '**')) {
      starred = true;
      reading.at += 1;
      if (isPlain(peek(reading), 's')) reading.at += 1;
      continue;
    }
    const leadsToStar =
      (isWord(lex, 'from', 'to', 'gap', 'the', 'and', 'first', 'of') ||
        isMark(lex, '"') ||
        isMark(lex, "'") ||
        isPlain(lex, 'asterisk', 'star', 'stars', 'asterisks', 'instructions')) &&
      starSoon(reading);
    if (isPlain(lex, 'asterisk', 'star', 'stars', 'asterisks')) {
      starred = true;
      reading.at += 1;
      continue;
    }
    if (!leadsToStar) return starred;
    reading.at += 1;
  }
}

function starSoon(reading: Reading): boolean {
  for (let i = 1; i <= 4; i += 1) {
    const lex = peek(reading, i);
    if (isMark(lex, '*') || isMark(lex, '**') || isPlain(lex, 'asterisk', 'star', 'stars', 'asterisks')) return true;
    if (lex.kind === 'num' || lex.kind === 'stitch' || isMark(lex, ',') || isMark(lex, ';')) return false;
  }
  return false;
}
