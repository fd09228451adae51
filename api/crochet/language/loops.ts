import { type Loops } from './tree.ts';
import { isPlain, isWord, peek, type Reading } from './reading.ts';
import { type TargetRead } from './target.ts';

export const LOOPS: Readonly<Record<string, Loops>> = { blo: 'back', flo: 'front', third: 'third', bothloops: 'both' };

/** Loops named here (`BLO`, `in back loop only`), or null and nothing taken. */
export function readLoops(reading: Reading): Loops | null {
  const lex = peek(reading);
  const loops = lex.kind === 'w' ? LOOPS[lex.text] : undefined;
  if (!loops) return null;
  reading.at += 1;
  while (isPlain(peek(reading), 'only') || isWord(peek(reading), 'loop', 'st')) reading.at += 1;
  return loops;
}

/** `front loops left in R10`. */
export function freeLoops(reading: Reading, loops: Loops): TargetRead | null {
  const start = reading.at;
  let free = isPlain(reading.lexes[start - 2] ?? peek(reading), 'free', 'unused', 'remaining', 'exposed', 'unworked');
  while (
    isPlain(peek(reading), 'left', 'free', 'unused', 'unworked', 'exposed', 'remaining') ||
    isWord(peek(reading), 'remain', 'skipped', 'of', 'the', 'in', 'on', 'from')
  ) {
    if (!isWord(peek(reading), 'of', 'the', 'in', 'on', 'from')) free = true;
    reading.at += 1;
  }
  const isOwn = !free && !isWord(reading.lexes[reading.at - 1]!, 'in', 'on');
  if (isWord(peek(reading), 'round', 'row') || (isPlain(peek(reading), 'r') && peek(reading, 1).kind === 'num')) {
    reading.at += 1;
    const number = peek(reading);
    if (number.kind === 'num') {
      reading.at += 1;
      return {
        target: { what: 'loop', which: 'each', line: number.value, ...(isOwn && { own: true as const }) },
        count: null,
        fill: true,
        loops,
        also: null,
      };
    }
  }
  if (free) return { target: { what: 'loop', which: 'each' }, count: null, fill: true, loops, also: null };
  reading.at = start;
  return null;
}
