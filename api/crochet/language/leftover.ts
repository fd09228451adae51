import { type Item } from './tree.ts';
import { isMark, isSeparator, isWord, peek, spanFrom, type Reading } from './reading.ts';
import { readWork } from './works.ts';

/** Words in which a stitch, a number, a place or a repeat could hide are hot. */
export const HOT = new Set([
  'each',
  'rep',
  'skip',
  'st',
  'sp',
  'sp2',
  'loop',
  'times',
  'corner',
  'gap',
  'twice',
  'thrice',
  'around',
  'across',
  'remain',
  'next',
  'evenly',
  'group',
  'uncountable',
]);

/** A stretch that begins no item: prose is a note, anything hot is unread. */
export function leftover(reading: Reading, limit: number): Item {
  // "And so on" begins with its "and", which was passed over as a separator.
  const isTrailing = isLeftOpen(reading) && reading.at > 0 && isWord(reading.lexes[reading.at - 1]!, 'and');
  const here = reading.at;
  const from = isTrailing ? here - 1 : here;
  let hot = false;
  while (reading.at < limit) {
    const lex = peek(reading);
    if (hot && isMark(lex, ',') && isLeftOpen(reading, 1)) {
      // "And so on, tapering as you like" is one stretch.
      reading.at += 1;
      continue;
    }
    if (reading.at > here && (isSeparator(lex) || isMark(lex, '*') || isMark(lex, '**'))) break;
    if (reading.at > here && (isMark(lex, '(') || isMark(lex, '[') || isMark(lex, '{'))) break;
    if (reading.at > here && (lex.kind === 'num' || lex.kind === 'stitch') && !hot) {
      // A work may begin in the middle of a sentence: prose before it is only prose.
      const back = reading.at;
      const work = readWork(reading);
      reading.at = back;
      if (work) break;
    }
    if (lex.kind === 'num' || lex.kind === 'stitch' || lex.kind === 'ord' || (lex.kind === 'w' && HOT.has(lex.text)))
      hot = true;
    if (isLeftOpen(reading)) hot = true;
    reading.at += 1;
  }
  if (reading.at === here) reading.at += 1;
  const span = spanFrom(reading, from);
  if (hot) return { type: 'unread', span };
  const text = reading.lexes
    .slice(from, reading.at)
    .map((lex) => lex.text)
    .join(' ');
  return { type: 'note', span, text };
}

/** "And so on", "tapering": work that nobody has written down. */
export function isLeftOpen(reading: Reading, ahead = 0): boolean {
  const at = reading.at + ahead;
  const [word, then] = [reading.lexes[at]?.text ?? '', reading.lexes[at + 1]?.text ?? ''];
  return ['etc', 'taper', 'tapering'].includes(word) || (word === 'so' && ['on', 'forth'].includes(then));
}
