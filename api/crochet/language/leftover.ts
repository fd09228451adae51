import { type Item } from './tree.ts';
import { isMark, isSeparator, peek, spanFrom, type Reading } from './reading.ts';
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
]);

/** A stretch that begins no item: prose is a note, anything hot is unread. */
export function leftover(reading: Reading, limit: number): Item {
  const from = reading.at;
  let hot = false;
  while (reading.at < limit) {
    const lex = peek(reading);
    if (reading.at > from && (isSeparator(lex) || isMark(lex, '*') || isMark(lex, '**'))) break;
    if (reading.at > from && (isMark(lex, '(') || isMark(lex, '[') || isMark(lex, '{'))) break;
    if (reading.at > from && (lex.kind === 'num' || lex.kind === 'stitch') && !hot) {
      // A work may begin in the middle of a sentence: prose before it is only prose.
      const here = reading.at;
      const work = readWork(reading);
      reading.at = here;
      if (work) break;
    }
    if (lex.kind === 'num' || lex.kind === 'stitch' || lex.kind === 'ord' || (lex.kind === 'w' && HOT.has(lex.text)))
      hot = true;
    if (isLeftOpen(reading)) hot = true;
    reading.at += 1;
  }
  if (reading.at === from) reading.at += 1;
  const span = spanFrom(reading, from);
  if (hot) return { type: 'unread', span };
  const text = reading.lexes
    .slice(from, reading.at)
    .map((lex) => lex.text)
    .join(' ');
  return { type: 'note', span, text };
}

/** "And so on", "tapering": work that nobody has written down. */
export function isLeftOpen(reading: Reading): boolean {
  const [word, then] = [reading.lexes[reading.at]?.text ?? '', reading.lexes[reading.at + 1]?.text ?? ''];
  return ['etc', 'taper', 'tapering'].includes(word) || (word === 'so' && ['on', 'forth'].includes(then));
}
