import { type Target } from './tree.ts';
import { isWord, peek, take, takeAll, type Reading } from './reading.ts';

/** How the edge of something made earlier is led in. */
const LEADS = ['on', 'around', 'across', 'of'] as const;

/**
 * `around first leg`, `of the second leg`, `on other ear`: the edge of a piece worked earlier. What names the piece is
 * whatever word the language has no other use for; that it is told which one (`first`, `other`) makes it a piece.
 *
 * @returns null, and nothing taken, where no piece is named.
 */
export function readPieceEdge(reading: Reading): Target | null {
  const start = reading.at;
  if (!take(reading, ...LEADS)) return null;
  take(reading, 'the');
  const n = readWhich(reading);
  const noun = peek(reading);
  if (n === null || noun.kind !== 'word') {
    reading.at = start;
    return null;
  }
  reading.at += 1;
  return { what: 'edge', which: 'next', piece: noun.text, ...(n > 0 && { n }) };
}

/** Which of several pieces: its number, 0 where it is only told from the others; null where none is told apart. */
function readWhich(reading: Reading): number | null {
  const lex = peek(reading);
  const which = isWord(lex, 'first') ? 1 : lex.kind === 'ord' ? lex.value : isWord(lex, 'other', 'remain') ? 0 : null;
  if (which !== null) reading.at += 1;
  return which;
}

/** `along the chain`, said of stitches already counted: words that name no further place. */
export function readAlongChain(reading: Reading): 'near' | 'far' | null {
  const start = reading.at;
  if (take(reading, 'across')) {
    take(reading, 'the');
    const isFar = take(reading, 'side');
    if (isFar) takeAll(reading, 'of', 'the');
    const lex = peek(reading);
    if (lex.kind === 'stitch' && lex.text === 'ch' && peek(reading, 1).kind !== 'num') {
      reading.at += 1;
      return isFar ? 'far' : 'near';
    }
  }
  reading.at = start;
  return null;
}

/** Whether a bare number is told to go on a piece or along a chain: `6 on first leg`, `3 along the chain`. */
export function isEdgeAhead(reading: Reading): boolean {
  const start = reading.at;
  const is = readPieceEdge(reading) !== null || readAlongChain(reading) !== null;
  reading.at = start;
  return is;
}
