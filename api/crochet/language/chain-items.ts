import { type Item, type Work } from './tree.ts';
import { ONE } from './amounts.ts';
import { isMark, isPlain, isTimesSign, isWord, peek, spanFrom, take, takeAll, type Reading } from './reading.ts';
import { isSeparatorOrEnd } from './small-items.ts';
import { times } from './times.ts';

/**
 * `starting in 2nd ch from hook`, `beginning with the 4th ch`: the chains before it are passed over. Stands before the
 * stitches, whether it was said before or after them.
 */
export function readHookStart(reading: Reading): Item | null {
  const from = reading.at;
  if (!isPlain(peek(reading), 'start', 'starting', 'begin', 'commencing') && !isWord(peek(reading), 'first'))
    return null;
  reading.at += 1;
  takeAll(reading, 'in', 'on', 'from', 'with', 'the');
  const nth = peek(reading);
  if (nth.kind === 'ord' && peek(reading, 1).kind === 'stitch' && peek(reading, 1).text === 'ch' && nth.value > 1) {
    reading.at += 2;
    takeAll(reading, 'from', 'the', 'hook');
    return { type: 'skip', span: spanFrom(reading, from), n: [nth.value - 1], of: { what: 'ch', which: 'first' } };
  }
  reading.at = from;
  return null;
}

/** `ch 3, sl st in first ch` behind a stitch, `ss in first of 3ch`: a picot. The chain before it is the last item. */
export function readPicot(reading: Reading, items: readonly Item[]): Item | null {
  const chain = items.at(-1);
  const before = items.at(-2);
  const isChain = chain?.type === 'work' && chain.stitch === 'ch' && chain.times.type === 'n' && chain.times.n[0]! <= 6;
  if (
    !isChain ||
    chain.counts ||
    chain.between ||
    chain.times.n[0]! < 2 ||
    before?.type !== 'work' ||
    before.stitch === 'ch'
  )
    return null;
  if (peek(reading).kind !== 'stitch' || peek(reading).text !== 'slst') return null;
  const from = reading.at;
  reading.at += 1;
  take(reading, 'in', 'to');
  takeAll(reading, 'the');
  const isNth = peek(reading).kind === 'ord' && peek(reading).value === chain.times.n[0];
  if ((isNth || isWord(peek(reading), 'first')) && !isWord(peek(reading, 1), 'st')) {
    reading.at += 1;
    takeAll(reading, 'of', 'the');
    if (peek(reading).kind === 'num') reading.at += 1;
    if (peek(reading).kind === 'stitch' && peek(reading).text === 'ch') {
      reading.at += 1;
      if (isMark(peek(reading), '-') && peek(reading, 1).kind === 'num') reading.at += 2;
      takeAll(reading, 'from', 'the', 'hook');
      const span = { start: chain.span.start, end: reading.lexes[reading.at - 1]!.end };
      return { ...chain, span, stitch: 'picot', times: times(ONE), glued: false };
    }
  }
  reading.at = from;
  return null;
}

/** `MR 6`, `magic ring, 6x`: a ring and a number alone, which are stitches in it. */
export function readRingCount(reading: Reading): Work | null {
  if (!isWord(peek(reading), 'ring')) return null;
  const from = reading.at;
  const skip = isMark(peek(reading, 1), ',') || isMark(peek(reading, 1), '-') || isMark(peek(reading, 1), ':') ? 2 : 1;
  const number = peek(reading, skip);
  const tail = isTimesSign(peek(reading, skip + 1)) ? 1 : 0;
  if (number.kind !== 'num' || !isSeparatorOrEnd(reading, skip + 1 + tail)) return null;
  reading.at += skip + 1 + tail;
  return {
    type: 'work',
    span: spanFrom(reading, from),
    stitch: reading.stitch ?? 'sc',
    per: [number.value],
    times: times(ONE),
    into: { what: 'ring', which: 'next' },
    loops: null,
    glued: false,
    multiplied: false,
  };
}
