import { type Sized } from './tree.ts';
import { readSized } from './amounts.ts';
import { isPlain, isWord, peek, take, takeAll, type Reading } from './reading.ts';
import { type TargetRead } from './target.ts';

/** `sc next 2 sts tog`, `sc in next 2 sts together`: how many are drawn into one; null where none are. */
export function readTogether(reading: Reading, target: TargetRead | null, count: Sized | null): number | null {
  const legs = target?.count?.[0] ?? (target === null ? count?.[0] : undefined);
  if (legs === undefined || legs < 2 || legs > 12 || !take(reading, 'tog')) return null;
  return legs;
}

/** `30 sc evenly around the edge`, `evenly along the side`: places that nothing tells the number of. */
export function readEdge(reading: Reading): 'edge' | 'rows' | null {
  const start = reading.at;
  const isEven = take(reading, 'evenly');
  takeAll(reading, 'in', 'around', 'across', 'on', 'the', 'of');
  if (
    isPlain(
      peek(reading),
      'edge',
      'edges',
      'opening',
      'armhole',
      'neck',
      'neckline',
      'brim',
      'border',
      'perimeter',
      'outside',
    ) ||
    isWord(peek(reading), 'side', 'rowend')
  ) {
    reading.at += 1;
    return isWord(reading.lexes[reading.at - 1]!, 'rowend') ? 'rows' : 'edge';
  }
  reading.at = start;
  if (isEven) take(reading, 'evenly');
  return null;
}

/** `dc two rows down`: where a long stitch reaches to, which is no count. */
export function belowWords(reading: Reading): void {
  const isDown = (ahead: number) => isPlain(peek(reading, ahead), 'down', 'below');
  if (peek(reading).kind === 'num' && isWord(peek(reading, 1), 'row', 'round') && isDown(2)) reading.at += 3;
}

/** `sc 6`, `inc 2`: a number behind the stitch, unless it begins the next work (`sc 6 dc`) or is the total. */
export function suffix(reading: Reading): Sized | null {
  const next = peek(reading);
  if (next.kind !== 'num' || next.broken) return null;
  const after = peek(reading, 1);
  if (after.kind === 'stitch' && !after.broken) return null;
  if (isWord(after, 'st') && !isWord(peek(reading, 2), 'in')) return null;
  return readSized(reading);
}

export function readThrough(reading: Reading): 'layers' | 'piece' | null {
  const start = reading.at;
  if (!take(reading, 'through', 'in', 'on')) return null;
  const isThrough = isWord(reading.lexes[start]!, 'through');
  takeAll(reading, 'the', 'of', 'both');
  if (take(reading, 'layers')) return 'layers';
  if (isThrough && (peek(reading).kind === 'word' || isWord(peek(reading), 'both', 'the'))) {
    const layered = isPlain(peek(reading), 'both', 'two');
    while (peek(reading).kind === 'word' || isWord(peek(reading), 'and', 'the')) {
      if (isPlain(peek(reading), 'x')) break;
      if (isWord(peek(reading), 'and') && peek(reading, 1).kind !== 'word' && !isWord(peek(reading, 1), 'the')) break;
      reading.at += 1;
    }
    return layered ? 'layers' : 'piece';
  }
  reading.at = start;
  return null;
}
