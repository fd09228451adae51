import { type Sized } from './tree.ts';
import { isMark, isTimesSign, isWord, peek, type Reading } from './reading.ts';

export const ONE: Sized = [1];

/**
 * A number, with the figures of the other sizes after it: `6`, `6 (8, 10)`, `6 (8: 10: 12)`.
 * The cursor stands behind it afterwards, or where it was when there is none.
 */
export function readSized(reading: Reading): Sized | null {
  const lex = peek(reading);
  if (lex.kind !== 'num') return null;
  reading.at += 1;
  const others = sizesAt(reading, reading.at);
  if (!others) return [lex.value];
  reading.at = others.after;
  return [lex.value, ...others.figures];
}

/** Figures of the other sizes in a bracket at this index, where a stitch or a noun goes on after it. */
function sizesAt(reading: Reading, open: number): { figures: number[]; after: number } | null {
  const close = reading.closes.get(open);
  if (close === undefined || close - open > 24) return null;
  const figures = figuresBetween(reading, open + 1, close);
  if (!figures) return null;
  if (reading.sizes > 1) return figures.length === reading.sizes - 1 ? { figures, after: close + 1 } : null;
  const next = reading.lexes[close + 1]!;
  const goesOn = next.kind === 'stitch' || isWord(next, 'st', 'times', 'sp', 'sp2');
  return goesOn && figures.length > 0 ? { figures, after: close + 1 } : null;
}

/** Numbers alone, parted by commas, colons, strokes or hyphens. */
export function figuresBetween(reading: Reading, from: number, to: number): number[] | null {
  const figures: number[] = [];
  for (let i = from; i < to; i += 1) {
    const lex = reading.lexes[i]!;
    if ((i - from) % 2 === 0) {
      if (lex.kind !== 'num') return null;
      figures.push(lex.value);
    } else if (lex.kind !== 'mark' || ![',', ':', '/', '-', ';'].includes(lex.text)) return null;
  }
  return (to - from) % 2 === 1 ? figures : null;
}

/** `x 6`, `× 6`, `6 times`, `6x`, `twice`, `(x6)`: how often, in all. Null, and nothing taken, where none is said. */
export function readMultiple(reading: Reading): Sized | null {
  const start = reading.at;
  if (isMark(peek(reading), '(')) {
    const close = reading.closes.get(reading.at);
    if (close !== undefined && close - reading.at <= 4) {
      reading.at += 1;
      const inside = readMultiple(reading);
      if (inside && reading.at === close) {
        reading.at += 1;
        return inside;
      }
    }
    reading.at = start;
    return null;
  }
  if (isTimesSign(peek(reading))) {
    reading.at += 1;
    const n = readSized(reading);
    if (n) {
      if (isWord(peek(reading), 'times')) reading.at += 1;
      return n;
    }
    reading.at = start;
    return null;
  }
  const words: readonly [string, number][] = [
    ['twice', 2],
    ['thrice', 3],
    ['once', 1],
  ];
  for (const [word, n] of words) {
    if (isWord(peek(reading), word)) {
      reading.at += 1;
      return [n];
    }
  }
  const n = readSized(reading);
  if (n) {
    if (isMark(peek(reading), '-') && isWord(peek(reading, 1), 'times')) reading.at += 1;
    if (isWord(peek(reading), 'times')) {
      reading.at += 1;
      return n;
    }
    const next = peek(reading, 1);
    // `repeat 6x 18`: the figure that ends the line is its total.
    const isTotal = next.kind === 'num' && peek(reading).glued && !next.glued && peek(reading, 2).kind === 'end';
    if (isTimesSign(peek(reading)) && (next.kind !== 'num' || isTotal)) {
      reading.at += 1;
      return n;
    }
  }
  reading.at = start;
  return null;
}
