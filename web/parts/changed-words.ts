export interface Stretch {
  readonly text: string;
  readonly isChanged: boolean;
}

/** Above this many pairs of words the middle is shown as changed at once instead of being compared. */
const MOST_PAIRS = 250_000;

const wordsOf = (text: string) => text.match(/\s+|[^\s]+/g) ?? [];

/** Lengths of the longest common run of words from each pair of places on. */
function commonTable(a: readonly string[], b: readonly string[]): number[][] {
  const table = Array.from({ length: a.length + 1 }, () => new Array<number>(b.length + 1).fill(0));
  for (let i = a.length - 1; i >= 0; i--) {
    for (let j = b.length - 1; j >= 0; j--) {
      const skip = Math.max(table[i + 1]?.[j] ?? 0, table[i]?.[j + 1] ?? 0);
      table[i]![j] = a[i] === b[j] ? (table[i + 1]?.[j + 1] ?? 0) + 1 : skip;
    }
  }
  return table;
}

/** `text` in stretches, each told whether its words are also in `other`, in the same order. */
export function changedWords(text: string, other: string): readonly Stretch[] {
  const a = wordsOf(text);
  const b = wordsOf(other);
  if (a.length * b.length > MOST_PAIRS) return [{ text, isChanged: true }];
  const table = commonTable(a, b);
  const stretches: { text: string; isChanged: boolean }[] = [];
  const add = (word: string, isChanged: boolean) => {
    const last = stretches.at(-1);
    if (last?.isChanged === isChanged) last.text += word;
    else stretches.push({ text: word, isChanged });
  };
  let j = 0;
  a.forEach((word, i) => {
    while (
      j < b.length &&
      b[j] !== word &&
      (table[i]?.[j + 1] ?? 0) >= (table[i + 1]?.[j] ?? 0) &&
      (table[i]?.[j + 1] ?? 0) > 0
    )
      j++;
    if (b[j] === word) {
      add(word, false);
      j++;
    } else add(word, word.trim() !== '');
  });
  return stretches;
}
