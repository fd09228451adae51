import { type Item, type Sized, type Work } from './tree.ts';
import { ONE, readSized } from './amounts.ts';
import { isMark, isPlain, isTimesSign, isWord, peek, spanFrom, take, takeAll, type Reading } from './reading.ts';
import { readNoun } from './noun.ts';
import { readTarget } from './target.ts';
import { times } from './times.ts';
import { readWork } from './works.ts';
import { readItems } from './items.ts';
import { readLoops } from './loops.ts';

export function readSkip(reading: Reading): Item | null {
  const from = reading.at;
  if (!take(reading, 'skip')) return null;
  takeAll(reading, 'the', 'over');
  const start = reading.at;
  const n = readSized(reading);
  if (n) {
    const here = reading.at;
    takeAll(reading, 'of', 'the', 'next');
    const noun = readNoun(reading);
    if (!noun) reading.at = here;
    return { type: 'skip', span: spanFrom(reading, from), n, of: noun ? { ...noun, which: 'next' } : null };
  }
  const target = readTarget(reading);
  if (isWord(peek(reading), 'tog')) {
    // `sk next 2 sts tog`: a slip of some kind, and nothing says which.
    reading.at += 1;
    return { type: 'unread', span: spanFrom(reading, from) };
  }
  if (target) {
    if (target.target.which === 'every')
      return { type: 'skip', span: spanFrom(reading, from), n: ONE, of: target.target };
    return { type: 'skip', span: spanFrom(reading, from), n: target.count ?? ONE, of: target.target };
  }
  reading.at = start;
  return { type: 'skip', span: spanFrom(reading, from), n: ONE, of: null };
}

/** `6x (sc, inc)`, `6 × inc`, `6 times (…)`. */
export function readLeadingTimes(reading: Reading, limit: number): Item[] | null {
  const from = reading.at;
  if (isWord(peek(reading), 'rep') && peek(reading, 1).kind === 'num' && isWord(peek(reading, 2), 'times'))
    reading.at += 1;
  const n = readSized(reading);
  if (!n) {
    reading.at = from;
    return null;
  }
  const open = reading.closes.get(reading.at);
  const isBare =
    open !== undefined && open < limit && reading.lexes.slice(reading.at, open).some((lex) => lex.kind === 'stitch');
  if (isBare || isTimesSign(peek(reading)) || isWord(peek(reading), 'times')) {
    if (!isBare) reading.at += 1;
    if (isMark(peek(reading), ':') && !isBare) {
      reading.at += 1;
      const group = timesOfRest(reading, from, limit, n);
      if (group) return [group];
    }
    const next = peek(reading);
    const close = reading.closes.get(reading.at);
    const isWork = close !== undefined && reading.lexes.slice(reading.at, close).some((lex) => lex.kind === 'stitch');
    if (close !== undefined && close < limit && isWork) {
      const mark = next.text as '(' | '[' | '{';
      reading.at += 1;
      const inner = readItems(reading, close);
      reading.at = close + 1;
      return [
        { type: 'group', span: spanFrom(reading, from), items: inner, times: times(n), into: null, mark, stop: null },
      ];
    }
    const work = next.kind === 'stitch' ? readWork(reading) : null;
    const only = work?.[0];
    if (work?.length === 1 && only?.type === 'work' && only.times.type === 'n') {
      const count: Sized = only.times.n.map((k, i) => k * (n[i] ?? n[0]!));
      return [{ ...only, span: spanFrom(reading, from), times: times(count), multiplied: true }];
    }
  }
  reading.at = from;
  return null;
}

/** `6 times: sc, inc`: all that follows, up to its total. */
function timesOfRest(reading: Reading, from: number, limit: number, n: Sized): Item | null {
  if (reading.closes.has(reading.at)) return null;
  const items = readItems(reading, limit);
  return items.some((item) => item.type === 'work')
    ? { type: 'group', span: spanFrom(reading, from), items, times: times(n), into: null, mark: '(', stop: null }
    : null;
}

