import { isPlain, isWord, peek, takeAll, type Reading } from './reading.ts';

export const OF_ROUND = new Set([
  'previous',
  'prev',
  'preceding',
  'below',
  'prior',
  'before',
  'down',
  'under',
  'beneath',
  'above',
  'left',
  'made',
  'just',
]);

/** `along one edge`, `along the long side`. */
function alongSide(reading: Reading): boolean {
  if (!isWord(peek(reading), 'across')) return false;
  let i = 1;
  while (
    i < 4 &&
    (isWord(peek(reading, i), 'the') ||
      isPlain(peek(reading, i), 'one', 'this', 'that', 'long', 'short', 'right', 'left'))
  )
    i += 1;
  if (i === 1 && peek(reading, i).kind === 'num' && peek(reading, i).value === 1) i += 1;
  if (i === 1 || !isWord(peek(reading, i), 'side')) return false;
  const next = peek(reading, i + 1);
  if (next.kind !== 'mark' && next.kind !== 'end') return false;
  reading.at += i + 1;
  return true;
}

/** Words after a place that say again what is known: `of previous round`, `two rows below`, `around the post of`. */
export function qualifiers(reading: Reading): void {
  for (;;) {
    const start = reading.at;
    if (alongSide(reading)) continue;
    takeAll(reading, 'of', 'from', 'in', 'on', 'the', 'same');
    if (peek(reading).kind === 'num' && isWord(peek(reading, 1), 'round', 'row') && peek(reading, 2).kind === 'word')
      reading.at += 2;
    let named = false;
    while (
      (peek(reading).kind === 'word' && OF_ROUND.has(peek(reading).text)) ||
      isWord(peek(reading), 'last', 'first')
    ) {
      named = true;
      reading.at += 1;
    }
    if (named && isWord(peek(reading), 'group')) {
      reading.at += 1;
      continue;
    }
    if (isWord(peek(reading), 'round', 'row') && (named || start < reading.at)) {
      reading.at += 1;
      if (peek(reading).kind === 'num') reading.at += 1;
      continue;
    }
    if (isPlain(peek(reading), 'r') && peek(reading, 1).kind === 'num' && start < reading.at) {
      reading.at += 2;
      continue;
    }
    if (named && peek(reading).kind !== 'stitch' && !isWord(peek(reading), 'st')) continue;
    reading.at = start;
    return;
  }
}
