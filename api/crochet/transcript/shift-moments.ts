import { alignWords, plainWord } from './align-words.ts';
import { type Word } from './words.ts';

/** Words further than this from a moment say nothing of it, in milliseconds. */
const NEAR_MS = 20_000;

/**
 * How moments of one transcript of a recording stand in another: each goes where its words went.
 * @returns a function from a moment (ms) in the first to the one in the second; null where the words around it are not
 *   in the second
 */
export function followWords(before: readonly Word[], after: readonly Word[]): (ms: number) => number | null {
  const found = alignWords(
    before.map(({ text }) => plainWord(text)),
    after.map(({ text }) => plainWord(text)),
  );
  const pairs = found
    .flatMap((at, n) => (at < 0 ? [] : [{ from: before[at]!.startMs, to: after[n]!.startMs }]))
    .sort((a, b) => a.from - b.from);
  return (ms) => {
    let low = 0;
    let high = pairs.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      if (pairs[middle]!.from <= ms) low = middle + 1;
      else high = middle;
    }
    const [left, right] = [pairs[low - 1], pairs[low]];
    const nearest = !left || (right && right.from - ms < ms - left.from) ? right : left;
    if (!nearest || Math.abs(nearest.from - ms) > NEAR_MS) return null;
    return Math.max(0, ms + nearest.to - nearest.from);
  };
}
