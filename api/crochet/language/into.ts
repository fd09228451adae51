import { stitchOf } from '../stitches.ts';
import { groupsAfterGap } from './noun.ts';
import { isPlain, isWord, peek, takeAll, type Reading } from './reading.ts';
import { plainTarget, readTarget, type TargetRead } from './target.ts';

/** `in next st`, `each st`, and `next 6 sts` or `around` where the preposition is left out. */
export function readInto(reading: Reading): TargetRead | null {
  const start = reading.at;
  const prep =
    isWord(peek(reading), 'in', 'on', 'through') ||
    isSlipTo(reading) ||
    (isWord(peek(reading), 'around') && isPost(reading));
  if (prep) {
    reading.at += 1;
    if (isPlain(peek(reading), 'ring') || isWord(peek(reading), 'ring')) takeAll(reading, 'the');
    const isOver = reading.lexes[start]!.end - reading.lexes[start]!.start === 4 && isWord(reading.lexes[start]!, 'on');
    const target = readTarget(reading);
    if (target && isOver && target.target.what === 'ch' && target.target.which === 'next')
      return { ...target, target: { ...target.target, what: 'sp' } };
    if (target) return isOver ? { ...target, over: true } : target;
    reading.at = start;
    return null;
  }
  if (isBetween(reading)) {
    const isEach = isWord(peek(reading, 1), 'each');
    if (isEach) {
      reading.at += 1;
      groupsAfterGap(reading);
      return plainTarget('gap', 'each', null, true);
    }
    return readTarget(reading);
  }
  if (
    isWord(peek(reading), 'each', 'next', 'same', 'last') ||
    (isWord(peek(reading), 'first') && isWord(peek(reading, 1), 'st'))
  ) {
    const target = readTarget(reading);
    if (target) return target;
    reading.at = start;
  }
  return null;
}

/** `3 dc between each group`, `between next 2 dc`. */
function isBetween(reading: Reading): boolean {
  if (!isWord(peek(reading), 'gap')) return false;
  const next = peek(reading, 1);
  return isWord(next, 'each', 'next', 'group', 'the', 'first') || isPlain(next, 'them') || next.kind === 'stitch';
}

/** `sl st to next ch-2 sp`, `sl st to centre of shell`: a slip stitch may go to a place. */
function isSlipTo(reading: Reading): boolean {
  if (!isWord(peek(reading), 'to') || reading.lexes[reading.at - 1]?.text !== 'slst') return false;
  const next = peek(reading, isWord(peek(reading, 1), 'the') ? 2 : 1);
  return (
    isWord(next, 'next', 'same', 'centre', 'corner', 'sp', 'sp2', 'first', 'loop') ||
    next.kind === 'num' ||
    (next.kind === 'stitch' && next.text === 'ch') ||
    next.kind === 'ord'
  );
}

/** `fpdc around next dc`, `around the post of each st`. */
function isPost(reading: Reading): boolean {
  const next = peek(reading, 1);
  return (
    isWord(next, 'next', 'each', 'same', 'first', 'last', 'skipped') ||
    isPlain(next, 'post') ||
    (isWord(next, 'the') && (isPlain(peek(reading, 2), 'post') || peek(reading, 2).kind === 'num')) ||
    (next.kind === 'stitch' && !['increase', 'decrease'].includes(stitchOf(next.text)?.family ?? '')) ||
    next.kind === 'ord'
  );
}
