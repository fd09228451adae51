import { isMark, isPlain, isWord, peek, type Reading } from './reading.ts';
import { pushTotal, readBareTotal } from './totals.ts';

/** Words a sentence about a total is made of. */
const TALK = new Set(
  'you should will now there are have has had is be this that gives giving making resulting result results count number for and so up ending leaving leaves at them still us which brings bring down back takes to'.split(
    ' ',
  ),
);
const TALK_WORDS = ['to', 'total', 'st', 'round', 'row', 'of', 'the', 'with', 'in', 'counts', 'work', 'each'];
/** One of these at least must be among them. */
const TELLING = new Set(
  'have has be is gives giving making resulting result results count number brings takes'.split(' '),
);

/** `You should now have 18 sc`, `for a total of 18`, `there will be 18 sts`, `stitch count: 18`: a total in a sentence. */
export function readToldTotal(reading: Reading, limit: number): boolean {
  const start = reading.at;
  let at = start;
  let tells = false;
  while (at < limit && at < start + 12) {
    const lex = reading.lexes[at]!;
    if (isMark(lex, ':') || isMark(lex, '=')) {
      at += 1;
      continue;
    }
    if (lex.kind === 'word' && TALK.has(lex.text)) tells ||= TELLING.has(lex.text);
    else if (isWord(lex, ...TALK_WORDS)) tells ||= isWord(lex, 'total', 'counts');
    else break;
    at += 1;
  }
  if (!tells || at === start || reading.lexes[at]?.kind !== 'num') return false;
  reading.at = at;
  if (readBareTotal(reading, limit, start)) return true;
  reading.at = start;
  return false;
}

/** `18 in each of the next 3 rounds`: the total of each round of a range. */
export function readEachRoundTotal(reading: Reading): boolean {
  const number = peek(reading);
  let at = reading.at + (isWord(peek(reading, 1), 'st') || peek(reading, 1).kind === 'stitch' ? 2 : 1);
  if (!isWord(reading.lexes[at]!, 'in', 'on', 'each', 'for')) return false;
  let hasEach = false;
  while (
    isWord(reading.lexes[at]!, 'in', 'on', 'each', 'of', 'the', 'next', 'last') ||
    isPlain(reading.lexes[at]!, 'these', 'for')
  ) {
    hasEach ||= isWord(reading.lexes[at]!, 'each');
    at += 1;
  }
  if (reading.lexes[at]!.kind === 'num') at += 1;
  if (!hasEach || !isWord(reading.lexes[at]!, 'round', 'row')) return false;
  pushTotal(reading, { sts: [number.value] }, { start: number.start, end: reading.lexes[at]!.end });
  reading.at = at + 1;
  return true;
}

/** `18 sts: (sc, inc) x 6`, `(18 sts): …`: a total that stands before its work. */
export function readLeadingTotal(reading: Reading): boolean {
  const number = peek(reading);
  if (number.kind !== 'num' || !isWord(peek(reading, 1), 'st')) return false;
  const after = peek(reading, 2);
  if (!isMark(after, ':') && !(isMark(after, '-') && !after.glued)) return false;
  pushTotal(reading, { sts: [number.value] }, { start: number.start, end: peek(reading, 1).end });
  reading.at += 3;
  return true;
}