export const isColour = (reading: Reading): boolean =>
  peek(reading).end - peek(reading).start === 1 && peek(reading, 1).kind === 'num' && isSeparatorOrEnd(reading, 2);

/** `A 4`, `4 A`: stitches told by their colour. */
export function readColour(reading: Reading): Work | null {
  const from = reading.at;
  const isLetter = (ahead: number) => {
    const lex = peek(reading, ahead);
    const isA = isWord(lex, 'the') && lex.end - lex.start === 1;
    return isA || (lex.kind === 'word' && lex.text.length === 1 && 'bcdefghij'.includes(lex.text));
  };
  const letterFirst = isLetter(0) && peek(reading, 1).kind === 'num' && !peek(reading, 1).glued;
  const numberFirst = peek(reading).kind === 'num' && isLetter(1) && isSeparatorOrEnd(reading, 2);
  if (!letterFirst && !numberFirst) return null;
  const after = peek(reading, 2);
  if (letterFirst && !isSeparatorOrEnd(reading, 2) && after.kind !== 'num') return null;
  const letter = isWord(peek(reading, letterFirst ? 0 : 1), 'the') ? 'a' : peek(reading, letterFirst ? 0 : 1).text;
  const n = peek(reading, letterFirst ? 1 : 0).value;
  reading.at += 2;
  return {
    type: 'work',
    span: spanFrom(reading, from),
    stitch: 'st',
    per: ONE,
    times: times([n]),
    into: null,
    loops: null,
    glued: false,
    multiplied: false,
    colour: letter.toUpperCase(),
  };
}

export function isSeparatorOrEnd(reading: Reading, ahead: number): boolean {
  const lex = peek(reading, ahead);
  return lex.kind === 'end' || lex.kind === 'mark';
}

/** `working along the other side of the chain`, `on opposite side`, `in the remaining loops of the foundation chain`. */
export function readFar(reading: Reading): Item | null {
  const from = reading.at;
  const words = new Set([
    'now',
    'then',
    'continue',
    'continuing',
    'rotate',
    'down',
    'back',
    'bottom',
    'underside',
    'up',
    'piece',
    'you',
    'foundation',
    'starting',
    'unused',
    'free',
    'remaining',
    'to',
    'other',
    'opposite',
  ]);
  let far = false;
  while (reading.at < from + 14) {
    const lex = peek(reading);
    if (isWord(lex, 'side') || isPlain(lex, 'underside', 'bottom')) far = true;
    const isChain = far && lex.kind === 'stitch' && lex.text === 'ch';
    const fits =
      isChain ||
      isWord(
        lex,
        'work',
        'in',
        'on',
        'across',
        'around',
        'the',
        'of',
        'side',
        'turn',
        'to',
        'and',
        'loop',
        'remain',
        'first',
        'other',
        'skipped',
      ) ||
      (lex.kind === 'word' && words.has(lex.text));
    if (!fits || (isWord(lex, 'in') && far)) break;
    reading.at += 1;
  }
  if (far) return { type: 'step', span: spanFrom(reading, from), what: 'far', text: 'other side' };
  reading.at = from;
  return null;
}

/** `BLO:`, `in back loops only,`, `working in third loop`. */
export function readLay(reading: Reading): Item | null {
  const from = reading.at;
  takeAll(reading, 'work', 'in', 'through');
  const start = reading.at;
  if (isWord(peek(reading), 'the')) reading.at += 1;
  const loops = readLoops(reading);
  if (!loops || isPlain(peek(reading), 'left', 'free', 'unused') || isWord(peek(reading), 'skipped', 'remain')) {
    reading.at = from;
    return null;
  }
  if (start > from && isWord(peek(reading), 'of') && isWord(peek(reading, 1), 'each', 'next')) {
    reading.at = from;
    return null;
  }
  return { type: 'loops', span: spanFrom(reading, from), loops };
}
