import { type Target } from './tree.ts';
import { stitchOf } from '../stitches.ts';
import { isMark, isPlain, isWord, peek, take, takeAll, type Reading } from './reading.ts';

/** The name of a place: `st`, `dc`, `ch-2 sp`, `corner`, `gap`, `shell`. */
export type Noun = Omit<Target, 'which'> & { readonly also?: Omit<Target, 'which'> };

/** The noun that stands here, or null and nothing taken. */
export function readNoun(reading: Reading): Noun | null {
  const start = reading.at;
  const noun = single(reading);
  if (!noun) {
    reading.at = start;
    return null;
  }
  // `each st and ch`, `each dc and ch-1 sp`.
  const middle = reading.at;
  if (take(reading, 'and') || takeSlash(reading)) {
    takeAll(reading, 'in', 'each', 'the');
    const other = isPlace(reading) ? single(reading) : null;
    if (other && other.what !== noun.what) {
      if ((noun.what === 'st' && other.what === 'ch') || (noun.what === 'ch' && other.what === 'st'))
        return { what: 'st-or-ch' };
      return { ...noun, also: other };
    }
    reading.at = middle;
  }
  return noun;
}

function takeSlash(reading: Reading): boolean {
  if (!isMark(peek(reading), '/')) return false;
  reading.at += 1;
  return true;
}

/** A noun for certain, not the next stitch of the line: `and ch 3` goes on, `and ch-1 sp` is a place. */
function isPlace(reading: Reading): boolean {
  const lex = peek(reading);
  if (isWord(lex, 'sp', 'sp2', 'corner', 'gap')) return true;
  if (lex.kind !== 'stitch' || lex.text !== 'ch') return false;
  const next = peek(reading, 1);
  if (next.kind !== 'num' && !isMark(next, '-')) return !isWord(next, 'in');
  const after = peek(reading, isMark(next, '-') ? 3 : 2);
  return isWord(after, 'sp', 'loop');
}

function single(reading: Reading): Noun | null {
  const lex = peek(reading);
  if (lex.kind === 'num') return numbered(reading);
  if (lex.kind === 'stitch') return stitchNoun(reading);
  if (lex.kind === 'word') {
    if (isPlain(lex, 'long', 'longs')) {
      reading.at += 1;
      return { what: 'st', stitch: 'dc' };
    }
    if (isPlain(lex, 'one', 'stick', 'picots')) {
      reading.at += 1;
      return { what: 'st' };
    }
    if (isPlain(lex, 'layer')) return null;
    return null;
  }
  if (lex.kind !== 'w') return null;
  switch (lex.text) {
    case 'st':
      reading.at += 1;
      if (isWord(peek(reading), 'sp')) {
        reading.at += 1;
        return { what: 'gap' };
      }
      return { what: 'st' };
    case 'ring':
      reading.at += 1;
      return { what: 'ring' };
    case 'sp':
    case 'sp2':
    case 'loop':
      reading.at += 1;
      takeAll(reading, 'sp');
      if (isWord(peek(reading), 'gap')) {
        reading.at += 1;
        groupsAfterGap(reading);
        return { what: 'gap' };
      }
      return { what: 'sp' };
    case 'corner': {
      reading.at += 1;
      if (take(reading, 'sp', 'sp2', 'loop')) return { what: 'sp', corner: true };
      if (take(reading, 'st')) return { what: 'st', corner: true };
      const inner = peek(reading).kind === 'stitch' ? stitchNoun(reading) : null;
      return inner ? { ...inner, corner: true } : { what: 'sp', corner: true };
    }
    case 'gap':
      reading.at += 1;
      groupsAfterGap(reading);
      return { what: 'gap' };
    case 'rowend':
      reading.at += 1;
      return { what: 'row-end' };
    case 'row':
      if (isWord(peek(reading, 1), 'end')) {
        reading.at += 2;
        return { what: 'row-end' };
      }
      return null;
    case 'group':
      reading.at += 1;
      if (isMark(peek(reading), "'")) reading.at += 1;
      if (take(reading, 'sp', 'sp2', 'loop')) return { what: 'sp' };
      return { what: 'group' };
    case 'ch':
      reading.at += 1;
      return { what: 'sp' };
    case 'marked':
      reading.at += 1;
      take(reading, 'st');
      return { what: 'mark' };
    case 'turningchain':
      reading.at += 1;
      return { what: 'st' };
  }
  return null;
}

/** `between groups`, `gap between shells`, `between the next 2 dc`: what lies on both sides is only named. */
export function groupsAfterGap(reading: Reading): void {
  takeAll(reading, 'gap', 'from', 'the', 'each', 'next', 'of', 'sp');
  if (peek(reading).kind === 'num') reading.at += 1;
  if (isMark(peek(reading), '-')) reading.at += 1;
  while (peek(reading).kind === 'stitch' || isWord(peek(reading), 'group', 'st', 'sp')) reading.at += 1;
}

/** `2-ch sp`, `5 ch loop`, `3-dc group`. */
function numbered(reading: Reading): Noun | null {
  const n = peek(reading).value;
  const start = reading.at;
  reading.at += 1;
  if (isMark(peek(reading), '-')) reading.at += 1;
  if (take(reading, 'sp2')) return { what: 'sp', chains: n };
  if (peek(reading).kind === 'stitch') {
    const key = peek(reading).text;
    reading.at += 1;
    if (key === 'ch' && isMark(peek(reading), '-') && isWord(peek(reading, 1), 'sp', 'loop')) reading.at += 1;
    if (key === 'ch' && take(reading, 'sp', 'loop', 'corner')) return { what: 'sp', chains: n };
    if (take(reading, 'group')) return { what: 'group', stitch: key };
  }
  reading.at = start;
  return null;
}

function stitchNoun(reading: Reading): Noun | null {
  const key = peek(reading).text;
  const row = stitchOf(key);
  reading.at += 1;
  if (key === 'ch') {
    const start = reading.at;
    if (isMark(peek(reading), '-')) reading.at += 1;
    if (peek(reading).kind === 'num') {
      const chains = peek(reading).value;
      reading.at += 1;
      if (isMark(peek(reading), '-')) reading.at += 1;
      if (take(reading, 'sp', 'loop', 'corner', 'sp2') || reading.lexes[start]!.kind === 'mark') {
        takeAll(reading, 'sp', 'loop');
        return { what: 'sp', chains };
      }
    }
    reading.at = start;
    if (isMark(peek(reading), '-') && isWord(peek(reading, 1), 'sp', 'loop')) {
      reading.at += 2;
      return { what: 'sp' };
    }
    return { what: 'ch' };
  }
  if (isMark(peek(reading), '-') && isWord(peek(reading, 1), 'group')) reading.at += 1;
  if (take(reading, 'group')) return { what: 'group', stitch: key };
  if (isWord(peek(reading), 'sp', 'sp2') && (!row || row.family === 'group')) {
    reading.at += 1;
    return { what: 'sp', of: key };
  }
  take(reading, 'st');
  if (!row || row.family === 'group') return { what: 'group', stitch: key };
  return { what: 'st', stitch: key };
}
