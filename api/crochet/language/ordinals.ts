import { isMark, isWord, peek, take, takeAll, type Reading } from './reading.ts';
import { readNoun } from './noun.ts';
import { plainTarget, type TargetRead } from './target.ts';

export function every(reading: Reading, n: number, length: number): TargetRead {
  reading.at += length;
  const noun = readNoun(reading);
  return {
    target: { ...(noun ?? { what: 'st' }), which: 'every', n },
    count: null,
    fill: true,
    loops: null,
    also: null,
  };
}

/** The number of a space (`2-ch sp`), not of places. */
export function isSpaceNumber(reading: Reading): boolean {
  const skip = isMark(peek(reading, 1), '-') ? 2 : 1;
  return (
    isWord(peek(reading, skip), 'sp2') ||
    (peek(reading, skip).kind === 'stitch' &&
      peek(reading, skip).text === 'ch' &&
      isWord(peek(reading, isMark(peek(reading, skip + 1), '-') ? skip + 2 : skip + 1), 'sp', 'loop') &&
      peek(reading).value < 12)
  );
}

export function ordinal(reading: Reading, n: number): TargetRead {
  reading.at += 1;
  const noun = readNoun(reading);
  if (take(reading, 'hook'))
    return { target: { what: 'ch', which: 'hook', n }, count: null, fill: false, loops: null, also: null };
  if (isWord(peek(reading), 'of') || isWord(peek(reading), 'from')) {
    const start = reading.at;
    reading.at += 1;
    takeAll(reading, 'the', 'next', 'each', 'same', 'first', 'last', 'of');
    if (isWord(peek(reading), 'turningchain') || (peek(reading).kind === 'stitch' && peek(reading).text === 'ch')) {
      readNoun(reading);
      if (isWord(peek(reading), 'turningchain')) reading.at += 1;
      return plainTarget('st', 'last');
    }
    const of = readNoun(reading);
    if (of && (of.what === 'group' || of.corner === true || of.stitch !== undefined)) {
      return {
        target: { ...(noun ?? { what: 'st' }), which: 'nth', n, of: of.stitch ?? 'group' },
        count: null,
        fill: false,
        loops: null,
        also: null,
      };
    }
    reading.at = start;
  }
  // `2 sc in the third`: after two, simply the next.
  if (!noun && n > 1 && (peek(reading).kind === 'mark' || peek(reading).kind === 'end'))
    return plainTarget('st', 'next');
  if (noun?.what === 'ch')
    return { target: { what: 'ch', which: 'hook', n }, count: null, fill: false, loops: null, also: null };
  return {
    target: { ...(noun ?? { what: 'st' }), which: 'nth', n },
    count: null,
    fill: false,
    loops: null,
    also: null,
  };
}

export function centre(reading: Reading): TargetRead {
  const noun = readNoun(reading);
  const start = reading.at;
  if (take(reading, 'of', 'from')) {
    takeAll(reading, 'the', 'next', 'each', 'same', 'first', 'last');
    const of = readNoun(reading);
    if (of)
      return {
        target: { ...(noun ?? { what: 'st' }), which: 'centre', of: of.stitch ?? 'group' },
        count: null,
        fill: false,
        loops: null,
        also: null,
      };
    reading.at = start;
  }
  const base = noun ?? { what: 'st' as const };
  return { target: { ...base, which: 'centre' }, count: null, fill: false, loops: null, also: null };
}
