import { type Loops, type Sized, type Target } from './tree.ts';
import { readSized } from './amounts.ts';
import { isMark, isPlain, isWord, peek, take, takeAll, type Reading } from './reading.ts';
import { readNoun, type Noun } from './noun.ts';
import { readLoops, freeLoops } from './loops.ts';
import { qualifiers } from './qualifiers.ts';
import { centre, ordinal, every, isSpaceNumber } from './ordinals.ts';

/** Where a stitch goes. `count` is a number of places said with it, `fill` that it goes on until the places run out. */
export interface TargetRead {
  readonly target: Target;
  readonly count: Sized | null;
  readonly fill: boolean;
  readonly loops: Loops | null;
  /** A second kind of place named with the first: `in each dc and ch-1 sp`. */
  readonly also: Target | null;
  /** `each of next 2`: what is counted goes into each. */
  readonly each?: true;
  /** Said with `over`: the places are what is used up. */
  readonly over?: true;
  /** Only the loops were named (`in BLO`), no place. */
  readonly loopsOnly?: true;
}

/**
 * What stands after `in`, `into`, `on`, `over`: the place or places worked into. Null, and nothing taken, where the
 * words name no place.
 *
 * @example `in each of the next 6 sts` is what: st, which: next, count 6.
 */
export function readTarget(reading: Reading): TargetRead | null {
  const start = reading.at;
  const read = place(reading);
  if (!read) {
    reading.at = start;
    return null;
  }
  qualifiers(reading);
  return read;
}

function place(reading: Reading): TargetRead | null {
  takeAll(reading, 'the', 'of');
  while (
    isPlain(peek(reading), 'any', 'free', 'unused', 'remaining', 'exposed', 'unworked') &&
    (isWord(peek(reading, 1), 'blo', 'flo') || isPlain(peek(reading, 1), 'free', 'unused', 'exposed'))
  )
    reading.at += 1;
  const loops = readLoops(reading);
  if (loops) {
    const freed = freeLoops(reading, loops);
    if (freed) return freed;
    takeAll(reading, 'of', 'the', 'in');
    const inner = place(reading);
    return inner ? { ...inner, loops } : { ...plainTarget('st', 'next', null, false, loops), loopsOnly: true };
  }
  const lex = peek(reading);
  if (lex.kind === 'ord') return ordinal(reading, lex.value);
  if (lex.kind === 'num') return counted(reading, 'next');
  if (isPlain(lex, 'it', 'there', 'that', 'them')) {
    reading.at += 1;
    return plainTarget('other', 'same');
  }
  if (isPlain(lex, 'both')) {
    reading.at += 1;
    readNoun(reading);
    return { ...plainTarget('st', 'next', [2]), each: true };
  }
  if (isPlain(lex, 'others') || (isWord(lex, 'other') && isWord(peek(reading, 1), 'st'))) {
    reading.at += 1;
    readNoun(reading);
    return plainTarget('st', 'each', null, true);
  }
  if (isPlain(lex, 'all')) {
    reading.at += 1;
    const noun = readNoun(reading);
    return noun ? fromNoun(noun, 'each', null, true) : null;
  }
  if (lex.kind === 'w') {
    switch (lex.text) {
      case 'same':
        return same(reading);
      case 'each':
        return each(reading);
      case 'next':
        reading.at += 1;
        takeAll(reading, 'the');
        if (isWord(peek(reading), 'other')) return every(reading, 2, 1);
        return counted(reading, 'next');
      case 'remain':
        reading.at += 1;
        takeAll(reading, 'of', 'the');
        return { ...counted(reading, 'each'), fill: true };
      case 'first':
        reading.at += 1;
        return counted(reading, 'first');
      case 'last':
        reading.at += 1;
        return counted(reading, 'last');
      case 'centre':
        reading.at += 1;
        return centre(reading);
      case 'marked':
        reading.at += 1;
        readNoun(reading);
        return plainTarget('mark', 'next');
      case 'marker':
        reading.at += 1;
        readNoun(reading);
        return plainTarget('mark', 'next');
      case 'skipped':
        reading.at += 1;
        readNoun(reading);
        return plainTarget('st', 'skipped');
      case 'top':
        reading.at += 1;
        takeAll(reading, 'of', 'the', 'first', 'next');
        readNoun(reading);
        return plainTarget('st', 'last');
      case 'turningchain':
        reading.at += 1;
        if (reading.lexes[reading.at]?.kind === 'num' || isMark(peek(reading), '-'))
          reading.at += isMark(peek(reading), '-') ? 2 : 1;
        return plainTarget('st', 'last');
      case 'side':
        reading.at += 1;
        takeAll(reading, 'of', 'the');
        readNoun(reading);
        return plainTarget('other', 'far');
      case 'other':
        return null;
    }
  }
  const noun = readNoun(reading);
  // `in st at base of ch`.
  if (noun?.what === 'st' && isWord(peek(reading), 'same')) return same(reading);
  return noun ? fromNoun(noun, 'next', null, false) : null;
}

export function plainTarget(
  what: Target['what'],
  which: Target['which'],
  count: Sized | null = null,
  fill = false,
  loops: Loops | null = null,
): TargetRead {
  return { target: { what, which }, count, fill, loops, also: null };
}

function fromNoun(noun: Noun, which: Target['which'], count: Sized | null, fill: boolean): TargetRead {
  const { also, ...place } = noun;
  return { target: { ...place, which }, count, fill, loops: null, also: also ? { ...also, which } : null };
}

function same(reading: Reading): TargetRead {
  reading.at += 1;
  takeAll(reading, 'the', 'first', 'marked', 'corner');
  const noun = readNoun(reading);
  if (!noun && isPlain(peek(reading), 'place', 'one', 'spot', 'location')) reading.at += 1;
  if (isWord(peek(reading), 'as', 'where') || isPlain(peek(reading), 'where')) {
    reading.at += 1;
    while (
      isWord(peek(reading), 'the', 'join', 'last', 'of', 'turningchain', 'first', 'st', 'in', 'sp', 'top', 'loop') ||
      isPlain(peek(reading), 'previous', 'prev', 'before', 'slip') ||
      peek(reading).kind === 'stitch'
    ) {
      if (peek(reading).kind === 'stitch' && peek(reading).text !== 'slst' && peek(reading).text !== 'ch') {
        reading.at += 1;
        break;
      }
      reading.at += 1;
      if (peek(reading).kind === 'num' || (isMark(peek(reading), '-') && peek(reading, 1).kind === 'num'))
        reading.at += peek(reading).kind === 'num' ? 1 : 2;
    }
  }
  const what =
    noun?.what === 'sp' || noun?.what === 'gap'
      ? noun.what
      : noun?.what === 'st' || noun?.what === 'ch'
        ? 'st'
        : 'other';
  return plainTarget(what, 'same');
}

function each(reading: Reading): TargetRead {
  reading.at += 1;
  const isOf =
    isWord(peek(reading), 'of') || reading.lexes[reading.at - 1]!.end - reading.lexes[reading.at - 1]!.start > 5;
  takeAll(reading, 'of', 'the', 'each');
  if (isWord(peek(reading), 'other')) return every(reading, 2, 1);
  if (peek(reading).kind === 'ord') return every(reading, peek(reading).value, 1);
  if (take(reading, 'next')) {
    takeAll(reading, 'the', 'of');
    return { ...counted(reading, 'next'), each: true };
  }
  if (take(reading, 'first')) return { ...counted(reading, 'first'), each: true };
  if (take(reading, 'last')) return { ...counted(reading, 'last'), each: true };
  if (take(reading, 'remain')) takeAll(reading, 'of', 'the');
  if (take(reading, 'same')) takeAll(reading, 'the');
  if (peek(reading).kind === 'num' && !isSpaceNumber(reading)) {
    const n = peek(reading).value;
    const read = counted(reading, 'next');
    // `3 sc over every 4 row ends`: so many in so many, all along.
    return read.target.what === 'row-end' && !isOf
      ? { ...read, target: { ...read.target, which: 'every', n }, count: null, fill: true }
      : { ...read, each: true };
  }
  const noun = readNoun(reading);
  return fromNoun(noun ?? { what: 'st' }, 'each', null, true);
}

function counted(reading: Reading, which: Target['which']): TargetRead {
  takeAll(reading, 'the');
  const isSpace = peek(reading).kind === 'num' && isSpaceNumber(reading);
  const count = isSpace ? null : readSized(reading);
  if (count && isMark(peek(reading), '-') && peek(reading, 1).kind === 'stitch') {
    // `next 3-dc group`: one place.
    reading.at += 1;
    const noun = readNoun(reading);
    return fromNoun(noun ?? { what: 'group' }, which, null, false);
  }
  takeAll(reading, 'of', 'the');
  if (isWord(peek(reading), 'skipped')) {
    reading.at += 1;
    readNoun(reading);
    return plainTarget('st', 'skipped', count);
  }
  if (peek(reading).kind === 'ord' && which === 'next') return { ...ordinal(reading, peek(reading).value), count };
  if (isWord(peek(reading), 'centre')) {
    reading.at += 1;
    return centre(reading);
  }
  if (isWord(peek(reading), 'marked')) {
    reading.at += 1;
    readNoun(reading);
    return plainTarget('mark', 'next', count);
  }
  if (
    count &&
    isWord(peek(reading), 'remain') &&
    (peek(reading, 1).kind === 'mark' || peek(reading, 1).kind === 'end')
  ) {
    // `sc in the 4 left`.
    reading.at += 1;
    return plainTarget('st', 'skipped', count);
  }
  const noun = readNoun(reading);
  // The first three are three in order.
  const order = count && count[0]! > 1 && (which === 'first' || which === 'last') ? 'next' : which;
  return fromNoun(noun ?? { what: 'st' }, order, count, false);
}
